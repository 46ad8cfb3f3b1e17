import { representable } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { withinVariance } from '../internal/within-variance';

export interface ErrorRatio {
  /** Variance of the error of y over that of x. */
  readonly errorRatio: number;
  readonly withinSdX: number;
  readonly withinSdY: number;
  readonly degreesOfFreedomX: number;
  readonly degreesOfFreedomY: number;
}

/**
 * Error ratio for a Deming line from the replicates of both methods.
 *
 * The ratio is that of single readings. For a line through item means of k_x and k_y replicates multiply it by k_x / k_y.
 *
 * @param x - replicates of the first method by item. Shape: items of one or more values. Unit: unit of x.
 * @param y - replicates of the second method by item. Shape: items of one or more values. Unit: unit of y.
 * @returns { errorRatio, withinSdX, withinSdY, degreesOfFreedomX, degreesOfFreedomY }
 * @throws StatsError too-few-values when a method has no item with 2 or more values; not-finite; no-spread when all
 *   replicates of a method agree
 *
 * Source: pooled variance within items, ISO 5725-2, 7.4. Checked by: tests/stats/method-comparison/deming.test.ts.
 * @example errorRatioFromReplicates([[1, 2], [3, 4]], [[1, 3], [3, 5]]) // => errorRatio 4
 */
export function errorRatioFromReplicates(
  x: readonly (readonly number[])[],
  y: readonly (readonly number[])[],
): ErrorRatio {
  const caller = 'errorRatioFromReplicates';
  const withinX = withinVariance(caller, x);
  const withinY = withinVariance(caller, y);
  if (withinX.variance === 0 || withinY.variance === 0) {
    throw new StatsError(
      'no-spread',
      `${caller} requires replicates that differ, found all equal for one method`,
    );
  }
  return {
    errorRatio: representable(caller, withinY.variance / withinX.variance),
    withinSdX: Math.sqrt(withinX.variance),
    withinSdY: Math.sqrt(withinY.variance),
    degreesOfFreedomX: withinX.degreesOfFreedom,
    degreesOfFreedomY: withinY.degreesOfFreedom,
  };
}
