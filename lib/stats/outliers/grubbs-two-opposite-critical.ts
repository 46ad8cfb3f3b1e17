import { studentTUpperQuantile } from '../distributions';
import { checkAlpha, checkCount } from './check-alpha';

/**
 * Critical value of the test for two outliers on opposite sides, any n: the range over the standard deviation.
 *
 * @param input.count - n. Domain: whole; at least 3.
 * @param input.alpha - significance level. Domain: between 0 and 1.
 * @returns the critical value of (max - min) / s, no unit
 * @throws StatsError too-few-values below 3; out-of-domain for an alpha outside (0, 1) or n not whole
 *
 * Numerics: sqrt(2 (n - 1) t^2 / (n - 2 + t^2)), t at alpha / (n (n - 1)) with n - 2 degrees of freedom: a bound by
 *   the sum over all pairs, exact for small n, up to 0.02 above the table at n = 20 and 5 percent.
 * Source: David, Hartley and Pearson 1954, Biometrika 41, 482.
 * Checked by: tests/stats/outliers/critical-values.test.ts (table from memory, seeded simulation).
 * @example grubbsTwoOppositeCritical({ count: 10, alpha: 0.05 }) // => 3.685
 */
export function grubbsTwoOppositeCritical(input: { readonly count: number; readonly alpha: number }): number {
  const { count: n, alpha } = input;
  checkCount('grubbsTwoOppositeCritical', 'values', n, 3);
  checkAlpha('grubbsTwoOppositeCritical', alpha);
  const t = studentTUpperQuantile(Math.min(0.5, alpha / (n * (n - 1))), n - 2);
  return t === 0 ? 0 : Math.sqrt((2 * (n - 1)) / (1 + (n - 2) / t / t));
}
