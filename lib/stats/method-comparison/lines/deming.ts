import { checkPositive } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import { scalePairs } from '../internal/scale-pairs';
import type { ConfidenceOptions } from '../types';
import { demingErrors } from './deming-errors';
import { centredSums, demingLine, requireLine } from './deming-slope';
import { demingWorking } from './deming-working';
import {
  errorsKindOf,
  finishLine,
  type DemingErrors,
  type ErrorsInVariablesLine,
} from './errors-in-variables';

export interface DemingOptions extends ConfidenceOptions {
  /** Variance of the error of y over that of x. Default 1. See errorRatioFromReplicates. */
  readonly errorRatio?: number;
  readonly standardErrors?: DemingErrors;
  readonly working?: boolean;
}

/**
 * Deming regression: the line when both methods have errors of a constant size, in a known ratio.
 *
 * The usual line for two methods of similar quality. With errors that grow with the level use weightedDeming. With
 * errorRatio 1 it is orthogonal regression, which is not free of the units chosen.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 3.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.errorRatio - Domain: > 0. Default 1.
 * @param options.standardErrors - 'jackknife' (default, needs no distribution) or 'analytic' (normal data, large n).
 * @param options.confidence - of the t intervals with n - 2 degrees of freedom. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns ErrorsInVariablesLine: intercept and slope with standard errors, covariance and intervals
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when the data have no direction, also with
 *   one pair left out; out-of-domain for an option or a result too large to represent
 *
 * Ties and equal values: allowed; all y equal gives slope 0. Swapping x and y with 1 / errorRatio gives 1 / slope.
 * Order of input: does not matter.
 * Numerics: compensated centred sums; the form of the root without cancellation; the lines with one pair left out
 *   follow from the sums, so the jackknife is O(n) too.
 * Source: Cornbleet and Gochman 1979, Clin Chem 25, 432-438; jackknife: Linnet 1990, Stat Med 9, 1463-1473; analytic:
 *   var(b) = b^2 (1 - r^2) / (r^2 (n - 2)), the large-sample variance for normal data (Fuller 1987, 1.3).
 * Checked by: tests/reference/method-comparison (pefr, milkfat, tire, norris), tests/stats/method-comparison/deming.test.ts.
 * @example deming([1, 2, 3, 4, 5], [1.1, 1.9, 3.2, 3.9, 5.1]) // => slope 1.0036, intercept 0.0292
 */
export function deming(
  x: readonly number[],
  y: readonly number[],
  options: DemingOptions = {},
): ErrorsInVariablesLine {
  const caller = 'deming';
  checkPairs(caller, x, y, 3);
  const errorRatio = options.errorRatio ?? 1;
  checkPositive(caller, 'error ratio', errorRatio);
  const confidence = confidenceOf(caller, options.confidence);
  const standardErrors = errorsKindOf(caller, options.standardErrors);
  const scaled = scalePairs(x, y);
  const ratio = errorRatio * (scaled.unitX / scaled.unitY) ** 2;
  if (!(ratio > 0 && ratio < Infinity)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} finds x and y too different in size for its error ratio`,
    );
  }
  const sums = centredSums(scaled.x, scaled.y);
  const line = requireLine(caller, demingLine(sums, ratio));
  const errors = demingErrors({ caller, ...scaled, sums, ratio, line, kind: standardErrors });
  const { unitX, unitY } = scaled;
  const count = x.length;
  const iterations = 0;
  const fit = finishLine({
    caller,
    count,
    line,
    errors,
    unitX,
    unitY,
    errorRatio,
    standardErrors,
    confidence,
    iterations,
  });
  return options.working ? { ...fit, working: demingWorking(fit, x, y) } : fit;
}
