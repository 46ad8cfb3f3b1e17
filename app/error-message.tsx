'use client';

import { Button, ButtonLink } from '@/components/ui/button';
import { PageMessage } from './page-message';

export interface ErrorMessageProps {
  error: Error & { digest?: string };
  retry: () => void;
  home: { href: string; label: string };
}

/** What was thrown stays on the server; the number finds it in the log there. */
export function ErrorMessage({ error, retry, home }: ErrorMessageProps) {
  return (
    <PageMessage title="This page could not be shown">
      <p>
        Something went wrong on our side. What you had saved before is kept. Try again; if it happens once
        more, tell the person who runs this installation
        {error.digest ? (
          <>
            {' '}
            the number <strong className="figures">{error.digest}</strong>.
          </>
        ) : (
          ' what you did last.'
        )}
      </p>
      <div className="flex flex-wrap gap-2">
        <Button variant="primary" onClick={retry}>
          Try again
        </Button>
        <ButtonLink href={home.href}>{home.label}</ButtonLink>
      </div>
    </PageMessage>
  );
}
