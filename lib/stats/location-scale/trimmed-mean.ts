import { checkValues, representable } from '../internal/check-values';
import { sortedCopy } from '../internal/sorted';
import { safeFactor, sampleSd, scaledMean } from '../internal/sums';
import { StatsError } from '../stats-error';

export interface TrimmedMeanOptions {
  readonly share?: number;
}

export interface TrimmedMeanResult {
  readonly mean: number;
  /** From the winsorised standard deviation (Tukey and McLaughlin 1963); null with fewer than 2 values left. */
  readonly standardError: number | null;
  readonly trimmedEachSide: number;
  readonly kept: number;
}

/**
 * Trimmed mean: the mean after the same number of values is cut from either end.
 *
 * For comparison with the robust estimates. It bears up to the trimmed share of wild values on either side.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param options.share - the share cut from each end; [n share] values. Default 0.1. Domain: 0 up to, not including, 0.5.
 * @returns { mean, standardError, trimmedEachSide, kept }
 * @throws StatsError too-few-values; not-finite; out-of-domain for the share or a result too large to represent
 *
 * Ties and equal values: allowed. Order of input: does not matter.
 * Numerics: one sort, compensated sums, O(n log n).
 * Source: Tukey and McLaughlin 1963, Sankhya A 25, 331-352.
 * Checked by: tests/stats/location-scale/trimmed-mean.test.ts.
 * @example trimmedMean([1, 2, 3, 4, 100], { share: 0.2 }).mean // => 3
 */
export function trimmedMean(
  values: readonly number[],
  { share = 0.1 }: TrimmedMeanOptions = {},
): TrimmedMeanResult {
  checkValues('trimmedMean', values, 1);
  if (!(share >= 0 && share < 0.5)) {
    throw new StatsError('out-of-domain', `trimmedMean requires a share from 0 to below 0.5, found ${share}`);
  }
  const n = values.length;
  // 0.1 of 30 is 3, although 0.1 * 30 may come out just below.
  const cut = Math.floor(n * share * (1 + 2 * Number.EPSILON));
  const sorted = sortedCopy(values);
  const kept = sorted.subarray(cut, n - cut);
  const factor = safeFactor(kept);
  const mean = scaledMean(kept, factor) / factor + 0;
  if (kept.length < 2) return { mean, standardError: null, trimmedEachSide: cut, kept: kept.length };
  const winsorised = sorted.slice().fill(sorted[cut] as number, 0, cut);
  winsorised.fill(sorted[n - cut - 1] as number, n - cut);
  const spread = sampleSd(winsorised) / ((1 - (2 * cut) / n) * Math.sqrt(n));
  return {
    mean,
    standardError: representable('trimmedMean', spread),
    trimmedEachSide: cut,
    kept: kept.length,
  };
}
