'use client';

import './globals.css';

/** Stands in when even the outermost layout failed, so it brings its own html element and needs nothing else. */
export default function GlobalErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <html lang="en-GB">
      <body>
        <main className="mx-auto flex max-w-measure flex-col items-start gap-4 px-4 py-12">
          <h1>Assize could not show this page</h1>
          <p>
            Something went wrong on our side. What you had saved before is kept.
            {error.digest && ` The number to tell the person who runs this installation is ${error.digest}.`}
          </p>
          <button type="button" className="text-link" onClick={reset}>
            Try again
          </button>
        </main>
      </body>
    </html>
  );
}
