import { checkPositive, representable } from '../../internal/check-values';
import { sampleSd, scaledMean } from '../../internal/sums';
import { StatsError } from '../../stats-error';
import { withinVariance } from '../internal/within-variance';
import { LIMITS_MULTIPLIER } from './bland-altman';

export interface ReplicateAgreement {
  readonly count: number;
  /** Mean of the differences of item means, second method less first. */
  readonly mean: number;
  /** Standard deviation of those differences, and what it would be for single readings. */
  readonly sdOfMeans: number;
  readonly sd: number;
  readonly lowerLimit: number;
  readonly upperLimit: number;
  /** Standard deviation of readings of one item by one method. */
  readonly withinSdX: number;
  readonly withinSdY: number;
  readonly multiplier: number;
}

/**
 * Limits of agreement for single readings when each item was read several times by both methods.
 *
 * Differences of item means vary less than those of single readings; what averaging took away is added again.
 *
 * @param x - readings of the first method by item. Shape: k items of one or more values; at least 2 items, one with 2
 *   values or more. Unit: unit of the data.
 * @param y - readings of the second method by item. Shape: the same items. Unit: unit of the data.
 * @param options.multiplier - of the sd. Domain: > 0. Default 1.96.
 * @returns ReplicateAgreement, unit of the data
 * @throws StatsError unequal-lengths; too-few-values; not-finite; out-of-domain
 *
 * Ties and equal values: allowed. Order of input: does not matter within an item. Numerics: O(n).
 * Source: Bland and Altman 1986 (two readings); 1999, section 5.1: sd^2 = sdOfMeans^2 + (1 - 1/m_x) s_xw^2 +
 *   (1 - 1/m_y) s_yw^2, with the mean of 1/m for unequal numbers.
 * Checked by: tests/reference/method-comparison (pefr), tests/stats/method-comparison/bland-altman.test.ts.
 * @example replicateAgreement([[1, 2], [3, 4], [5, 7]], [[2, 2], [3, 5], [6, 6]]) // => mean 0.3333, sd 1.0541
 */
export function replicateAgreement(
  x: readonly (readonly number[])[],
  y: readonly (readonly number[])[],
  options: { readonly multiplier?: number } = {},
): ReplicateAgreement {
  const caller = 'replicateAgreement';
  const multiplier = options.multiplier ?? LIMITS_MULTIPLIER;
  checkPositive(caller, 'multiplier', multiplier);
  if (x.length !== y.length) {
    throw new StatsError(
      'unequal-lengths',
      `${caller} requires the same items, found ${x.length} and ${y.length}`,
    );
  }
  if (x.length < 2) {
    throw new StatsError('too-few-values', `${caller} requires at least 2 items, found ${x.length}`);
  }
  const withinX = withinVariance(caller, x);
  const withinY = withinVariance(caller, y);
  const differences = x.map((values, i) => scaledMean(y[i] as readonly number[], 1) - scaledMean(values, 1));
  const mean = representable(caller, scaledMean(differences, 1));
  const sdOfMeans = sampleSd(differences);
  const lost = (within: typeof withinX) => (1 - within.meanInverseCount) * within.variance;
  const sd = representable(caller, Math.sqrt(sdOfMeans ** 2 + lost(withinX) + lost(withinY)));
  return {
    count: x.length,
    mean,
    sdOfMeans,
    sd,
    lowerLimit: mean - multiplier * sd,
    upperLimit: mean + multiplier * sd,
    withinSdX: Math.sqrt(withinX.variance),
    withinSdY: Math.sqrt(withinY.variance),
    multiplier,
  };
}
