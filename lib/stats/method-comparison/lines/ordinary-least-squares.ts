import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import type { ConfidenceOptions } from '../types';
import { buildLineFit } from './build-line-fit';
import type { LineFit } from './line-fit';

export interface OrdinaryLeastSquaresOptions extends ConfidenceOptions {
  readonly throughOrigin?: boolean;
  readonly working?: boolean;
}

/**
 * Ordinary least squares: the straight line with the smallest sum of squared vertical distances.
 *
 * For an x without error to speak of (a calibration). With errors in x the slope is drawn towards zero: use Deming or
 * York then.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 3, two different.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.throughOrigin - force the intercept to 0; then 2 pairs are enough. Default false.
 * @param options.confidence - of the intervals. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns LineFit: intercept and slope with standard errors, covariance and t intervals, residual sd, r squared
 *   (about 0 through the origin, as NIST certifies it)
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x are equal (through the origin:
 *   all 0); out-of-domain for an option or a result too large to represent
 *
 * Ties and equal values: allowed; all y equal gives slope 0 and rSquared null. Order of input: does not matter.
 * Numerics: normal equations in 32-figure arithmetic about the middle of x, O(n).
 * Source: Draper and Smith 1998, ch. 1.
 * Checked by: tests/reference/method-comparison (NIST StRD), tests/stats/method-comparison/least-squares.test.ts.
 * @example ordinaryLeastSquares([1, 2, 3, 4], [2, 4, 6, 9]) // => slope 2.3, intercept -0.5
 */
export function ordinaryLeastSquares(
  x: readonly number[],
  y: readonly number[],
  options: OrdinaryLeastSquaresOptions = {},
): LineFit {
  const caller = 'ordinaryLeastSquares';
  const throughOrigin = options.throughOrigin ?? false;
  checkPairs(caller, x, y, throughOrigin ? 2 : 3);
  if (throughOrigin && x.every((value) => value === 0)) {
    throw new StatsError('no-spread', `${caller} through the origin requires an x other than 0`);
  }
  const confidence = confidenceOf(caller, options.confidence);
  const working = options.working ?? false;
  return buildLineFit({ caller, x, y, weights: null, throughOrigin, known: false, confidence, working });
}
