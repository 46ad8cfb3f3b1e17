import { representable } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf, zFactor } from '../internal/confidence';
import { orderPoints } from '../slopes/point-grid';
import { SlopeRanks } from '../slopes/slope-ranks';
import type { ConfidenceOptions, Interval } from '../types';
import { cusumLinearity, type CusumLinearity } from './cusum-linearity';
import { equivariantSlopes } from './equivariant-slopes';
import { passingBablokWorking } from './passing-bablok-working';
import { residualMedian } from './residual-median';
import { shiftedSlopes } from './shifted-slopes';

export type PassingBablokVariant = '1983' | 'equivariant';

export interface PassingBablokOptions extends ConfidenceOptions {
  readonly variant?: PassingBablokVariant;
  readonly working?: boolean;
}

/** Slope and limits with the counts that lead to them. */
export interface SlopeSearch {
  readonly slope: number;
  /** Limits of the slope; -Infinity and Infinity where the ranks run out. */
  readonly interval: Interval;
  /** N, slopes in the list: all pairs but identical points and slopes of -1 (equivariant: of minus the slope). */
  readonly slopes: number;
  /** K, slopes below -1 (equivariant: below minus the slope); vertical pairs by the sign of y_i - y_j, i before j. */
  readonly shift: number;
  /** M1 and M2; the limits have the ranks M1 + K and M2 + K. */
  readonly lowerRank: number;
  readonly upperRank: number;
  readonly excluded: number;
}

export interface PassingBablokLine {
  readonly count: number;
  readonly variant: PassingBablokVariant;
  readonly slope: number;
  readonly intercept: number;
  /** -Infinity or Infinity where so few points give no limit. */
  readonly slopeInterval: Interval;
  readonly interceptInterval: Interval;
  readonly slopes: number;
  readonly shift: number;
  readonly lowerRank: number;
  readonly upperRank: number;
  /** Pairs left out because the points are the same, and because the slope is -1. */
  readonly identicalPairs: number;
  readonly excludedPairs: number;
  readonly verticalPairs: number;
  readonly cusum: CusumLinearity;
  readonly confidence: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Passing-Bablok regression: a line by ranks for two methods that both have errors of any distribution.
 *
 * The median of the slopes of all pairs, shifted by the number of slopes below -1, so that exchanging the methods turns
 * the line round. For methods that should agree (slope near 1) and a linear relation, which the cusum test judges. For
 * other slopes, or other units, take the equivariant variant.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 3.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.variant - '1983' (default) or 'equivariant': the median of |slope|, which does not change with the
 *   units; negative where more pairs fall than rise. Its limits: the 1983 procedure with x in units that make it 1.
 * @param options.confidence - of the intervals. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns PassingBablokLine
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when no slope is left or the line is
 *   vertical; out-of-domain for an option or a result too large to represent
 *
 * Ties and equal values: identical points give no slope; slopes of exactly -1 are left out (decimals are compared as
 *   decimals, other values within their rounding); vertical pairs are +-Infinity by the sign of y_i - y_j.
 * Order of input: does not matter, but for `shift` where there are vertical pairs and for equal projections in the cusum.
 * Numerics: interval contraction with inversion counts, expected O(n log n) time, O(n) memory.
 * Source: Passing and Bablok 1983, J Clin Chem Clin Biochem 21, 709-720; Bablok, Passing, Bender and Schneider 1988, 26,
 *   783-790; Dufey 2020, Int J Biostat 16(2).
 * Checked by: tests/reference/method-comparison (pefr, milkfat, tire, dextran, norris),
 *   tests/stats/method-comparison/passing-bablok.test.ts.
 * @example passingBablok([1, 2, 3, 4, 5], [1.1, 1.9, 3.2, 3.9, 5.1]) // => slope 1, intercept 0.1
 */
export function passingBablok(
  x: readonly number[],
  y: readonly number[],
  options: PassingBablokOptions = {},
): PassingBablokLine {
  const caller = 'passingBablok';
  checkPairs(caller, x, y, 3);
  const confidence = confidenceOf(caller, options.confidence);
  const variant = options.variant ?? '1983';
  if (variant !== '1983' && variant !== 'equivariant') {
    throw new StatsError(
      'out-of-domain',
      `${caller} knows the variants 1983 and equivariant, found ${String(variant)}`,
    );
  }
  const n = x.length;
  const points = orderPoints(x, y);
  const ranks = new SlopeRanks(points);
  const spread = zFactor(confidence) * Math.sqrt((n * (n - 1) * (2 * n + 5)) / 18);
  const found = variant === '1983' ? shiftedSlopes(ranks, spread) : equivariantSlopes(ranks, spread);
  const slope = representable(caller, found.slope);
  const intercept = representable(caller, residualMedian(x, y, slope));
  const interceptAt = (limit: number) => (Number.isFinite(limit) ? residualMedian(x, y, limit) : null);
  const line: Omit<PassingBablokLine, 'working'> = {
    count: n,
    variant,
    slope,
    intercept,
    slopeInterval: found.interval,
    interceptInterval: {
      lower: interceptAt(found.interval.upper) ?? -Infinity,
      upper: interceptAt(found.interval.lower) ?? Infinity,
    },
    slopes: found.slopes,
    shift: found.shift,
    lowerRank: found.lowerRank,
    upperRank: found.upperRank,
    identicalPairs: points.identicalPairs,
    excludedPairs: found.excluded,
    verticalPairs: points.verticalPairs,
    cusum: cusumLinearity(x, y, { slope, intercept }),
    confidence,
  };
  return { ...line, working: options.working ? passingBablokWorking(line, x, y, spread) : null };
}
