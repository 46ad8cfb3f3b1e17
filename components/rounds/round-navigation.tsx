'use client';

import Link from 'next/link';
import { useSelectedLayoutSegment } from 'next/navigation';
import { cx } from '@/components/ui/cx';
import { RoundLine, type RoundStage } from './round-line';
import { placeOf } from './round-stages';

export type RoundPage = { page: string; label: string };
export type RoundNavigationProps = {
  base: string;
  stages: RoundStage[];
  pages: RoundPage[];
  signedAt: string | null;
  today: string;
};

/** The round line and the pages of the round; it knows which of them is open. */
export function RoundNavigation({ base, stages, pages, signedAt, today }: RoundNavigationProps) {
  const segment = useSelectedLayoutSegment();
  return (
    <div className="no-print flex flex-col gap-2">
      <RoundLine stages={stages} today={today} currentPlace={placeOf(segment, signedAt)} />
      <nav aria-label="Pages of the round" className="border-b">
        <ul className="flex flex-wrap gap-x-5">
          {pages.map(({ page, label }) => (
            <li key={page}>
              <Link
                href={`${base}/${page}`}
                aria-current={page === segment ? 'page' : undefined}
                className={cx(
                  'flex min-h-11 items-center border-b-3 whitespace-nowrap md:min-h-9',
                  page === segment
                    ? 'border-maize font-semibold text-ink'
                    : 'border-transparent text-press hover:text-press-strong',
                )}
              >
                {label}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
    </div>
  );
}
