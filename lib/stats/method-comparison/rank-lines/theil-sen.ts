import { representable } from '../../internal/check-values';
import { medianOfSorted, sortedCopy } from '../../internal/sorted';
import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf, zFactor } from '../internal/confidence';
import { step } from '../internal/step';
import { orderPoints } from '../slopes/point-grid';
import { SlopeRanks } from '../slopes/slope-ranks';
import type { ConfidenceOptions, Interval } from '../types';
import { midpoint } from './midpoint';
import { residualMedian } from './residual-median';

export interface TheilSenOptions extends ConfidenceOptions {
  readonly interceptFrom?: 'medians' | 'residuals';
  readonly working?: boolean;
}

export interface TheilSenLine {
  readonly count: number;
  readonly slope: number;
  readonly intercept: number;
  readonly slopeInterval: Interval;
  /** Number of pairs with different x, and the ranks of the limits among their slopes, from 1. */
  readonly slopes: number;
  readonly lowerRank: number;
  readonly upperRank: number;
  readonly confidence: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Theil-Sen line: the median of the slopes of all pairs of points.
 *
 * Bears up to 29 % of wild points. For an x without error to speak of, like least squares; where both methods have
 * errors, passingBablok.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 2, two different.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.interceptFrom - 'medians': median(y) - slope median(x), as Conover 1980 (default); 'residuals':
 *   median(y - slope x).
 * @param options.confidence - of the slope interval. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns TheilSenLine
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x are equal; out-of-domain for an
 *   option or a result too large to represent
 *
 * Ties and equal values: pairs with equal x do not count; ties shorten the interval (Sen 1968, 2.6). Limits beyond the
 *   first or last slope (few points) are that slope. Order of input: does not matter.
 * Numerics: interval contraction with inversion counts, expected O(n log n) time, O(n) memory; exact ranks on decimals.
 * Source: Theil 1950; Sen 1968, J Am Stat Assoc 63, 1379-1389.
 * Checked by: tests/reference/method-comparison (sen1968, pefr, tire), tests/stats/method-comparison/theil-sen.test.ts.
 * @example theilSen([1, 2, 3, 4, 10, 12, 18], [9, 15, 19, 20, 45, 55, 78]) // => slope 4, intercept 4
 */
export function theilSen(
  x: readonly number[],
  y: readonly number[],
  options: TheilSenOptions = {},
): TheilSenLine {
  const caller = 'theilSen';
  checkPairs(caller, x, y, 2);
  const confidence = confidenceOf(caller, options.confidence);
  const from = options.interceptFrom ?? 'medians';
  if (from !== 'medians' && from !== 'residuals') {
    throw new StatsError(
      'out-of-domain',
      `${caller} takes the intercept from medians or residuals, found ${String(from)}`,
    );
  }
  const ranks = new SlopeRanks(orderPoints(x, y));
  const total = ranks.total;
  if (total === 0) throw new StatsError('no-spread', `${caller} requires at least two different x`);
  const sorted = { x: sortedCopy(x), y: sortedCopy(y) };
  const spread = zFactor(confidence) * Math.sqrt(Math.max(0, kendallVariance(sorted.x, sorted.y)));
  const lowerRank = Math.max(Math.round((total - spread) / 2), 1);
  const upperRank = Math.min(Math.round((total + spread) / 2) + 1, total);
  const at = (rank: number) => representable(caller, ranks.select(rank - 1));
  // Halves by division: there can be more pairs than a shift of 32 bits can hold.
  const slope = midpoint(at(Math.floor((total + 1) / 2)), at(Math.floor(total / 2) + 1));
  const slopeInterval = { lower: at(lowerRank), upper: at(upperRank) };
  const intercept = representable(
    caller,
    from === 'medians'
      ? medianOfSorted(sorted.y) - slope * medianOfSorted(sorted.x)
      : residualMedian(x, y, slope),
  );
  const line = {
    count: x.length,
    slope,
    intercept,
    slopeInterval,
    slopes: total,
    lowerRank,
    upperRank,
    confidence,
  };
  return { ...line, working: options.working ? workingOf(line, x, y, spread, from) : null };
}

/** Variance of Kendall's score with ties in x and in y (Sen 1968, equation 2.6). */
function kendallVariance(x: Float64Array, y: Float64Array): number {
  const term = (k: number) => k * (k - 1) * (2 * k + 5);
  const ties = (values: Float64Array) => {
    let sum = 0;
    let run = 1;
    for (let i = 1; i <= values.length; i += 1) {
      if (i < values.length && values[i] === values[i - 1]) run += 1;
      else {
        sum += term(run);
        run = 1;
      }
    }
    return sum;
  };
  return (term(x.length) - ties(x) - ties(y)) / 18;
}

type Line = Omit<TheilSenLine, 'working'>;

function workingOf(
  line: Line,
  x: readonly number[],
  y: readonly number[],
  spread: number,
  from: 'medians' | 'residuals',
): WorkingStep[] {
  const clause = METHOD_CLAUSES.theilSen;
  const { slopes: N, slope: b, lowerRank, upperRank } = line;
  const formula = from === 'medians' ? 'a = median(y) - b * median(x)' : 'a = median(y - b * x)';
  return [
    step('Slope', 'b = median of (yj - yi) / (xj - xi) over pairs with different x', clause, { x, y }, b),
    step('Intercept', formula, clause, { x, y, b }, line.intercept),
    step('Rank of the lower limit', 'rank = max(round((N - C) / 2), 1)', clause, { N, C: spread }, lowerRank),
    step(
      'Rank of the upper limit',
      'rank = min(round((N + C) / 2) + 1, N)',
      clause,
      { N, C: spread },
      upperRank,
    ),
    step(
      'Lower limit of the slope',
      'slope with that rank',
      clause,
      { x, y, rank: lowerRank },
      line.slopeInterval.lower,
    ),
    step(
      'Upper limit of the slope',
      'slope with that rank',
      clause,
      { x, y, rank: upperRank },
      line.slopeInterval.upper,
    ),
  ];
}
