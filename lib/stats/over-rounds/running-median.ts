import { checkValues } from '../internal/check-values';
import { medianOfSorted, sortedCopy } from '../internal/sorted';
import { StatsError } from '../stats-error';

/**
 * Running median of z: the median of each round and those before it, within a window.
 *
 * One wild score does not move it, a lasting shift does. At the start the window holds the rounds there are.
 *
 * @param values - scores in the order of the rounds. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param options.window - rounds looked at, the latest included. Domain: whole; at least 1. Default 5 (common practice).
 * @returns the medians, one a round, unit of the data
 * @throws StatsError too-few-values; not-finite; out-of-domain for a window that is not a whole number above 0
 *
 * Ties and equal values: allowed. Order of input: matters. Numerics: O(n w log w).
 * Source: common practice; Tukey 1977, Exploratory Data Analysis, chapter 7.
 * Checked by: tests/stats/over-rounds/over-rounds.test.ts.
 * @example runningMedian([1, 9, 2, 3], { window: 3 }) // => [1, 5, 2, 3]
 */
export function runningMedian(
  values: readonly number[],
  options: { readonly window?: number } = {},
): number[] {
  const window = options.window ?? 5;
  checkValues('runningMedian', values, 1);
  if (!(Number.isInteger(window) && window >= 1)) {
    throw new StatsError(
      'out-of-domain',
      `runningMedian requires a whole window of at least 1, found ${window}`,
    );
  }
  return values.map((_, i) => medianOfSorted(sortedCopy(values.slice(Math.max(0, i + 1 - window), i + 1))));
}
