import { checkPositive, representable } from '../../internal/check-values';
import { sampleSd, scaledMean } from '../../internal/sums';
import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { checkPairs } from '../internal/check-pairs';
import { around, confidenceOf, tFactor } from '../internal/confidence';
import type { ConfidenceOptions, Interval } from '../types';
import { blandAltmanWorking } from './bland-altman-working';
import { exactLimitInterval } from './exact-limit-interval';
import { pairDifferences, type DifferenceKind } from './pair-differences';

/** How many standard deviations the limits of agreement lie from the mean. The 1986 paper works with 2. */
export const LIMITS_MULTIPLIER = 1.96;

export interface BlandAltmanOptions extends ConfidenceOptions {
  readonly kind?: DifferenceKind;
  readonly multiplier?: number;
  readonly working?: boolean;
}

/** Figures of one scale: differences, percent differences, or natural logarithms of ratios. */
export interface AgreementFigures {
  readonly mean: number;
  readonly sd: number;
  readonly standardError: number;
  readonly meanInterval: Interval;
  /** mean -+ multiplier sd. */
  readonly lowerLimit: number;
  readonly upperLimit: number;
  /** sqrt(3 sd^2 / n), the approximation of the paper. */
  readonly limitStandardError: number;
  readonly lowerLimitInterval: Interval;
  readonly upperLimitInterval: Interval;
  /** From the noncentral t distribution: exact for normal differences. */
  readonly lowerLimitExact: Interval;
  readonly upperLimitExact: Interval;
}

export interface BlandAltmanResult extends AgreementFigures {
  readonly kind: DifferenceKind;
  readonly count: number;
  /** y - x, 100 (y - x) / mean, or ln(y / x), pair by pair, and the means of the pairs that they are drawn against. */
  readonly differences: readonly number[];
  readonly averages: readonly number[];
  /** For kind 'ratio' the mean and the limits as ratios y / x; otherwise null. */
  readonly asRatio: {
    readonly mean: number;
    readonly lowerLimit: number;
    readonly upperLimit: number;
  } | null;
  readonly multiplier: number;
  readonly degreesOfFreedom: number;
  readonly factor: number;
  readonly confidence: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Limits of agreement (Bland and Altman): between which most differences of two methods will lie.
 *
 * Look at the plot first: where the differences or their spread depend on the level, take percent, ratio or
 * regressionLimits. Whether the limits are narrow enough is a matter of use and not of statistics.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 2; for
 *   'percent' the mean of a pair not 0, for 'ratio' above 0.
 * @param y - values of the second method; differences are y - x. Shape: n values, same length. Unit and domain as x.
 * @param options.kind - 'difference' (default), 'percent' of the mean of the pair, or 'ratio' (natural logarithms).
 * @param options.multiplier - of the sd. Domain: > 0. Default 1.96 (1999 paper); 2 in the 1986 paper.
 * @param options.confidence - of the intervals. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns BlandAltmanResult; figures in the unit of the data, in percent, or of ln(y / x)
 * @throws StatsError unequal-lengths; too-few-values; not-finite; out-of-domain for values that have no percent or
 *   ratio, for an option, or a result too large to represent
 *
 * Ties and equal values: allowed. Zero spread: limits equal to the mean. Order of input: does not matter.
 * Numerics: compensated sums, O(n).
 * Source: Bland and Altman 1986, Lancet 327, 307-310; 1999, Stat Methods Med Res 8, 135-160; exact intervals: Carkeet
 *   2015, Optom Vis Sci 92, e71-e80.
 * Checked by: tests/reference/method-comparison (pefr, milkfat, tire, dextran), tests/stats/method-comparison/bland-altman.test.ts.
 * @example blandAltman([10, 20, 30, 40], [11, 20, 32, 41]) // => mean 1, sd 0.8165
 */
export function blandAltman(
  x: readonly number[],
  y: readonly number[],
  options: BlandAltmanOptions = {},
): BlandAltmanResult {
  const caller = 'blandAltman';
  checkPairs(caller, x, y, 2);
  const confidence = confidenceOf(caller, options.confidence);
  const multiplier = options.multiplier ?? LIMITS_MULTIPLIER;
  checkPositive(caller, 'multiplier', multiplier);
  const kind = options.kind ?? 'difference';
  const { differences, averages } = pairDifferences(caller, kind, x, y);
  const figures = agreementFigures(caller, differences, { multiplier, confidence });
  const degreesOfFreedom = x.length - 1;
  const result: BlandAltmanResult = {
    kind,
    count: x.length,
    differences,
    averages,
    ...figures,
    asRatio: kind === 'ratio' ? asRatio(figures) : null,
    multiplier,
    degreesOfFreedom,
    factor: tFactor(confidence, degreesOfFreedom),
    confidence,
    working: null,
  };
  return options.working ? { ...result, working: blandAltmanWorking(result, x, y) } : result;
}

function asRatio({ mean, lowerLimit, upperLimit }: AgreementFigures) {
  const ratio = (value: number) => representable('blandAltman', Math.exp(value));
  return { mean: ratio(mean), lowerLimit: ratio(lowerLimit), upperLimit: ratio(upperLimit) };
}

function agreementFigures(
  caller: string,
  differences: readonly number[],
  { multiplier, confidence }: { readonly multiplier: number; readonly confidence: number },
): AgreementFigures {
  const n = differences.length;
  const mean = scaledMean(differences, 1) + 0;
  const sd = sampleSd(differences);
  const limits = { lower: mean - multiplier * sd + 0, upper: mean + multiplier * sd + 0 };
  if (![mean, sd, limits.lower, limits.upper].every(Number.isFinite)) {
    throw new StatsError('out-of-domain', `${caller} gives a result that is too large to represent`);
  }
  const factor = tFactor(confidence, n - 1);
  const standardError = sd / Math.sqrt(n);
  const limitStandardError = Math.sqrt(3) * standardError;
  const exact = exactLimitInterval({ count: n, multiplier, confidence });
  return {
    mean,
    sd,
    standardError,
    meanInterval: around(mean, factor * standardError),
    lowerLimit: limits.lower,
    upperLimit: limits.upper,
    limitStandardError,
    lowerLimitInterval: around(limits.lower, factor * limitStandardError),
    upperLimitInterval: around(limits.upper, factor * limitStandardError),
    lowerLimitExact: { lower: mean - exact.upper * sd + 0, upper: mean - exact.lower * sd + 0 },
    upperLimitExact: { lower: mean + exact.lower * sd + 0, upper: mean + exact.upper * sd + 0 },
  };
}
