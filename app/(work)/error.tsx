'use client';

import { ErrorMessage } from '../error-message';

export default function WorkErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return <ErrorMessage error={error} retry={reset} home={{ href: '/account', label: 'Account' }} />;
}
