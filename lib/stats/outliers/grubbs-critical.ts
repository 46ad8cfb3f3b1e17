import { studentTUpperQuantile } from '../distributions';
import { checkAlpha, checkCount } from './check-alpha';

export interface GrubbsCriticalInput {
  readonly count: number;
  readonly alpha: number;
  /** 2 when either end could be the outlier (ISO 5725-2), 1 when only one end is asked for. */
  readonly sides: 1 | 2;
}

/**
 * Critical value of Grubbs' test for one outlier, any n.
 *
 * @param input.count - n. Domain: whole; at least 3.
 * @param input.alpha - significance level. Domain: between 0 and 1.
 * @param input.sides - 2 as in the table of ISO 5725-2, 1 for one given end.
 * @returns the critical value of G, no unit
 * @throws StatsError too-few-values below 3; out-of-domain for an alpha outside (0, 1) or n not whole
 *
 * Numerics: (n - 1) / sqrt(n) sqrt(t^2 / (n - 2 + t^2)), t at alpha / (sides n) with n - 2 degrees of freedom. A bound
 *   by the sum of probabilities; equal to the published tables to their last digit or next to it.
 * Source: NIST/SEMATECH e-Handbook 1.3.5.17.1; Grubbs and Beck 1972, Technometrics 14, 847.
 * Checked by: tests/stats/outliers/critical-values.test.ts, tests/reference/interlaboratory.
 * @example grubbsCritical({ count: 8, alpha: 0.05, sides: 2 }) // => 2.12665
 */
export function grubbsCritical({ count: n, alpha, sides }: GrubbsCriticalInput): number {
  checkCount('grubbsCritical', 'values', n, 3);
  checkAlpha('grubbsCritical', alpha);
  const share = alpha / (sides * n);
  if (share >= 0.5) return 0;
  const t = studentTUpperQuantile(share, n - 2);
  // sqrt(t^2 / (df + t^2)) without overflow for a huge t.
  return (n - 1) / Math.sqrt(n) / Math.sqrt(1 + (n - 2) / t / t);
}
