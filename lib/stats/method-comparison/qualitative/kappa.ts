import { StatsError } from '../../stats-error';
import { around, confidenceOf, zFactor } from '../internal/confidence';
import type { ConfidenceOptions, Interval } from '../types';

/** Items by the decisions of two methods. */
export interface TwoByTwo {
  readonly bothPositive: number;
  readonly onlyFirst: number;
  readonly onlySecond: number;
  readonly bothNegative: number;
}

export interface Kappa {
  /** Share of items on which the methods agree, and that expected by chance. */
  readonly agreement: number;
  readonly expected: number;
  /** (agreement - expected) / (1 - expected); null when both methods decide the same way on all items. */
  readonly kappa: number | null;
  readonly standardError: number | null;
  readonly interval: Interval | null;
}

/**
 * Cohen's kappa: agreement of two methods beyond chance.
 *
 * It depends on how common positives are; give it beside the table itself.
 *
 * @param table - counts of items. Domain: whole; >= 0; at least 1 item.
 * @param options.confidence - Default 0.95.
 * @returns Kappa; the interval is kept within -1 and 1
 * @throws StatsError too-few-values without items; out-of-domain for counts
 *
 * Numerics: O(1). Source: Cohen 1960; standard error: Fleiss, Cohen and Everitt 1969, Psychol Bull 72, 323-327.
 * Checked by: tests/stats/method-comparison/decisions.test.ts (a second computation in base R).
 * @example kappa({ bothPositive: 20, onlyFirst: 5, onlySecond: 10, bothNegative: 15 }).kappa // => 0.4
 */
export function kappa(table: TwoByTwo, options: ConfidenceOptions = {}): Kappa {
  const confidence = confidenceOf('kappa', options.confidence);
  const n = checkTable('kappa', table);
  const a = table.bothPositive / n;
  const b = table.onlyFirst / n;
  const c = table.onlySecond / n;
  const d = table.bothNegative / n;
  const first = a + b;
  const second = a + c;
  const agreement = (table.bothPositive + table.bothNegative) / n;
  const expected = first * second + (1 - first) * (1 - second);
  const ofOneKind = table.bothPositive === n || table.bothNegative === n;
  if (ofOneKind) return { agreement, expected: 1, kappa: null, standardError: null, interval: null };
  const value = (agreement - expected) / (1 - expected);
  const rest = 1 - value;
  const onDiagonal = a * (1 - (first + second) * rest) ** 2 + d * (1 - (2 - first - second) * rest) ** 2;
  const off = rest ** 2 * (b * (second + 1 - first) ** 2 + c * (1 - second + first) ** 2);
  const variance = (onDiagonal + off - (value - expected * rest) ** 2) / (n * (1 - expected) ** 2);
  const standardError = Math.sqrt(Math.max(0, variance));
  const { lower, upper } = around(value, zFactor(confidence) * standardError);
  const interval = { lower: Math.max(-1, lower), upper: Math.min(1, upper) };
  return { agreement, expected, kappa: value, standardError, interval };
}

/** Number of items; throws unless the counts are whole and there is an item. */
export function checkTable(caller: string, table: TwoByTwo): number {
  const counts = [table.bothPositive, table.onlyFirst, table.onlySecond, table.bothNegative];
  const wrong = counts.find((count) => !Number.isSafeInteger(count) || count < 0);
  if (wrong !== undefined) {
    throw new StatsError('out-of-domain', `${caller} requires whole counts of 0 or more, found ${wrong}`);
  }
  const n = counts.reduce((sum, count) => sum + count, 0);
  if (n === 0) throw new StatsError('too-few-values', `${caller} requires at least 1 item, found 0`);
  return n;
}
