import { fUpperQuantile, studentTUpperQuantile } from '../distributions';
import { checkAlpha, checkCount } from './check-alpha';

export interface MandelCriticalInput {
  readonly laboratories: number;
  readonly replicates: number;
  readonly alpha: number;
}

export interface MandelCritical {
  /** Limit of |h|; null below 3 laboratories, where h can only be 0.7071. */
  readonly h: number | null;
  /** Limit of k; null for single results, which have no k. */
  readonly k: number | null;
}

/**
 * Limits of Mandel's h and k, any number of laboratories and replicates.
 *
 * @param input.laboratories - p. Domain: whole; at least 2.
 * @param input.replicates - n, results a laboratory. Domain: whole; at least 1.
 * @param input.alpha - significance level for each single statistic; of h on both sides together. Domain: (0, 1).
 * @returns { h, k }, no unit
 * @throws StatsError too-few-values; out-of-domain for an alpha outside (0, 1) or numbers that are not whole
 *
 * Numerics: h = (p - 1) t / sqrt(p (t^2 + p - 2)), t at alpha / 2 with p - 2 degrees of freedom;
 *   k = sqrt(p F / (p - 1 + F)), F at alpha with n - 1 and (p - 1)(n - 1) degrees of freedom. Both exact.
 * Source: ISO 5725-2:2019, 7.3.1 and its tables; Wilrich 2013, Advances in Statistical Analysis 97, 1.
 * Checked by: tests/stats/outliers/critical-values.test.ts, tests/reference/interlaboratory.
 * @example mandelCritical({ laboratories: 8, replicates: 3, alpha: 0.05 }) // => h 1.74908, k 1.66892
 */
export function mandelCritical({
  laboratories: p,
  replicates: n,
  alpha,
}: MandelCriticalInput): MandelCritical {
  checkCount('mandelCritical', 'laboratories', p, 2);
  checkCount('mandelCritical', 'replicates', n, 1);
  checkAlpha('mandelCritical', alpha);
  return { h: p < 3 ? null : limitOfH(p, alpha), k: n < 2 ? null : limitOfK(p, n, alpha) };
}

function limitOfH(p: number, alpha: number): number {
  const t = studentTUpperQuantile(alpha / 2, p - 2);
  return (p - 1) / Math.sqrt(p) / Math.sqrt(1 + (p - 2) / t / t);
}

function limitOfK(p: number, n: number, alpha: number): number {
  return Math.sqrt(p / ((p - 1) / fUpperQuantile(alpha, n - 1, (p - 1) * (n - 1)) + 1));
}
