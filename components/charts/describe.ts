import { formatCount, formatNumber, formatScore, type ScoreKind } from '@/lib/format';
import type { AssignedValue, ResultPoint, SignalKind, TrendPoint } from './chart-types';
import type { ScorePoint } from './chart-types';
import { orderScores } from './ordered-scores-geometry';

export function signalWords(signal: SignalKind | undefined): string {
  if (signal === 'warning') return ', warning signal';
  if (signal === 'action') return ', action signal';
  return signal === 'not-scored' ? ', not scored' : '';
}

function countSignals(signals: readonly (SignalKind | undefined)[]): string {
  const warnings = signals.filter((signal) => signal === 'warning').length;
  const actions = signals.filter((signal) => signal === 'action').length;
  return `${formatCount(warnings, 'warning signal')}, ${formatCount(actions, 'action signal')}.`;
}

export function describeScores(points: readonly ScorePoint[], name: string, kind: ScoreKind): string {
  const ordered = orderScores(points);
  const [first, last] = [ordered[0], ordered.at(-1)];
  if (!first || !last) return 'No result could be scored.';
  const range =
    `${formatCount(ordered.length, 'score')} in ascending order of ${name}, from ${formatScore(first.score, kind)} ` +
    `(${first.code}) to ${formatScore(last.score, kind)} (${last.code}).`;
  return `${range} ${countSignals(ordered.map((point) => point.signal))}`;
}

export function describeResults(
  results: readonly ResultPoint[],
  { assigned, unit, decimals }: { assigned: AssignedValue; unit: string; decimals: number },
): string {
  const values = results.map((result) => result.value).sort((a, b) => a - b);
  const show = (value: number | undefined) => formatNumber(value, decimals);
  if (values.length === 0) return 'No numeric result.';
  return (
    `${formatCount(values.length, 'result')}${values.length > 1 ? ` from ${show(values[0])} to` : ','} ` +
    `${show(values.at(-1))} ${unit}; ` +
    `assigned value ${show(assigned.value)} ${unit}, sigma_pt ${formatNumber(assigned.sigmaPt, decimals + 1)} ${unit}. ` +
    countSignals(results.map((result) => result.signal))
  );
}

export function describeTrend(rounds: readonly TrendPoint[], name: string, kind: ScoreKind): string {
  const scored = rounds.filter((round) => round.score !== null && round.signal !== 'not-scored');
  const newest = scored.at(-1);
  if (!newest) return 'No round has a score yet.';
  return (
    `${name} in ${formatCount(scored.length, 'round')}; the newest, ${newest.label}, is ` +
    `${formatScore(newest.score, kind)}${signalWords(newest.signal)}. ${countSignals(scored.map((round) => round.signal))}`
  );
}
