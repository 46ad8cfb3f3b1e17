import Link from 'next/link';
import type { ReactNode } from 'react';

export type SiteFooterProps = {
  links?: { href: string; label: string }[];
  version?: string;
  children?: ReactNode;
};

export function SiteFooter({ links = [], version, children }: SiteFooterProps) {
  return (
    <footer className="mt-16 border-t text-sm text-ink-soft">
      <div className="mx-auto flex max-w-page flex-wrap items-baseline justify-between gap-x-8 gap-y-2 px-4 py-6 md:px-6">
        <div className="text-pretty">{children}</div>
        <div className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
          {links.map((link) => (
            <Link key={link.href} href={link.href} className="text-link inline-flex min-h-6 items-center">
              {link.label}
            </Link>
          ))}
          {version && <span className="figures">Assize {version}</span>}
        </div>
      </div>
    </footer>
  );
}
