import { checkFinite } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { around } from '../internal/confidence';
import type { Interval } from '../types';
import type { LineFit } from './line-fit';

export interface LinePrediction {
  /** a + b x. Unit: unit of y. */
  readonly fitted: number;
  /** Standard error of the mean response at x. */
  readonly standardError: number;
  /** Interval for the mean response. */
  readonly interval: Interval;
  /** Interval for the mean of `replicates` new values at x; null with stated uncertainties, which differ by point. */
  readonly predictionInterval: Interval | null;
}

/**
 * What a fitted line says at an x, with the interval of the line and that of new values.
 *
 * @param fit - from ordinaryLeastSquares or weightedLeastSquares
 * @param x - where. Unit: unit of x. Domain: finite. Outside the data it is an extrapolation, which nothing here flags.
 * @param options.replicates - number of new values whose mean is predicted, at unit weight. Default 1.
 * @returns { fitted, standardError, interval, predictionInterval }
 * @throws StatsError not-finite; out-of-domain for fewer than 1 replicate
 *
 * Numerics: about the mean of x, O(1). Source: Draper and Smith 1998, 3.1.
 * Checked by: tests/reference/method-comparison (gum_h3, norris), tests/stats/method-comparison/least-squares.test.ts.
 * @example predictLine(ordinaryLeastSquares([1, 2, 3, 4], [2, 4, 6, 9]), 2.5) // => fitted 5.25, standardError 0.2165
 */
export function predictLine(
  fit: LineFit,
  x: number,
  options: { readonly replicates?: number } = {},
): LinePrediction {
  const replicates = options.replicates ?? 1;
  checkFinite('predictLine', 'x', x);
  if (!Number.isInteger(replicates) || replicates < 1) {
    throw new StatsError('out-of-domain', `predictLine requires at least 1 replicate, found ${replicates}`);
  }
  const unit = fit.knownUncertainties ? 1 : fit.residualSd;
  const away = fit.throughOrigin ? x : x - fit.meanX;
  const share = (fit.throughOrigin ? 0 : 1 / fit.sumOfWeights) + (away / fit.rootSxx) ** 2;
  const fitted = fit.throughOrigin ? fit.slope * x : fit.meanY + fit.slope * away;
  const standardError = unit * Math.sqrt(share);
  const single = unit * Math.sqrt(share + 1 / replicates);
  return {
    fitted,
    standardError,
    interval: around(fitted, fit.factor * standardError),
    predictionInterval: fit.knownUncertainties ? null : around(fitted, fit.factor * single),
  };
}
