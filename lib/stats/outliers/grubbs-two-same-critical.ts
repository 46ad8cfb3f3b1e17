import { checkAlpha, checkCount } from './check-alpha';
import type { GrubbsCriticalInput } from './grubbs-critical';
import { solveMonotone } from './solve-monotone';
import { twoLargestDistribution } from './two-largest-distribution';

/**
 * Critical value of Grubbs' test for two outliers on the same side, any n: suspicious is a ratio below it.
 *
 * @param input.count - n. Domain: whole; at least 4.
 * @param input.alpha - significance level. Domain: between 0 and 1.
 * @param input.sides - 2 as in the table of ISO 5725-2 (either the two largest or the two smallest), 1 for one side.
 * @returns the critical ratio of sums of squares, no unit
 * @throws StatsError too-few-values below 4; out-of-domain for an alpha outside (0, 1) or n not whole
 *
 * Numerics: the exact null distribution by recursion and one integral, good to about 1e-7; O(n), 0.1 ms a value.
 * Source: Grubbs 1950, Annals of Mathematical Statistics 21, 27; table: Grubbs and Beck 1972, Technometrics 14, 847.
 * Checked by: tests/stats/outliers/critical-values.test.ts (tables from memory, seeded simulation).
 * @example grubbsTwoSameCritical({ count: 9, alpha: 0.05, sides: 2 }) // => 0.1492
 */
export function grubbsTwoSameCritical({ count: n, alpha, sides }: GrubbsCriticalInput): number {
  checkCount('grubbsTwoSameCritical', 'values', n, 4);
  checkAlpha('grubbsTwoSameCritical', alpha);
  const probability = twoLargestDistribution(n);
  return solveMonotone(probability, alpha / sides, 0, 1);
}
