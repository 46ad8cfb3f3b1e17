import { chiSquareSurvival } from '../../distributions';
import { checkNotNegative } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { checkPairs } from '../internal/check-pairs';
import { around, confidenceOf, tFactor, zFactor } from '../internal/confidence';
import { iterateToRest } from '../internal/iterate-to-rest';
import type { ConfidenceOptions, Interval } from '../types';
import { startOfYork, yorkStep, type YorkData, type YorkState } from './york-step';
import { yorkWorking } from './york-working';

export interface YorkInput {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly uncertaintyX: readonly number[];
  readonly uncertaintyY: readonly number[];
  /** Correlation of the errors of x and y of each pair. Default all 0. */
  readonly correlation?: readonly number[];
}

export interface YorkOptions extends ConfidenceOptions {
  readonly working?: boolean;
}

export interface YorkFit {
  readonly count: number;
  readonly intercept: number;
  readonly slope: number;
  /** From the stated uncertainties, at the adjusted points. */
  readonly interceptSe: number;
  readonly slopeSe: number;
  readonly covariance: number;
  /** Normal intervals from those. */
  readonly interceptInterval: Interval;
  readonly slopeInterval: Interval;
  /** Weighted sum of squared residuals, its degrees of freedom, and the probability of a larger one. */
  readonly chiSquare: number;
  readonly degreesOfFreedom: number;
  readonly chiSquareProbability: number;
  /** Mean square of weighted deviates, chiSquare / degreesOfFreedom; well above 1: more scatter than stated. */
  readonly mswd: number;
  /** Standard errors times sqrt(mswd), with t intervals: for uncertainties that are right up to a common factor. */
  readonly interceptSeScaled: number;
  readonly slopeSeScaled: number;
  readonly interceptIntervalScaled: Interval;
  readonly slopeIntervalScaled: Interval;
  readonly confidence: number;
  readonly iterations: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * York regression: the line when every point has its own uncertainties in x and in y, which may be correlated.
 *
 * The most general of the parametric lines: with equal uncertainties it is Deming's, without errors in x weighted least
 * squares.
 *
 * @param input.x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 3.
 * @param input.y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param input.uncertaintyX - standard uncertainties of x. Shape: n values. Unit: unit of x. Domain: >= 0.
 * @param input.uncertaintyY - standard uncertainties of y. Shape: n values. Unit: unit of y. Domain: >= 0, not both 0.
 * @param input.correlation - Shape: n values. Domain: above -1 and below 1.
 * @param options.confidence - of the intervals. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns YorkFit
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when both uncertainties of a pair are 0 or
 *   the points have no direction; out-of-domain for a negative uncertainty, a correlation outside (-1, 1) or a result
 *   too large to represent; no-convergence
 *
 * Ties and equal values: allowed. Order of input: does not matter.
 * Numerics: iterated until the slope stands still (1e-15), O(n) each, 5 to 50 iterations.
 * Source: York, Evensen, Lopez Martinez and De Basabe Delgado 2004, Am J Phys 72, 367-375, section III.
 * Checked by: tests/reference/method-comparison (pearson_york), tests/stats/method-comparison/york.test.ts.
 * @example york({ x: [1, 2, 3], y: [1, 2.1, 2.9], uncertaintyX: [1, 1, 1], uncertaintyY: [1, 1, 1] }) // => slope 0.95375
 */
export function york(input: YorkInput, options: YorkOptions = {}): YorkFit {
  const data = checkInput(input);
  const confidence = confidenceOf('york', options.confidence);
  const { result, iterations } = iterateToRest('york', startOfYork(data), (from) =>
    yorkStep(data, from.slope),
  );
  const fit = describe(result, data, confidence, iterations);
  return options.working ? { ...fit, working: yorkWorking(fit, data) } : fit;
}

function describe(state: YorkState, data: YorkData, confidence: number, iterations: number): YorkFit {
  const degreesOfFreedom = data.x.length - 2;
  const { intercept, slope, interceptSe, slopeSe, covariance, chiSquare } = state;
  if (![intercept, slope, interceptSe, slopeSe, chiSquare].every(Number.isFinite)) {
    throw new StatsError('out-of-domain', 'york gives a result that is too large or too small to represent');
  }
  const mswd = chiSquare / degreesOfFreedom;
  const interceptSeScaled = interceptSe * Math.sqrt(mswd);
  const slopeSeScaled = slopeSe * Math.sqrt(mswd);
  const [z, t] = [zFactor(confidence), tFactor(confidence, degreesOfFreedom)];
  return {
    count: data.x.length,
    intercept,
    slope,
    interceptSe,
    slopeSe,
    covariance,
    interceptInterval: around(intercept, z * interceptSe),
    slopeInterval: around(slope, z * slopeSe),
    chiSquare,
    degreesOfFreedom,
    chiSquareProbability: chiSquareSurvival(chiSquare, degreesOfFreedom),
    mswd,
    interceptSeScaled,
    slopeSeScaled,
    interceptIntervalScaled: around(intercept, t * interceptSeScaled),
    slopeIntervalScaled: around(slope, t * slopeSeScaled),
    confidence,
    iterations,
    working: null,
  };
}

function checkInput(input: YorkInput): YorkData {
  const { x, y, uncertaintyX: ux, uncertaintyY: uy } = input;
  checkPairs('york', x, y, 3);
  const correlation = input.correlation ?? x.map(() => 0);
  for (const [name, list] of [
    ['uncertainty of x', ux],
    ['uncertainty of y', uy],
    ['correlation', correlation],
  ] as const) {
    if (list.length !== x.length) {
      throw new StatsError(
        'unequal-lengths',
        `york requires a ${name} for each of the ${x.length} pairs, found ${list.length}`,
      );
    }
  }
  x.forEach((_, i) => {
    checkNotNegative('york', `uncertainty of x at position ${i + 1}`, ux[i] as number);
    checkNotNegative('york', `uncertainty of y at position ${i + 1}`, uy[i] as number);
    if (ux[i] === 0 && uy[i] === 0) {
      throw new StatsError(
        'no-spread',
        `york requires an uncertainty above zero, found both 0 at position ${i + 1}`,
      );
    }
    const r = correlation[i] as number;
    if (!(r > -1 && r < 1)) {
      throw new StatsError(
        'out-of-domain',
        `york requires correlations between -1 and 1, found ${r} at position ${i + 1}`,
      );
    }
  });
  return { x, y, ux, uy, correlation };
}
