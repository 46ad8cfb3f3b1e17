import { studentTSurvival } from '../../distributions';
import { checkFinite } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { around, tFactor } from '../internal/confidence';
import { step } from '../internal/step';
import type { Interval } from '../types';
import { pairedT } from './paired-t';

export interface EquivalenceOptions {
  /** Largest mean difference of no concern, on either side. Unit of the data. */
  readonly margin?: number;
  /** Or a lower and an upper one. */
  readonly lowerMargin?: number;
  readonly upperMargin?: number;
  /** Significance level of each of the two tests. Default 0.05. */
  readonly alpha?: number;
  readonly working?: boolean;
}

export interface Equivalence {
  readonly count: number;
  readonly mean: number;
  readonly standardError: number;
  readonly lowerMargin: number;
  readonly upperMargin: number;
  /** Probabilities of the data if the mean difference were at the lower, or the upper, margin; the larger counts. */
  readonly probabilityLower: number;
  readonly probabilityUpper: number;
  readonly probability: number;
  /** Interval of confidence 1 - 2 alpha: it lies inside the margins just when the methods are equivalent. */
  readonly interval: Interval;
  readonly equivalent: boolean;
  readonly alpha: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Equivalence by two one-sided paired t tests (TOST): is the mean difference small enough?
 *
 * The margin must be set before the data are seen, from what a difference does to the users of the results.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param y - values of the second method; differences are y - x. Shape: n values, same length. Unit: unit of the data.
 * @param options.margin - Domain: > 0. Or lowerMargin < upperMargin.
 * @param options.alpha - Domain: above 0, below 0.5. Default 0.05.
 * @param options.working - give the steps. Default false.
 * @returns Equivalence
 * @throws StatsError unequal-lengths; too-few-values; not-finite; out-of-domain for the margins or alpha
 *
 * Ties and equal values: allowed. Zero spread: the probabilities are 0 or 1 as the mean lies inside or outside.
 * Order of input: does not matter. Numerics: O(n).
 * Source: Schuirmann 1987, J Pharmacokinet Biopharm 15, 657-680.
 * Checked by: tests/reference/method-comparison (shoes, sleep, dextran, pefr), tests/stats/method-comparison/equivalence.test.ts.
 * @example equivalence([10, 20, 30, 40], [11, 20, 32, 41], { margin: 3 }) // => probability 0.0081, equivalent true
 */
export function equivalence(
  x: readonly number[],
  y: readonly number[],
  options: EquivalenceOptions,
): Equivalence {
  const { lower, upper, alpha } = marginsOf(options);
  const { count, mean, standardError, degreesOfFreedom } = pairedT(x, y, { confidence: 1 - 2 * alpha });
  const tail = (distance: number) => {
    if (standardError > 0) return studentTSurvival(distance / standardError, degreesOfFreedom);
    return distance > 0 ? 0 : 1;
  };
  const probabilityLower = tail(mean - lower);
  const probabilityUpper = tail(upper - mean);
  const probability = Math.max(probabilityLower, probabilityUpper);
  const factor = tFactor(1 - 2 * alpha, degreesOfFreedom);
  const result = {
    count,
    mean,
    standardError,
    lowerMargin: lower,
    upperMargin: upper,
    probabilityLower,
    probabilityUpper,
    probability,
    interval: around(mean, factor * standardError),
    equivalent: probability < alpha,
    alpha,
  };
  return { ...result, working: options.working ? workingOf(result, factor, x, y) : null };
}

function marginsOf(options: EquivalenceOptions): { lower: number; upper: number; alpha: number } {
  const { margin, alpha = 0.05 } = options;
  if (!(alpha > 0 && alpha < 0.5)) {
    throw new StatsError(
      'out-of-domain',
      `equivalence requires an alpha above 0 and below 0.5, found ${alpha}`,
    );
  }
  if (margin !== undefined && !(margin > 0)) {
    throw new StatsError('out-of-domain', `equivalence requires a margin above 0, found ${margin}`);
  }
  const lower = options.lowerMargin ?? (margin === undefined ? NaN : -margin);
  const upper = options.upperMargin ?? margin ?? NaN;
  if (Number.isNaN(lower) || Number.isNaN(upper)) {
    throw new StatsError('out-of-domain', 'equivalence requires a margin, or a lower and an upper one');
  }
  checkFinite('equivalence', 'lower margin', lower);
  checkFinite('equivalence', 'upper margin', upper);
  if (lower >= upper) {
    throw new StatsError(
      'out-of-domain',
      `equivalence requires margins in order, found ${lower} and ${upper}`,
    );
  }
  return { lower, upper, alpha };
}

function workingOf(
  result: Omit<Equivalence, 'working'>,
  k: number,
  x: readonly number[],
  y: readonly number[],
): WorkingStep[] {
  const clause = METHOD_CLAUSES.equivalence;
  const { mean, standardError: se, interval, lowerMargin, upperMargin, count: n } = result;
  const tOf = (distance: number) => (se > 0 ? distance / se : null);
  const d = x.map((value, i) => (y[i] as number) - value);
  return [
    step('Mean difference', 'mean = sum(d) / n', clause, { d, n }, mean),
    step('Standard error', 'se = sqrt(sum((d - mean)^2) / (n - 1) / n)', clause, { d, mean, n }, se),
    step(
      't at the lower margin',
      't = (mean - lower) / se',
      clause,
      { mean, lower: lowerMargin, se },
      tOf(mean - lowerMargin),
    ),
    step(
      't at the upper margin',
      't = (upper - mean) / se',
      clause,
      { mean, upper: upperMargin, se },
      tOf(upperMargin - mean),
    ),
    step('Lower limit', 'limit = mean - k * se', clause, { mean, k, se }, interval.lower),
    step('Upper limit', 'limit = mean + k * se', clause, { mean, k, se }, interval.upper),
  ];
}
