import { algorithmA } from '../location-scale/algorithm-a';
import { StatsError } from '../stats-error';

/**
 * sigma_pt from the results of this round: s* of Algorithm A.
 *
 * Scores then tell how a laboratory did against the others, not whether it is fit for purpose, and a round of poor
 * results is judged mildly. Compare with the other choices.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @returns s*, unit of the data
 * @throws StatsError too-few-values; not-finite; no-convergence; no-spread when the results leave no scale
 *
 * Zero spread: an error, since nothing can be scored by it. Order of input: does not matter.
 * Numerics: algorithmA, O(n log n).
 * Source: ISO 13528:2022, 8.6.
 * Checked by: tests/stats/sigma-pt/sigma-pt.test.ts.
 * @example robustSigma([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9]) // => 1.14596
 */
export function robustSigma(values: readonly number[]): number {
  const { scale } = algorithmA(values);
  if (scale === 0) {
    throw new StatsError('no-spread', 'robustSigma requires results that differ, found a robust scale of 0');
  }
  return scale;
}
