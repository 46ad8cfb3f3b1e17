import { checkValues } from '../internal/check-values';
import { safeFactor, scaledMean } from '../internal/sums';

/**
 * Arithmetic mean.
 *
 * For comparison with the robust estimates: one wild value moves it without bound.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @returns the mean, unit of the data
 * @throws StatsError too-few-values when there are none; not-finite when one is not a finite number
 *
 * Ties and equal values: allowed; equal values give exactly that value. Order of input: does not matter but for
 *   the last digit.
 * Numerics: compensated sum in two passes, O(n); no overflow for any finite values. The mean of simple-statistics
 *   agrees to the last digits on ordinary data but overflows at 1e308, so it serves as a check only.
 * Source: NIST StRD univariate sets reproduced.
 * Checked by: tests/stats/location-scale/mean-sd.test.ts, tests/reference/proficiency.
 * @example mean([1, 2, 6]) // => 3
 */
export function mean(values: readonly number[]): number {
  checkValues('mean', values, 1);
  const factor = safeFactor(values);
  return scaledMean(values, factor) / factor + 0;
}
