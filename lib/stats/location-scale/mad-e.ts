import { checkValues, representable } from '../internal/check-values';
import { medianDeviationInPlace, medianInPlace } from '../internal/median-in-place';

/**
 * Factor that makes the median absolute deviation estimate the standard deviation of normal data: 1 / 0.67449 is
 * 1.48260; ISO 13528 and the trade print and use 1.483.
 */
export const MAD_FACTOR = 1.483;

/**
 * Scaled median absolute deviation, MADe: a robust standard deviation from the distances to the median.
 *
 * The start value of Algorithm A. It is zero as soon as more than half of the values are equal.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @returns 1.483 times the median of |x - median|, unit of the data
 * @throws StatsError too-few-values when there are none; not-finite when one is not a finite number; out-of-domain
 *   when the result is too large to represent
 *
 * Ties and equal values: allowed. Zero spread: 0. Order of input: does not matter.
 * Numerics: two selections without a sort, O(n).
 * Source: ISO 13528:2022, Annex C.2.2.
 * Checked by: tests/stats/location-scale/mad-e.test.ts, tests/reference/proficiency.
 * @example madE([1, 2, 3, 4, 100]) // => 1.483
 */
export function madE(values: readonly number[]): number {
  checkValues('madE', values, 1);
  const copy = new Float64Array(values);
  return representable('madE', MAD_FACTOR * medianDeviationInPlace(copy, medianInPlace(copy)));
}
