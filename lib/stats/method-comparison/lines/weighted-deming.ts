import { checkPositive } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import { iterateToRest } from '../internal/iterate-to-rest';
import { scalePairs } from '../internal/scale-pairs';
import type { DemingOptions } from './deming';
import { analyticErrors } from './deming-errors';
import { demingLine, requireLine, type CentredSums, type SlopeAndIntercept } from './deming-slope';
import { weightedDemingWorking } from './deming-working';
import { errorsKindOf, finishLine, type ErrorsInVariablesLine } from './errors-in-variables';
import { jackknifeErrors, type JackknifeErrors } from './jackknife-line';

interface Problem {
  readonly caller: string;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly ratio: number;
  /** Unit of the scaled y in that of the scaled x, so that levels of both methods can be averaged. */
  readonly yInX: number;
}

interface State extends SlopeAndIntercept {
  readonly sums: CentredSums | null;
}

/**
 * Weighted Deming regression: the line when the errors of both methods grow in proportion to the level.
 *
 * Each pair has the weight 1 / level^2, the level being estimated from both values and the line; so it is iterated.
 * For quantities above zero with a coefficient of variation that hardly changes over the range.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 3; levels
 *   above 0.
 * @param y - values of the second method, in the same unit. Shape: n values, same length. Domain: as x.
 * @param options.errorRatio - variance of the error of y over that of x. Domain: > 0. Default 1.
 * @param options.standardErrors - 'jackknife' (default) or 'analytic' (with the last weights; normal data, large n).
 * @param options.confidence - of the t intervals with n - 2 degrees of freedom. Default 0.95.
 * @param options.working - give the steps of the last round. Default false.
 * @returns ErrorsInVariablesLine, with the number of iterations
 * @throws StatsError as deming; out-of-domain when a level is not above 0; no-convergence
 *
 * Ties and equal values: allowed. Order of input: does not matter.
 * Numerics: iterated until the slope stands still (1e-15), O(n) each; the jackknife repeats this n times, O(n^2).
 * Source: Linnet 1990, Stat Med 9, 1463-1473; 1993, Clin Chem 39, 424-432.
 * Checked by: tests/reference/method-comparison (milkfat), tests/stats/method-comparison/deming.test.ts.
 * @example weightedDeming([1, 2, 4, 8], [1.1, 2.1, 4.3, 8.2]) // => slope 1.0314, intercept 0.0659
 */
export function weightedDeming(
  x: readonly number[],
  y: readonly number[],
  options: DemingOptions = {},
): ErrorsInVariablesLine {
  const caller = 'weightedDeming';
  checkPairs(caller, x, y, 3);
  const errorRatio = options.errorRatio ?? 1;
  checkPositive(caller, 'error ratio', errorRatio);
  const confidence = confidenceOf(caller, options.confidence);
  const standardErrors = errorsKindOf(caller, options.standardErrors);
  const { unitX, unitY, ...scaled } = scalePairs(x, y);
  const yInX = unitY / unitX;
  const problem: Problem = { caller, ...scaled, ratio: errorRatio / yInX ** 2, yInX };
  if (!(problem.ratio > 0 && problem.ratio < Infinity)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} finds x and y too different in size for its error ratio`,
    );
  }
  const { result, iterations } = solve(problem, -1, null);
  const errors =
    standardErrors === 'analytic'
      ? analyticErrors(result.sums as CentredSums, result)
      : jackknife(problem, result);
  const count = x.length;
  const fit = finishLine({
    caller,
    count,
    line: result,
    errors,
    unitX,
    unitY,
    errorRatio,
    standardErrors,
    confidence,
    iterations,
  });
  return options.working ? { ...fit, working: weightedDemingWorking(fit, x, y) } : fit;
}

function jackknife(problem: Problem, from: SlopeAndIntercept): JackknifeErrors {
  return jackknifeErrors(Array.from(problem.x, (_, i) => solve(problem, i, from).result));
}

function solve(problem: Problem, without: number, from: SlopeAndIntercept | null) {
  const start: State = from === null ? improve(problem, without, null) : { ...from, sums: null };
  return iterateToRest(problem.caller, start, (line) => improve(problem, without, line));
}

/** One step: weights from the levels on the line (from the values themselves at first), then the weighted line. */
function improve(problem: Problem, without: number, line: SlopeAndIntercept | null): State {
  const { caller, x, y, ratio } = problem;
  const n = x.length;
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i += 1) if (i !== without) weights[i] = 1 / levelOf(problem, i, line) ** 2;
  const sums = weightedSums(x, y, weights);
  return { ...requireLine(caller, demingLine(sums, ratio)), sums };
}

function levelOf({ caller, x, y, ratio, yInX }: Problem, i: number, line: SlopeAndIntercept | null): number {
  const lambda = 1 / ratio;
  let atX = x[i] as number;
  let atY = y[i] as number;
  if (line !== null) {
    const d = atY - line.intercept - line.slope * atX;
    const share = 1 + lambda * line.slope ** 2;
    atX += (lambda * line.slope * d) / share;
    atY -= d / share;
  }
  // The average runs over values in one unit: lambda there is the ratio before scaling.
  const same = lambda / yInX ** 2;
  const level = (atX + same * atY * yInX) / (1 + same);
  if (!(level > 0)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires levels above zero, found one at or below at pair ${i + 1}`,
    );
  }
  return level;
}

function weightedSums(x: Float64Array, y: Float64Array, w: Float64Array): CentredSums {
  const n = x.length;
  let [weight, sumX, sumY] = [0, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const wi = w[i] as number;
    weight += wi;
    sumX += wi * (x[i] as number);
    sumY += wi * (y[i] as number);
  }
  const [meanX, meanY] = [sumX / weight, sumY / weight];
  let [sxx, syy, sxy, count] = [0, 0, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const wi = w[i] as number;
    if (wi > 0) count += 1;
    const dx = (x[i] as number) - meanX;
    const dy = (y[i] as number) - meanY;
    sxx += wi * dx * dx;
    syy += wi * dy * dy;
    sxy += wi * dx * dy;
  }
  // In weights of mean 1, so that the sums read like those of `count` pairs.
  const unit = count / weight;
  return { weight: count, meanX, meanY, sxx: sxx * unit, syy: syy * unit, sxy: sxy * unit };
}
