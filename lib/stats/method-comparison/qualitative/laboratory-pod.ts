import { chiSquareSurvival } from '../../distributions';
import { sampleSd } from '../../internal/sums';
import { StatsError } from '../../stats-error';
import { around, confidenceOf, tFactor } from '../internal/confidence';
import type { ConfidenceOptions, Interval } from '../types';
import { checkCounts } from './check-counts';
import { differenceOfIntervals, type Proportion, type ProportionDifference } from './proportion-difference';
import { proportionInterval } from './proportion-interval';

export interface LaboratoryPod {
  readonly laboratories: number;
  readonly positives: number;
  readonly trials: number;
  readonly lpod: number;
  readonly interval: Interval;
  /** 't' between 0.15 and 0.85 with 2 laboratories or more, else 'wilson' on the totals. */
  readonly intervalBy: 't' | 'wilson';
  /** Variance of the laboratories' POD; 0 for a single laboratory. */
  readonly betweenPodVariance: number;
  /** Pooled within laboratories. */
  readonly repeatabilitySd: number;
  /** Between laboratories; 0 where the estimate of the variance is negative. */
  readonly laboratorySd: number;
  readonly reproducibilitySd: number;
  /** sqrt(LPOD (1 - LPOD)), what a single binomial would give for the reproducibility. */
  readonly binomialSd: number;
  /** Chi square of homogeneity of the laboratories; null when all results are the same. */
  readonly homogeneity: {
    readonly chiSquare: number;
    readonly degreesOfFreedom: number;
    readonly probability: number;
  } | null;
}

const T_FROM = 0.15;
const T_TO = 0.85;

/**
 * Probability of detection over laboratories (LPOD), with its standard deviations and the test of homogeneity.
 *
 * @param laboratories - { positives, trials } of each laboratory. Domain: at least 1, one of them with 2 trials.
 * @param options.confidence - Default 0.95.
 * @returns LaboratoryPod
 * @throws StatsError too-few-values; out-of-domain
 *
 * Unequal numbers of trials: LPOD is the share of all results; the variance within is taken off at the mean number.
 * Order of input: does not matter. Numerics: O(laboratories).
 * Source: AOAC INTERNATIONAL Appendix J, Annex F: s_L^2 = s_POD^2 - s_r^2 / n, s_R^2 = s_L^2 + s_r^2.
 * Checked by: tests/reference/method-comparison (lpod_aoac_F1), tests/stats/method-comparison/proportions.test.ts.
 * @example laboratoryPod([{ positives: 5, trials: 12 }, { positives: 9, trials: 12 }]).lpod // => 0.58333
 */
export function laboratoryPod(
  laboratories: readonly Proportion[],
  options: ConfidenceOptions = {},
): LaboratoryPod {
  const caller = 'laboratoryPod';
  if (laboratories.length === 0) {
    throw new StatsError('too-few-values', `${caller} requires at least 1 laboratory, found 0`);
  }
  laboratories.forEach(({ positives, trials }) => checkCounts(caller, positives, trials));
  const confidence = confidenceOf(caller, options.confidence);
  const total = (term: (laboratory: Proportion) => number) =>
    laboratories.reduce((sum, one) => sum + term(one), 0);
  const positives = total((one) => one.positives);
  const trials = total((one) => one.trials);
  const count = laboratories.length;
  if (trials === count) {
    throw new StatsError('too-few-values', `${caller} requires a laboratory with at least 2 results`);
  }
  const lpod = positives / trials;
  const pods = laboratories.map((one) => one.positives / one.trials);
  const within = total((one) => one.positives * (1 - one.positives / one.trials)) / (trials - count);
  const between = count > 1 ? sampleSd(pods) ** 2 : 0;
  const laboratoryVariance = Math.max(0, between - within / (trials / count));
  const byT = count > 1 && lpod >= T_FROM && lpod <= T_TO;
  const half = byT ? tFactor(confidence, count - 1) * Math.sqrt(between / count) : 0;
  return {
    laboratories: count,
    positives,
    trials,
    lpod,
    interval: byT ? within01(around(lpod, half)) : proportionInterval(positives, trials, { confidence }),
    intervalBy: byT ? 't' : 'wilson',
    betweenPodVariance: between,
    repeatabilitySd: Math.sqrt(within),
    laboratorySd: Math.sqrt(laboratoryVariance),
    reproducibilitySd: Math.sqrt(laboratoryVariance + within),
    binomialSd: Math.sqrt(lpod * (1 - lpod)),
    homogeneity: homogeneityOf(laboratories, lpod),
  };
}

/**
 * Difference of two LPOD (dLPOD), candidate less reference, from the limits of both.
 *
 * @param candidate - from laboratoryPod. @param reference - from laboratoryPod, of the same level
 * @returns { difference, interval }
 *
 * Source: AOAC INTERNATIONAL Appendix J, Annex F. Checked by: tests/stats/method-comparison/proportions.test.ts.
 * @example differenceOfLaboratoryPod(candidate, reference).difference
 */
export function differenceOfLaboratoryPod(
  candidate: LaboratoryPod,
  reference: LaboratoryPod,
): ProportionDifference {
  const part = ({ lpod, interval }: LaboratoryPod) => ({ share: lpod, interval });
  return differenceOfIntervals(part(candidate), part(reference));
}

function within01({ lower, upper }: Interval): Interval {
  return { lower: Math.max(0, lower), upper: Math.min(1, upper) };
}

function homogeneityOf(laboratories: readonly Proportion[], p: number): LaboratoryPod['homogeneity'] {
  if (laboratories.length < 2 || p === 0 || p === 1) return null;
  const chiSquare = laboratories.reduce(
    (sum, { positives, trials }) => sum + (positives - trials * p) ** 2 / (trials * p * (1 - p)),
    0,
  );
  const degreesOfFreedom = laboratories.length - 1;
  return { chiSquare, degreesOfFreedom, probability: chiSquareSurvival(chiSquare, degreesOfFreedom) };
}
