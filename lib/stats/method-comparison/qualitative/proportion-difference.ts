import { confidenceOf } from '../internal/confidence';
import type { ConfidenceOptions, Interval } from '../types';
import { checkCounts } from './check-counts';
import { proportionInterval } from './proportion-interval';

export interface Proportion {
  readonly positives: number;
  readonly trials: number;
}

export interface ProportionDifference {
  /** First less second share. */
  readonly difference: number;
  readonly interval: Interval;
}

/**
 * Difference of two independent proportions with Newcombe's interval from the Wilson limits of both.
 *
 * @param first - { positives, trials }
 * @param second - { positives, trials }
 * @param options.confidence - two-sided. Default 0.95.
 * @returns { difference, interval }, between -1 and 1
 * @throws StatsError too-few-values for no trials; out-of-domain for counts or options
 *
 * Numerics: O(1). Source: Newcombe 1998, Stat Med 17, 873-890, method 10 (without continuity correction).
 * Checked by: tests/reference/method-comparison (proportions_diff, pod_aoac_tableD1).
 * @example proportionDifference({ positives: 56, trials: 70 }, { positives: 48, trials: 80 }) // => 0.2, 0.0524 to 0.3339
 */
export function proportionDifference(
  first: Proportion,
  second: Proportion,
  options: ConfidenceOptions = {},
): ProportionDifference {
  const caller = 'proportionDifference';
  const confidence = confidenceOf(caller, options.confidence);
  const [p1, p2] = [first, second].map(({ positives, trials }) => {
    checkCounts(caller, positives, trials);
    return { share: positives / trials, interval: proportionInterval(positives, trials, { confidence }) };
  }) as [SharedInterval, SharedInterval];
  return differenceOfIntervals(p1, p2);
}

export interface SharedInterval {
  readonly share: number;
  readonly interval: Interval;
}

/** Newcombe's square and add: distances of the limits from their shares, added as squares. */
export function differenceOfIntervals(first: SharedInterval, second: SharedInterval): ProportionDifference {
  const difference = first.share - second.share + 0;
  const down = Math.hypot(first.share - first.interval.lower, second.interval.upper - second.share);
  const up = Math.hypot(first.interval.upper - first.share, second.share - second.interval.lower);
  return { difference, interval: { lower: difference - down, upper: difference + up } };
}
