import Link from 'next/link';
import type { ReactNode } from 'react';
import { cx } from './cx';
import { HeaderMenu } from './header-menu';
import { BrandMark } from './shapes';

export type NavLink = { href: string; label: string; current?: boolean };
export type SiteHeaderProps = { home?: string; links: NavLink[]; right?: ReactNode };

export function SiteHeader({ home = '/', links, right }: SiteHeaderProps) {
  return (
    <header className="no-print border-b bg-paper">
      <a
        href="#main"
        className="absolute left-4 top-1 z-50 -translate-y-20 bg-paper-raised px-3 py-2 text-press focus:translate-y-0"
      >
        Skip to the content
      </a>
      <div className="mx-auto flex min-h-14 max-w-page items-stretch gap-x-6 px-4 md:px-6">
        <Link href={home} className="flex items-center gap-2 font-serif text-xl font-semibold text-ink">
          <BrandMark />
          Assize
        </Link>
        {links.length > 0 && (
          <nav aria-label="Main" className="hidden md:block">
            <ul className="flex h-full gap-x-5">
              {links.map((link) => (
                <li key={link.href} className="flex">
                  <HeaderLink link={link} />
                </li>
              ))}
            </ul>
          </nav>
        )}
        <div className="ml-auto flex items-center gap-x-3">
          <div className="hidden items-center gap-x-3 md:flex">{right}</div>
          <HeaderMenu>
            <SmallScreenMenu links={links} right={right} />
          </HeaderMenu>
        </div>
      </div>
    </header>
  );
}

function HeaderLink({ link }: { link: NavLink }) {
  return (
    <Link
      href={link.href}
      aria-current={link.current ? 'page' : undefined}
      className={cx(
        'flex items-center border-y-3 border-t-transparent',
        link.current
          ? 'border-b-maize font-semibold text-ink'
          : 'border-b-transparent text-press hover:text-press-strong',
      )}
    >
      {link.label}
    </Link>
  );
}

function SmallScreenMenu({ links, right }: Pick<SiteHeaderProps, 'links' | 'right'>) {
  return (
    <div className="absolute inset-x-0 z-40 border-b bg-paper px-4 pb-4">
      <nav aria-label="Main">
        <ul>
          {links.map((link) => (
            <li key={link.href} className="border-t">
              <Link
                href={link.href}
                aria-current={link.current ? 'page' : undefined}
                className={cx(
                  'flex min-h-11 items-center border-l-3 pl-3',
                  link.current ? 'border-l-maize font-semibold text-ink' : 'border-l-transparent text-press',
                )}
              >
                {link.label}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      {right && <div className="flex flex-wrap items-center gap-3 border-t pt-3">{right}</div>}
    </div>
  );
}
