export type RoundLineLayout = {
  /** Share of the line that each stage takes from its mark to the next; the last stage takes 1. */
  weights: number[];
  /** Where today stands: how far along the stretch that begins at this stage; null without any date. */
  today: { stage: number; fraction: number } | null;
};

/** How much of the line is shared out by time; the rest is even, so that close dates stay apart. */
const BY_TIME = 1.5;

/** Places stages on a line partly by time. A stage without a date stands midway between its neighbours. */
export function layOutRoundLine(dates: readonly (string | null)[], today: string): RoundLineLayout {
  const times = fillTimes(dates.map((date) => (date ? Date.parse(date) : null)));
  if (times.length === 0) return { weights: [], today: null };
  const spans = times.slice(1).map((time, index) => Math.max(0, time - (times[index] ?? time)));
  const total = spans.reduce((sum, span) => sum + span, 0);
  const mean = total / Math.max(1, spans.length);
  const weights = [...spans.map((span) => 1 + (mean > 0 ? (BY_TIME * span) / total : 0)), 1];
  const hasDate = dates.some((date) => date !== null);
  return { weights, today: hasDate ? placeToday(times, Date.parse(today)) : null };
}

function placeToday(times: readonly number[], now: number): { stage: number; fraction: number } {
  const last = times.length - 1;
  if (now < (times[0] ?? 0)) return { stage: 0, fraction: 0 };
  for (let stage = 0; stage < last; stage += 1) {
    const from = times[stage] ?? 0;
    const to = times[stage + 1] ?? from;
    if (now < to) return { stage, fraction: to > from ? Math.max(0, (now - from) / (to - from)) : 0 };
  }
  return { stage: last, fraction: now > (times[last] ?? 0) ? 1 : 0 };
}

/** Gives a date to each stage that has none, and never lets a stage stand before the one it follows. */
function fillTimes(times: readonly (number | null)[]): number[] {
  const filled: number[] = [];
  times.forEach((time, index) => {
    const before = filled[index - 1];
    const next = times.findIndex((later, at) => at >= index && later !== null);
    const after = next >= 0 ? (times[next] ?? 0) : before;
    const own = time ?? between(before, after, next - index);
    filled.push(Math.max(own, before ?? own));
  });
  return filled;
}

function between(before: number | undefined, after: number | undefined, stepsToNext: number): number {
  if (before === undefined) return after ?? 0;
  if (after === undefined || stepsToNext < 1) return before;
  return before + (after - before) / (stepsToNext + 1);
}
