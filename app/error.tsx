'use client';

import { BrandHeader } from './brand-header';
import { ErrorMessage } from './error-message';

export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <>
      <BrandHeader />
      <main id="main" className="mx-auto w-full max-w-page px-4 md:px-6">
        <ErrorMessage error={error} retry={reset} home={{ href: '/', label: 'Front page' }} />
      </main>
    </>
  );
}
