import type { DemoRound } from '../scenario/rounds';

/** The days of a round's life, counted from the day of seeding. */
export interface RoundDays {
  created: number;
  enrolled: number;
  opens: number;
  firstResult: number;
  lastResult: number;
  closes: number;
  evaluated: number;
  signed: number;
  published: number;
  publishPlanned: number;
}

const USUAL_OPENING = 40;
/** The open round has been open for a week. */
const OPENED = -7;
const DRAFTED = -3;

export function roundDays({ state, closes }: DemoRound): RoundDays {
  const isDraft = state === 'draft';
  const opens = state === 'open' ? OPENED : closes - USUAL_OPENING;
  return {
    created: isDraft ? DRAFTED : opens - 30,
    enrolled: isDraft ? DRAFTED + 1 : opens - 15,
    opens,
    firstResult: opens + 2,
    lastResult: Math.min(closes - 1, -1),
    closes,
    evaluated: closes + 10,
    signed: closes + 13,
    published: closes + 16,
    publishPlanned: closes + 28,
  };
}
