import { representable } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { bootstrapPairs } from '../internal/bootstrap-pairs';
import { confidenceOf } from '../internal/confidence';
import { orderPoints } from '../slopes/point-grid';
import type { ConfidenceOptions, Interval, UniformGenerator } from '../types';
import { repeatedMedianSlope } from './repeated-median-slope';
import { residualMedian } from './residual-median';

export interface RepeatedMedianOptions extends ConfidenceOptions {
  /** With it, a percentile interval from resampled pairs is made. */
  readonly generator?: UniformGenerator;
  /** Default 999. */
  readonly resamples?: number;
}

export interface RepeatedMedianLine {
  readonly count: number;
  readonly slope: number;
  readonly intercept: number;
  /** Null without a generator. */
  readonly slopeInterval: Interval | null;
  readonly interceptInterval: Interval | null;
  /** Resamples in which all x were equal; they are left out of the interval. */
  readonly failedResamples: number;
  readonly confidence: number;
}

/**
 * Repeated median line: for each point the median of its slopes to the others, and of these the median.
 *
 * Bears nearly half of wild points, more than any other line here, at the price of wider scatter for good data.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 2, two different.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.generator - uniform numbers from 0 to 1, seeded, for the bootstrap interval. Default none, no interval:
 *   the estimator has no usual formula for one.
 * @param options.resamples - at least 100. Default 999.
 * @param options.confidence - of the percentile intervals. Default 0.95.
 * @returns RepeatedMedianLine; intercept = median(y - slope x)
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x are equal; out-of-domain for an
 *   option or a result too large to represent
 *
 * Ties and equal values: pairs with equal x do not count. Order of input: does not matter for the line.
 * Numerics: up to 400 points by the definition; beyond, random halving of the points by exact counts, expected
 *   O(n (log n)^2) time; O(n) memory.
 * Source: Siegel 1982, Biometrika 69, 242-244; counts: Matousek, Mount and Netanyahu 1998, Algorithmica 20, 136-150.
 * Checked by: tests/reference/method-comparison (sen1968), tests/stats/method-comparison/repeated-median.test.ts.
 * @example repeatedMedian([1, 2, 3, 4, 5], [1, 2, 3, 4, 50]) // => slope 1, intercept 0
 */
export function repeatedMedian(
  x: readonly number[],
  y: readonly number[],
  options: RepeatedMedianOptions = {},
): RepeatedMedianLine {
  const caller = 'repeatedMedian';
  checkPairs(caller, x, y, 2);
  const confidence = confidenceOf(caller, options.confidence);
  const lineOf = (px: readonly number[], py: readonly number[]) => {
    const slope = repeatedMedianSlope(orderPoints(px, py));
    return slope === null ? null : { slope, intercept: residualMedian(px, py, slope) };
  };
  const line = lineOf(x, y);
  if (line === null) throw new StatsError('no-spread', `${caller} requires at least two different x`);
  const slope = representable(caller, line.slope);
  const intercept = representable(caller, line.intercept);
  const base = { count: x.length, slope, intercept, confidence };
  if (options.generator === undefined) {
    return { ...base, slopeInterval: null, interceptInterval: null, failedResamples: 0 };
  }
  const made = bootstrapPairs(
    caller,
    { x, y, confidence, generator: options.generator, resamples: options.resamples },
    (px, py) => {
      const again = lineOf(px, py);
      return again === null ? null : [again.slope, again.intercept];
    },
  );
  const [slopeInterval, interceptInterval] = [made.intervals[0] as Interval, made.intervals[1] as Interval];
  return { ...base, slopeInterval, interceptInterval, failedResamples: made.failed };
}
