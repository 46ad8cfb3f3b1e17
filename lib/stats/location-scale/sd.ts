import { checkValues, representable } from '../internal/check-values';
import { sampleSd } from '../internal/sums';

/**
 * Standard deviation of a sample, with divisor n - 1.
 *
 * For comparison with the robust estimates: one wild value moves it without bound.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @returns the standard deviation, unit of the data
 * @throws StatsError too-few-values below 2 values; not-finite when one is not a finite number; out-of-domain when
 *   the result is too large to represent
 *
 * Ties and equal values: allowed. Zero spread: exactly 0. Order of input: does not matter but for the last digit.
 * Numerics: compensated two-pass formula with the correction of Chan, Golub and LeVeque 1983, O(n); squares are
 *   taken after scaling by a power of two, so that 1e300 and subnormal values keep their digits.
 * Source: divisor n - 1 as in ISO 5725-2; NIST StRD univariate sets reproduced.
 * Checked by: tests/stats/location-scale/mean-sd.test.ts, tests/reference/proficiency.
 * @example sd([2, 4, 4, 6]) // => 1.632993161855452
 */
export function sd(values: readonly number[]): number {
  checkValues('sd', values, 2);
  return representable('sd', sampleSd(values));
}
