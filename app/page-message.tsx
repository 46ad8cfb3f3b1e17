import type { ReactNode } from 'react';

/** A page that says one thing: what happened, and the way on. */
export function PageMessage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="flex max-w-measure flex-col gap-4 py-8">
      <h1>{title}</h1>
      {children}
    </div>
  );
}
