import { studentTSurvival } from '../../distributions';
import { representable } from '../../internal/check-values';
import { sampleSd, scaledMean } from '../../internal/sums';
import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { checkPairs } from '../internal/check-pairs';
import { around, confidenceOf, tFactor } from '../internal/confidence';
import { step } from '../internal/step';
import type { ConfidenceOptions, Interval } from '../types';
import { pairDifferences } from './pair-differences';

export interface PairedT {
  readonly count: number;
  /** Mean of y - x. */
  readonly mean: number;
  readonly sd: number;
  readonly standardError: number;
  readonly degreesOfFreedom: number;
  /** Null when all differences are equal. */
  readonly t: number | null;
  readonly probability: number | null;
  readonly interval: Interval;
  readonly confidence: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Paired t test: is the mean difference of two methods different from 0?
 *
 * No difference found is not agreement: for that give limits of agreement, or test for equivalence.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param y - values of the second method; differences are y - x. Shape: n values, same length. Unit: unit of the data.
 * @param options.confidence - of the interval of the mean. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns PairedT, unit of the data; the probability is two-sided
 * @throws StatsError unequal-lengths; too-few-values; not-finite; out-of-domain
 *
 * Ties and equal values: allowed. Zero spread: t and probability null. Order of input: does not matter. O(n).
 * Source: Student 1908, Biometrika 6, 1-25.
 * Checked by: tests/reference/method-comparison (shoes, sleep, dextran, pefr), tests/stats/method-comparison/equivalence.test.ts.
 * @example pairedT([10, 20, 30, 40], [11, 20, 32, 41]) // => mean 1, t 2.4495, probability 0.0917
 */
export function pairedT(
  x: readonly number[],
  y: readonly number[],
  options: ConfidenceOptions & { readonly working?: boolean } = {},
): PairedT {
  const caller = 'pairedT';
  checkPairs(caller, x, y, 2);
  const confidence = confidenceOf(caller, options.confidence);
  const { differences } = pairDifferences(caller, 'difference', x, y);
  const count = x.length;
  const degreesOfFreedom = count - 1;
  const mean = representable(caller, scaledMean(differences, 1));
  const sd = representable(caller, sampleSd(differences));
  const standardError = sd / Math.sqrt(count);
  const factor = tFactor(confidence, degreesOfFreedom);
  const t = standardError > 0 ? mean / standardError : null;
  const probability = t === null ? null : Math.min(1, 2 * studentTSurvival(Math.abs(t), degreesOfFreedom));
  const interval = around(mean, factor * standardError);
  const clause = METHOD_CLAUSES.pairedT;
  const d = differences;
  const working = options.working
    ? [
        step('Mean difference', 'mean = sum(y - x) / n', clause, { x, y, n: count }, mean),
        step(
          'Standard deviation',
          's = sqrt(sum((d - mean)^2) / (n - 1))',
          clause,
          { d, mean, n: count },
          sd,
        ),
        step('Standard error', 'se = s / sqrt(n)', clause, { s: sd, n: count }, standardError),
        step('t', 't = mean / se', clause, { mean, se: standardError }, t),
        step(
          'Lower limit',
          'limit = mean - k * se',
          clause,
          { mean, k: factor, se: standardError },
          interval.lower,
        ),
        step(
          'Upper limit',
          'limit = mean + k * se',
          clause,
          { mean, k: factor, se: standardError },
          interval.upper,
        ),
      ]
    : null;
  return { count, mean, sd, standardError, degreesOfFreedom, t, probability, interval, confidence, working };
}
