import { confidenceOf } from '../internal/confidence';
import type { ConfidenceOptions, Interval } from '../types';
import { checkCounts } from './check-counts';
import { proportionDifference, type Proportion, type ProportionDifference } from './proportion-difference';
import { proportionInterval } from './proportion-interval';

export interface ProbabilityOfDetection {
  readonly positives: number;
  readonly trials: number;
  /** POD, the share of positive results. */
  readonly pod: number;
  /** Wilson limits. */
  readonly interval: Interval;
}

/**
 * Probability of detection (POD) of a qualitative method at one level.
 *
 * @param positives - positive results. Domain: whole; 0 to trials.
 * @param trials - test portions. Domain: whole; at least 1.
 * @param options.confidence - Default 0.95.
 * @returns { positives, trials, pod, interval }
 * @throws StatsError too-few-values; out-of-domain
 *
 * Source: AOAC INTERNATIONAL Appendix J. Checked by: tests/reference/method-comparison (pod_aoac_tableD1).
 * @example probabilityOfDetection(10, 20) // => pod 0.5, 0.299 to 0.701
 */
export function probabilityOfDetection(
  positives: number,
  trials: number,
  options: ConfidenceOptions = {},
): ProbabilityOfDetection {
  checkCounts('probabilityOfDetection', positives, trials);
  const confidence = confidenceOf('probabilityOfDetection', options.confidence);
  return {
    positives,
    trials,
    pod: positives / trials,
    interval: proportionInterval(positives, trials, { confidence }),
  };
}

/**
 * Difference of two probabilities of detection (dPOD), candidate less reference, for unpaired test portions.
 *
 * @param candidate - { positives, trials }; also presumptive results, against confirmed ones
 * @param reference - { positives, trials }
 * @param options.confidence - Default 0.95.
 * @returns { difference, interval }; an interval that holds 0 gives no evidence of a difference
 * @throws StatsError too-few-values; out-of-domain
 *
 * Source: AOAC INTERNATIONAL Appendix J (Wilson limits joined by Newcombe's method 10).
 * Checked by: tests/reference/method-comparison (pod_aoac_tableD1).
 * @example differenceOfPod({ positives: 10, trials: 20 }, { positives: 11, trials: 20 }) // => -0.05, -0.33 to 0.24
 */
export function differenceOfPod(
  candidate: Proportion,
  reference: Proportion,
  options: ConfidenceOptions = {},
): ProportionDifference {
  return proportionDifference(candidate, reference, options);
}
