import type { ReactNode } from 'react';

export type SectionProps = { id: string; title: string; lead?: ReactNode; children: ReactNode };

/** One part of a round's page; the round line leads to it. */
export function Section({ id, title, lead, children }: SectionProps) {
  return (
    <section id={id} aria-labelledby={`${id}-title`} className="flex scroll-mt-6 flex-col gap-4">
      <div>
        <h2 id={`${id}-title`}>{title}</h2>
        {lead && <div className="mt-1 max-w-measure text-ink-soft">{lead}</div>}
      </div>
      {children}
    </section>
  );
}
