import { checkFinite, checkNotNegative } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import type { Interval } from '../types';
import type { LineFit } from './line-fit';

export interface CalibrationInverse {
  /** (y0 - a) / b. Unit: unit of x. */
  readonly value: number;
  /** Standard uncertainty by propagation through the line: u(y0), u(a), u(b) and their covariance. */
  readonly standardUncertainty: number;
  /**
   * Fieller limits, by turning the prediction band round; null with stated uncertainties, and when the slope does not
   * differ from 0 so that no limits exist.
   */
  readonly interval: Interval | null;
}

export interface CalibrationInverseOptions {
  /** Number of readings whose mean is y0. Default 1. */
  readonly replicates?: number;
  /** u(y0), where it is stated. Default: the residual sd over sqrt(replicates). Needed with stated uncertainties. */
  readonly uncertainty?: number;
}

/**
 * The x that belongs to a new y, read from a calibration line, with its uncertainty.
 *
 * @param fit - from ordinaryLeastSquares or weightedLeastSquares
 * @param y0 - the new reading or mean of readings. Unit: unit of y. Domain: finite.
 * @param options.replicates - readings in y0, at unit weight. Default 1.
 * @param options.uncertainty - u(y0), unit of y, >= 0.
 * @returns { value, standardUncertainty, interval }
 * @throws StatsError not-finite; no-spread when the slope is 0; out-of-domain for senseless options, or stated
 *   uncertainties without u(y0)
 *
 * Numerics: the quadratic is solved about the means, O(1).
 * Source: Fieller 1954, J R Stat Soc B 16, 175; propagation: ISO/TS 28037:2010, 11.2.
 * Checked by: tests/reference/method-comparison (iso28037_wls1, linewidth_nist),
 *   tests/stats/method-comparison/least-squares.test.ts.
 * @example calibrationInverse(ordinaryLeastSquares([1, 2, 3, 4], [2, 4, 6, 9]), 5.25) // => value 2.5
 */
export function calibrationInverse(
  fit: LineFit,
  y0: number,
  options: CalibrationInverseOptions = {},
): CalibrationInverse {
  const replicates = checkOptions(fit, y0, options);
  const { slope, intercept, interceptSe, slopeSe, covariance } = fit;
  const uncertainty = options.uncertainty ?? fit.residualSd / Math.sqrt(replicates);
  const e = y0 - (fit.throughOrigin ? 0 : fit.meanY);
  const value = (fit.throughOrigin ? 0 : fit.meanX) + e / slope;
  const variance = uncertainty ** 2 + interceptSe ** 2 + (value * slopeSe) ** 2 + 2 * value * covariance;
  if (!Number.isFinite(value) || !Number.isFinite(intercept / slope)) {
    throw new StatsError('out-of-domain', 'calibrationInverse gives a result that is too large to represent');
  }
  return {
    value: value + 0,
    standardUncertainty: Math.sqrt(Math.max(0, variance)) / Math.abs(slope),
    interval: fit.knownUncertainties ? null : fieller(fit, e, replicates),
  };
}

function checkOptions(fit: LineFit, y0: number, options: CalibrationInverseOptions): number {
  checkFinite('calibrationInverse', 'reading', y0);
  const replicates = options.replicates ?? 1;
  if (!Number.isInteger(replicates) || replicates < 1) {
    throw new StatsError(
      'out-of-domain',
      `calibrationInverse requires at least 1 replicate, found ${replicates}`,
    );
  }
  if (options.uncertainty !== undefined)
    checkNotNegative('calibrationInverse', 'uncertainty of the reading', options.uncertainty);
  else if (fit.knownUncertainties) {
    throw new StatsError(
      'out-of-domain',
      'calibrationInverse requires the uncertainty of the reading for a line from stated uncertainties',
    );
  }
  if (fit.slope === 0) throw new StatsError('no-spread', 'calibrationInverse requires a slope other than 0');
  return replicates;
}

/** Solves (e - b d)^2 = t^2 s^2 (1/m + 1/n + d^2/Sxx) for d = x - mean of x, with all divided by b^2. */
function fieller(fit: LineFit, e: number, replicates: number): Interval | null {
  const { slope, rootSxx, factor, residualSd } = fit;
  const spread = factor * (residualSd / Math.abs(slope));
  const a = 1 - (spread / rootSxx) ** 2;
  if (!(a > 0)) return null;
  const share = 1 / replicates + (fit.throughOrigin ? 0 : 1 / fit.sumOfWeights);
  const away = e / slope;
  const root = spread * Math.sqrt(a * share + (away / rootSxx) ** 2);
  const centre = fit.throughOrigin ? 0 : fit.meanX;
  return { lower: centre + (away - root) / a, upper: centre + (away + root) / a };
}
