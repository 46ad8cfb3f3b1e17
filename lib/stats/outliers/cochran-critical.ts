import { fUpperQuantile } from '../distributions';
import { checkAlpha, checkCount } from './check-alpha';

export interface CochranCriticalInput {
  readonly groups: number;
  readonly replicates: number;
  readonly alpha: number;
}

/**
 * Critical value of Cochran's test, any number of groups and replicates.
 *
 * @param input.groups - p, the variances compared. Domain: whole; at least 2.
 * @param input.replicates - n, results behind each variance. Domain: whole; at least 2.
 * @param input.alpha - significance level. Domain: between 0 and 1.
 * @returns the critical value of C, no unit
 * @throws StatsError too-few-values; out-of-domain for an alpha outside (0, 1) or numbers that are not whole
 *
 * Numerics: 1 / (1 + (p - 1) / F), F at alpha / p with n - 1 and (p - 1)(n - 1) degrees of freedom: a bound by the
 *   sum of probabilities, exact where the value is above 0.5, elsewhere within 0.002 of the tables.
 * Source: ISO 5725-2:2019, 7.3.3 and its table; Cochran 1941, Annals of Eugenics 11, 47.
 * Checked by: tests/stats/outliers/critical-values.test.ts, tests/reference/interlaboratory.
 * @example cochranCritical({ groups: 8, replicates: 2, alpha: 0.05 }) // => 0.67982
 */
export function cochranCritical({ groups: p, replicates: n, alpha }: CochranCriticalInput): number {
  checkCount('cochranCritical', 'groups', p, 2);
  checkCount('cochranCritical', 'replicates', n, 2);
  checkAlpha('cochranCritical', alpha);
  return 1 / (1 + (p - 1) / fUpperQuantile(alpha / p, n - 1, (p - 1) * (n - 1)));
}
