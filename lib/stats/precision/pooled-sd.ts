import { checkNotNegative, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface StandardDeviationInput {
  readonly sd: number;
  readonly degreesOfFreedom: number;
}

export interface PooledSdResult {
  readonly sd: number;
  readonly degreesOfFreedom: number;
}

/**
 * Pooled standard deviation: one figure from several that estimate the same spread.
 *
 * Root of the mean of the squares, weighted by degrees of freedom. Level by level it gives the standard deviations of
 * a nested study (within days, between days, between runs).
 *
 * @param sds - standard deviations with their degrees of freedom. Shape: k entries. Unit: unit of the data.
 *   Domain: sd finite, >= 0; degrees of freedom >= 0, one above 0.
 * @returns { sd: unit of the data, degreesOfFreedom: their sum }
 * @throws StatsError too-few-values when there are none or all have 0 degrees of freedom; not-finite; out-of-domain
 *
 * Zero spread: 0. Order of input: does not matter.
 * Numerics: squares are taken relative to the largest sd. O(k).
 * Source: NIST/SEMATECH e-Handbook 2.6.1 (gauge study); JCGM 100:2008, 4.2.4.
 * Checked by: tests/stats/precision/precision.test.ts, tests/reference/interlaboratory (gauge_mpc61).
 * @example pooledSd([{ sd: 3, degreesOfFreedom: 1 }, { sd: 4, degreesOfFreedom: 1 }]) // => sd 3.53553
 */
export function pooledSd(sds: readonly StandardDeviationInput[]): PooledSdResult {
  let largest = 0;
  let degreesOfFreedom = 0;
  for (const { sd, degreesOfFreedom: degrees } of sds) {
    checkNotNegative('pooledSd', 'standard deviation', sd);
    checkNotNegative('pooledSd', 'number of degrees of freedom', degrees);
    largest = Math.max(largest, sd);
    degreesOfFreedom += degrees;
  }
  if (degreesOfFreedom === 0) {
    throw new StatsError('too-few-values', 'pooledSd requires at least 1 degree of freedom, found 0');
  }
  if (largest === 0) return { sd: 0, degreesOfFreedom };
  const squares = sds.reduce((sum, { sd, degreesOfFreedom: df }) => sum + df * (sd / largest) ** 2, 0);
  return { sd: representable('pooledSd', largest * Math.sqrt(squares / degreesOfFreedom)), degreesOfFreedom };
}
