import { studentTSurvival } from '../../distributions';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf, zFactor } from '../internal/confidence';
import { scalePairs } from '../internal/scale-pairs';
import { centredSums } from '../lines/deming-slope';
import type { ConfidenceOptions, Interval } from '../types';

export interface Correlation {
  readonly count: number;
  readonly coefficient: number;
  /** By Fisher's z; null below 4 pairs. At 1 or -1 that value. */
  readonly interval: Interval | null;
  /** Two-sided probability of a coefficient as far from 0 if there is no relation; null below 3 pairs. */
  readonly probability: number | null;
  readonly confidence: number;
}

/**
 * Pearson correlation coefficient: how closely pairs lie on any rising or falling straight line.
 *
 * Not a measure of agreement: two methods that differ by a factor can correlate perfectly.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 2, not all equal.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: as x.
 * @param options.confidence - of the interval. Default 0.95.
 * @returns { count, coefficient, interval, probability, confidence }
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x or all y are equal; out-of-domain
 *
 * Ties and equal values: allowed. Order of input: does not matter. Numerics: compensated sums, O(n).
 * Source: Fisher 1921, Metron 1, 3-32; t test with n - 2 degrees of freedom.
 * Checked by: tests/reference/method-comparison (pefr, milkfat, tire), tests/stats/method-comparison/correlation.test.ts.
 * @example pearson([1, 2, 3, 4], [1, 3, 2, 4]).coefficient // => 0.8
 */
export function pearson(
  x: readonly number[],
  y: readonly number[],
  options: ConfidenceOptions = {},
): Correlation {
  const caller = 'pearson';
  checkPairs(caller, x, y, 2);
  const confidence = confidenceOf(caller, options.confidence);
  return correlationOf(caller, x, y, confidence);
}

/** Product moment correlation of checked pairs. */
export function correlationOf(
  caller: string,
  x: readonly number[],
  y: readonly number[],
  confidence: number,
): Correlation {
  const count = x.length;
  const scaled = scalePairs(x, y);
  const { sxx, syy, sxy } = centredSums(scaled.x, scaled.y);
  if (sxx === 0 || syy === 0) {
    throw new StatsError('no-spread', `${caller} requires at least two different values of each method`);
  }
  const coefficient = Math.min(1, Math.max(-1, sxy / Math.sqrt(sxx * syy))) + 0;
  return {
    count,
    coefficient,
    interval: fisherInterval(coefficient, count, confidence),
    probability: count < 3 ? null : probabilityOf(coefficient, count - 2),
    confidence,
  };
}

function fisherInterval(r: number, count: number, confidence: number): Interval | null {
  if (count < 4) return null;
  if (Math.abs(r) === 1) return { lower: r, upper: r };
  const z = zFactor(confidence) / Math.sqrt(count - 3);
  return { lower: Math.tanh(Math.atanh(r) - z), upper: Math.tanh(Math.atanh(r) + z) };
}

function probabilityOf(r: number, df: number): number {
  if (Math.abs(r) === 1) return 0;
  return Math.min(1, 2 * studentTSurvival(Math.abs(r) * Math.sqrt(df / ((1 - r) * (1 + r))), df));
}
