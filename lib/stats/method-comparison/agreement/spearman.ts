import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import { midranks } from '../internal/midranks';
import type { ConfidenceOptions } from '../types';
import { correlationOf, type Correlation } from './pearson';

/**
 * Spearman rank correlation: how closely pairs follow any rising or falling relation.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 2, not all equal.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: as x.
 * @param options.confidence - of the interval (Fisher's z on the ranks, an approximation). Default 0.95.
 * @returns { count, coefficient, interval, probability, confidence }; the probability by the t approximation
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x or all y are equal
 *
 * Ties and equal values: mean ranks. Order of input: does not matter. Numerics: two sorts, O(n log n).
 * Source: Spearman 1904; Kendall 1970, Rank Correlation Methods, ch. 1 and 3.
 * Checked by: tests/reference/method-comparison (pefr), tests/stats/method-comparison/correlation.test.ts.
 * @example spearman([1, 2, 3, 4], [1, 3, 2, 40]).coefficient // => 0.8
 */
export function spearman(
  x: readonly number[],
  y: readonly number[],
  options: ConfidenceOptions = {},
): Correlation {
  const caller = 'spearman';
  checkPairs(caller, x, y, 2);
  const confidence = confidenceOf(caller, options.confidence);
  return correlationOf(caller, midranks(x), midranks(y), confidence);
}
