import { checkValues, representable } from '../internal/check-values';
import type { QuantileType } from '../internal/quantile-rank';
import { quantileOfSorted, sortedCopy } from '../internal/sorted';
import { hingesOfSorted } from './hinges';

/** 1 / (2 * 0.67449): makes the interquartile range estimate the standard deviation of normal data. */
export const NIQR_FACTOR = 0.7413;

export interface NIqrOptions {
  readonly quantileType?: QuantileType | 'hinges';
}

/**
 * Normalised interquartile range, nIQR: a robust standard deviation from the distance of the quartiles.
 *
 * Up to a quarter of the values may be wild on either side. The standard does not fix the quartile rule.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.quantileType - definition of the quartiles (see quantile), or 'hinges' for Tukey's. Default 7.
 * @returns 0.7413 (Q3 - Q1), unit of the data
 * @throws StatsError too-few-values below 2 values; not-finite when one is not a finite number; out-of-domain when
 *   the result is too large to represent
 *
 * Ties and equal values: allowed. Zero spread: 0. Order of input: does not matter.
 * Numerics: one sort, O(n log n).
 * Source: ISO 13528:2022, Annex C.2.3.
 * Checked by: tests/stats/location-scale/mad-e.test.ts and quantile.test.ts, tests/reference/proficiency.
 * @example nIqr([1, 2, 3, 4, 100]) // => 1.4826
 */
export function nIqr(values: readonly number[], options: NIqrOptions = {}): number {
  checkValues('nIqr', values, 2);
  const sorted = sortedCopy(values);
  const type = options.quantileType ?? 7;
  if (type === 'hinges') {
    const { lower, upper } = hingesOfSorted(sorted);
    return representable('nIqr', normalised(lower, upper));
  }
  return representable('nIqr', nIqrOfSorted(sorted, type));
}

/** The same for values that are already sorted and checked; Infinity when it cannot be represented. */
export function nIqrOfSorted(sorted: Float64Array, type: QuantileType): number {
  const upper = quantileOfSorted(sorted, 0.75, type);
  const lower = quantileOfSorted(sorted, 0.25, type);
  return normalised(lower, upper);
}

function normalised(lower: number, upper: number): number {
  const range = upper - lower;
  return Number.isFinite(range) ? NIQR_FACTOR * range : NIQR_FACTOR * upper - NIQR_FACTOR * lower;
}
