import { checkValues } from '../internal/check-values';
import type { QuantileType } from '../internal/quantile-rank';
import { quantileOfSorted, sortedCopy } from '../internal/sorted';
import { StatsError } from '../stats-error';

export type { QuantileType };

export interface QuantileOptions {
  readonly type?: QuantileType;
}

/**
 * Quantile: the value below which a given share of the data lies, by one of nine usual definitions.
 *
 * The standards of the trade ask for quartiles without fixing the rule, and programs differ: for the same data
 * the normalised interquartile range can differ in its second figure. Say the type with the figure.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param probability - the share. Unit: none. Domain: 0 to 1.
 * @param options.type - definition, numbered as by Hyndman and Fan. Default 7 (linear between order statistics, the
 *   minimum at 0 and the maximum at 1), because most open statistics programs start with it. Types 1 to 3 are steps.
 * @returns the quantile, unit of the data
 * @throws StatsError too-few-values when there are none; not-finite when one is not a finite number; out-of-domain
 *   when the probability is not between 0 and 1 or the type is not 1 to 9
 *
 * Ties and equal values: allowed. Zero spread: that value. Order of input: does not matter.
 * Numerics: one sort, O(n log n); a rank within 4 machine epsilons of a whole number is taken as whole.
 *   simple-statistics has a quantile too, but of type 2 only, so it is not used.
 * Source: Hyndman and Fan 1996, Sample Quantiles in Statistical Packages, American Statistician 50, 361-365.
 * Checked by: tests/stats/location-scale/quantile.test.ts (numpy for all nine types).
 * @example quantile([1, 2, 3, 10], 0.25) // => 1.75
 */
export function quantile(
  values: readonly number[],
  probability: number,
  options: QuantileOptions = {},
): number {
  const type = options.type ?? 7;
  checkValues('quantile', values, 1);
  if (!(probability >= 0 && probability <= 1)) {
    throw new StatsError(
      'out-of-domain',
      `quantile requires a probability from 0 to 1, found ${probability}`,
    );
  }
  if (!Number.isInteger(type) || type < 1 || type > 9) {
    throw new StatsError('out-of-domain', `quantile knows the types 1 to 9, found ${String(type)}`);
  }
  return quantileOfSorted(sortedCopy(values), probability, type);
}
