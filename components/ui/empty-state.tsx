import type { ReactNode } from 'react';

export type EmptyStateProps = { title: ReactNode; children?: ReactNode; action?: ReactNode };

/** A page or part with nothing in it yet: what will be here, and the first step. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="border-y py-8">
      <p className="font-serif text-lg font-semibold">{title}</p>
      {children && <div className="mt-1 max-w-measure text-ink-soft">{children}</div>}
      {action && <div className="mt-4 flex flex-wrap gap-2">{action}</div>}
    </div>
  );
}
