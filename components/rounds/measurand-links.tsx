import Link from 'next/link';
import { cx } from '@/components/ui/cx';

export type MeasurandLink = { id: number; itemCode: string; code: string; name: string; href: string };

/** The measurands of a round, item by item; the one that is shown is marked. */
export function MeasurandLinks({ links, current }: { links: MeasurandLink[]; current: number }) {
  if (links.length < 2) return null;
  return (
    <nav aria-label="Measurands" className="no-print">
      <ul className="flex flex-wrap gap-x-5 gap-y-1">
        {links.map((link) => (
          <li key={link.id}>
            <Link
              href={link.href}
              aria-current={link.id === current ? 'page' : undefined}
              title={link.name}
              className={cx(
                'inline-flex min-h-9 items-center border-b-3 md:min-h-8',
                link.id === current
                  ? 'border-maize font-semibold text-ink'
                  : 'border-transparent text-press hover:text-press-strong',
              )}
            >
              {link.itemCode} {link.code}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
