import { chiSquareSurvival } from '../../distributions';
import { checkPositive } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import type { ConfidenceOptions } from '../types';
import { buildLineFit } from './build-line-fit';
import type { LineFit } from './line-fit';

export interface WeightedLeastSquaresOptions extends ConfidenceOptions {
  /** Weights up to a common factor; the scatter is then estimated from the residuals. */
  readonly weights?: readonly number[];
  /** Standard uncertainties of y; the standard errors then follow from them alone. */
  readonly uncertainties?: readonly number[];
  readonly throughOrigin?: boolean;
  readonly working?: boolean;
}

export interface WeightedLineFit extends LineFit {
  /** Weighted sum of squared residuals. With stated uncertainties it should be near degreesOfFreedom. */
  readonly chiSquare: number;
  /** Probability of a larger chiSquare if the stated uncertainties hold; null with weights alone. */
  readonly chiSquareProbability: number | null;
}

/**
 * Weighted least squares: a straight line where some y are better known than others.
 *
 * Give either `uncertainties` (then the weights are 1 / u^2 and the errors of the line follow from u, tested by chi
 * square) or `weights` (only their ratios count, and the scatter about the line sets the errors).
 *
 * @param x - values without error to speak of. Shape: n values. Unit: unit of x. Domain: finite; at least 3.
 * @param y - measured values. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.weights - Shape: n values. Domain: > 0.
 * @param options.uncertainties - u(y). Shape: n values. Unit: unit of y. Domain: > 0.
 * @param options.throughOrigin - force the intercept to 0. Default false.
 * @param options.confidence - of the intervals (normal with uncertainties, t with weights). Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns WeightedLineFit: as ordinaryLeastSquares, with chiSquare and its probability
 * @throws StatsError as ordinaryLeastSquares; out-of-domain when both or none of weights and uncertainties are given
 *
 * Ties and equal values: allowed. Order of input: does not matter.
 * Numerics: as ordinaryLeastSquares, O(n).
 * Source: ISO/TS 28037:2010, clause 6.
 * Checked by: tests/reference/method-comparison (iso28037_wls1), tests/stats/method-comparison/least-squares.test.ts.
 * @example weightedLeastSquares([1, 2, 3], [1, 2, 4], { weights: [1, 1, 2] }) // => slope 1.5454545
 */
export function weightedLeastSquares(
  x: readonly number[],
  y: readonly number[],
  options: WeightedLeastSquaresOptions,
): WeightedLineFit {
  const caller = 'weightedLeastSquares';
  checkPairs(caller, x, y, 3);
  const known = options.uncertainties !== undefined;
  const given = options.uncertainties ?? options.weights;
  if (given === undefined || (known && options.weights !== undefined)) {
    throw new StatsError('out-of-domain', `${caller} requires either weights or uncertainties`);
  }
  if (given.length !== x.length) {
    throw new StatsError(
      'unequal-lengths',
      `${caller} requires a ${known ? 'uncertainty' : 'weight'} for each of the ${x.length} pairs, found ${given.length}`,
    );
  }
  given.forEach((value, i) =>
    checkPositive(caller, `${known ? 'uncertainty' : 'weight'} at position ${i + 1}`, value),
  );
  const weights = known ? given.map((value) => 1 / (value * value)) : given;
  if (!weights.every((weight) => Number.isFinite(weight) && weight > 0)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} found an uncertainty too small or too large to be squared`,
    );
  }
  const fit = buildLineFit({
    caller,
    x,
    y,
    weights,
    throughOrigin: options.throughOrigin ?? false,
    known,
    confidence: confidenceOf(caller, options.confidence),
    working: options.working ?? false,
  });
  const chiSquare = fit.residualSd ** 2 * fit.degreesOfFreedom;
  const chiSquareProbability = known ? chiSquareSurvival(chiSquare, fit.degreesOfFreedom) : null;
  return { ...fit, chiSquare, chiSquareProbability };
}
