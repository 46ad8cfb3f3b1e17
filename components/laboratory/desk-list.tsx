import Link from 'next/link';
import type { ReactNode } from 'react';

export interface DeskEntry {
  slug: string;
  name: string;
  schemeName: string;
  /** What is to be done or what is the matter. */
  words: ReactNode;
  /** The part of the round's page to open. */
  part?: string;
  link: string;
}

export type DeskListProps = { id: string; title: string; entries: readonly DeskEntry[] };

/** Rounds under one heading, one line each, with what to do. */
export function DeskList({ id, title, entries }: DeskListProps) {
  if (entries.length === 0) return null;
  return (
    <section aria-labelledby={id}>
      <h2 id={id} className="border-b border-rule-strong pb-1">
        {title}
      </h2>
      <ul>
        {entries.map((entry) => (
          <li
            key={entry.slug}
            className="flex flex-wrap items-baseline justify-between gap-x-8 gap-y-1 border-b py-3"
          >
            <div className="min-w-0">
              <p className="font-serif text-lg font-semibold wrap-anywhere">{entry.name}</p>
              <p className="text-sm text-ink-soft">{entry.schemeName}</p>
            </div>
            <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1">
              <span>{entry.words}</span>
              <Link
                href={`/laboratory/rounds/${entry.slug}${entry.part ? `#${entry.part}` : ''}`}
                className="text-link inline-flex min-h-11 items-center font-semibold md:min-h-6"
              >
                {entry.link}
                <span className="sr-only">: {entry.name}</span>
              </Link>
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
