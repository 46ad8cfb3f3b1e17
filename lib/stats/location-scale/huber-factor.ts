import { normalCdf, normalDensity, normalSurvival } from '../distributions/normal';
import { checkFinite } from '../internal/check-values';
import { StatsError } from '../stats-error';

/** The k of Huber's estimators when none is given. */
export const HUBER_K = 1.5;

/**
 * Consistency factor of Huber's proposal 2: what a standard deviation of values winsorised at +- k has to be multiplied
 * by to estimate that of normal data; for k = 1.5 it is 1.13339, which the standard prints as 1.134.
 *
 * @param k - winsorising limit in standard deviations. Unit: none. Domain: finite; > 0.
 * @returns 1 / sqrt(beta), beta = 2 Phi(k) - 1 + 2 k^2 (1 - Phi(k)) - 2 k phi(k), no unit
 * @throws StatsError not-finite; out-of-domain when k is not above 0
 *
 * Numerics: one formula; below k = 0.05 its terms cancel and digits are lost.
 * Source: Huber 1981, Robust Statistics, 6.4.
 * Checked by: tests/reference/proficiency (const-algA), tests/stats/location-scale/huber.test.ts.
 * @example huberFactor(1.5) // => 1.13339
 */
export function huberFactor(k: number): number {
  checkFinite('huberFactor', 'k', k);
  if (!(k > 0)) throw new StatsError('out-of-domain', `huberFactor requires k above 0, found ${k}`);
  const outside = 2 * normalSurvival(k);
  const inside = normalCdf(k) - normalCdf(-k);
  return 1 / Math.sqrt(inside + k * k * outside - 2 * k * normalDensity(k));
}
