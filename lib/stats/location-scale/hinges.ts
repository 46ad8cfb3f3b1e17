import { checkValues } from '../internal/check-values';
import { medianOfSorted, sortedCopy } from '../internal/sorted';

export interface Hinges {
  readonly lower: number;
  readonly upper: number;
}

/**
 * Tukey's hinges: the medians of the lower and the upper half, the median belonging to both when n is odd.
 *
 * A rule for quartiles that is none of the nine of quantile.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @returns { lower, upper }, unit of the data
 * @throws StatsError too-few-values when there are none; not-finite
 *
 * Ties and equal values: allowed. Order of input: does not matter. Numerics: one sort, O(n log n).
 * Source: Tukey 1977, Exploratory Data Analysis, 2.
 * Checked by: tests/stats/location-scale/trimmed-mean.test.ts, tests/reference/proficiency (estimators).
 * @example hinges([1, 2, 3, 4, 100]) // => { lower: 2, upper: 4 }
 */
export function hinges(values: readonly number[]): Hinges {
  checkValues('hinges', values, 1);
  return hingesOfSorted(sortedCopy(values));
}

export function hingesOfSorted(sorted: Float64Array): Hinges {
  const half = (sorted.length + 1) >> 1;
  const upper = sorted.subarray(sorted.length - half);
  return { lower: medianOfSorted(sorted.subarray(0, half)), upper: medianOfSorted(upper) };
}
