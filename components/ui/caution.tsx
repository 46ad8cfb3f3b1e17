import type { ReactNode } from 'react';
import { OpenTriangle } from './shapes';

export type CautionKind = 'handling' | 'score' | 'limit';
export type CautionProps = { kind?: CautionKind; children?: ReactNode };

const TEXTS: Record<CautionKind, { title: string; text: string }> = {
  handling: {
    title: 'Handle with care',
    text:
      'The material may contain mycotoxins, which are toxic; some are carcinogenic. Dust carries the toxin, and ' +
      'extraction solvents are flammable and toxic. The safety data sheet, your laboratory\u2019s own procedures and ' +
      'local rules come first.',
  },
  score: {
    title: 'A score is not a verdict',
    text:
      'A score says how far one result lies from the assigned value. It does not say that a lot is safe or unsafe. ' +
      'A decision on a lot follows the regulation that applies and the laboratory\u2019s accredited procedure.',
  },
  limit: {
    title: 'Confirm the limit',
    text:
      'The limit shown is an example with its source and date. The person in charge confirms the limit that applies ' +
      'where they are.',
  },
};

export function Caution({ kind = 'handling', children }: CautionProps) {
  const { title, text } = TEXTS[kind];
  return (
    <aside
      aria-label={title}
      className="grid gap-x-6 gap-y-0.5 border-y border-rule-strong py-2.5 text-sm md:grid-cols-[12rem_1fr]"
    >
      <p className="flex items-baseline gap-x-1.5 font-semibold">
        <OpenTriangle />
        <span>{title}.</span>
      </p>
      <div className="max-w-measure">
        <p>{text}</p>
        {children && <div className="mt-1.5">{children}</div>}
      </div>
    </aside>
  );
}
