import { checkValues } from '../internal/check-values';
import { medianInPlace } from '../internal/median-in-place';

/**
 * Median: the middle of the ordered values, or half-way between the two middle ones.
 *
 * The simplest robust estimate of location: up to half of the values may be wild without carrying it away.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @returns the median, unit of the data
 * @throws StatsError too-few-values when there are none; not-finite when one is not a finite number
 *
 * Ties and equal values: allowed. Zero spread: that value. Order of input: does not matter.
 * Numerics: selection without a sort, O(n); no overflow in the mean of two large values; zero is never negative zero.
 * Source: ISO 13528:2022, Annex C.2.1.
 * Checked by: tests/stats/location-scale/mad-e.test.ts, tests/reference/proficiency.
 * @example median([3, 1, 2, 10]) // => 2.5
 */
export function median(values: readonly number[]): number {
  checkValues('median', values, 1);
  return medianInPlace(new Float64Array(values));
}
