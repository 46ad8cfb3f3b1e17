import Link from 'next/link';
import type { ReactNode } from 'react';

export type Crumb = { href: string; label: string };
export type PageHeaderProps = {
  title: ReactNode;
  lead?: ReactNode;
  actions?: ReactNode;
  breadcrumb?: Crumb[];
  tag?: ReactNode;
};

export function PageHeader({ title, lead, actions, breadcrumb = [], tag }: PageHeaderProps) {
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-8 gap-y-4">
      <div className="min-w-0">
        {breadcrumb.length > 0 && <Breadcrumb crumbs={breadcrumb} />}
        <h1 className="wrap-anywhere">{title}</h1>
        {tag && <div className="mt-2">{tag}</div>}
        {lead && (
          <div className="mt-2 max-w-measure text-lg leading-snug text-pretty text-ink-soft">{lead}</div>
        )}
      </div>
      {actions && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
    </header>
  );
}

function Breadcrumb({ crumbs }: { crumbs: Crumb[] }) {
  return (
    <nav aria-label="You are in" className="no-print mb-1 text-sm">
      <ol className="flex flex-wrap gap-x-1.5">
        {crumbs.map((crumb, index) => (
          <li key={crumb.href} className="flex gap-x-1.5">
            {index > 0 && (
              <span aria-hidden="true" className="self-center text-ink-faint">
                /
              </span>
            )}
            <Link href={crumb.href} className="text-link inline-flex min-h-6 items-center">
              {crumb.label}
            </Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}
