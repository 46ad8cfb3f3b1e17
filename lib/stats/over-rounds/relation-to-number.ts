import { studentTSurvival } from '../distributions';
import { checkValues } from '../internal/check-values';
import { midranks } from '../internal/ranks';
import { simpleTrend, type SimpleTrend } from '../internal/simple-trend';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ROUND_CLAUSES } from './clauses';

export interface RelationToNumberResult {
  readonly rounds: number;
  /** z against the number, by least squares. */
  readonly trend: SimpleTrend;
  /** Rank correlation: does z rise or fall with it at all, in whatever shape. */
  readonly rankCorrelation: number;
  /** Two-sided, by the t approximation; not to be trusted below 10 rounds. Null for a perfect order. */
  readonly rankPValue: number | null;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Relation of z to a number that changes from round to round: the level, the time, the temperature.
 *
 * A bias in proportion to the level shows as a slope. A straight line and a rank correlation; look at the plot.
 *
 * @param z - scores. Shape: n values. Unit: none. Domain: finite; at least 4.
 * @param numbers - the number of each round; for levels over decades take logarithms first. Shape: n values.
 *   Domain: finite; not all equal.
 * @param options.working - keep the steps. Default false.
 * @returns { rounds, trend, rankCorrelation, rankPValue, working }
 * @throws StatsError too-few-values below 4; unequal-lengths; not-finite; no-spread when all z or all numbers are equal
 *
 * Ties and equal values: mean ranks. Order of input: does not matter, pairs stay together. Numerics: O(n log n).
 * Source: least squares; Spearman 1904; t approximation as Kendall and Stuart, volume 2, 31.19.
 * Checked by: tests/stats/over-rounds/over-rounds.test.ts (R lm, cor.test).
 * @example relationToNumber([1, 2, 2, 4], [10, 20, 30, 40]).rankCorrelation // => 0.94868
 */
export function relationToNumber(
  z: readonly number[],
  numbers: readonly number[],
  options: { readonly working?: boolean } = {},
): RelationToNumberResult {
  checkValues('relationToNumber', z, 4);
  if (z.length !== numbers.length) {
    const found = `found ${z.length} and ${numbers.length}`;
    throw new StatsError('unequal-lengths', `relationToNumber requires as many numbers as scores, ${found}`);
  }
  checkValues('relationToNumber', numbers, 4);
  for (const [name, values] of [
    ['scores', z],
    ['numbers', numbers],
  ] as const) {
    if (values.every((value) => value === values[0])) {
      throw new StatsError(
        'no-spread',
        `relationToNumber requires ${name} that differ, found ${values[0]} throughout`,
      );
    }
  }
  const [rankZ, rankX] = [midranks(z).ranks, midranks(numbers).ranks];
  const rankCorrelation = correlation(rankZ, rankX);
  const n = z.length;
  const left = (1 - rankCorrelation) * (1 + rankCorrelation);
  const t = left > 1e-14 ? Math.abs(rankCorrelation) * Math.sqrt((n - 2) / left) : null;
  const trend = simpleTrend('relationToNumber', numbers, z);
  const clause = ROUND_CLAUSES.relation;
  const ranks = { rank_z: [...rankZ], rank_x: [...rankX] };
  const working: WorkingStep[] = [
    {
      name: 'Slope',
      formula: 'b = products(x, z) / squares(x)',
      clause,
      inputs: { x: numbers, z },
      value: trend.slope,
    },
    {
      name: 'Standard error of the slope',
      formula:
        trend.t === null
          ? 'se = 0 (all scores lie on the line)'
          : 'se = sqrt((squares(z) - b^2 * squares(x)) / (n - 2) / squares(x))',
      clause,
      inputs: { x: numbers, z, b: trend.slope, n },
      value: trend.standardError,
    },
    {
      name: 'Rank correlation',
      formula: 'rho = products(rank_z, rank_x) / sqrt(squares(rank_z) * squares(rank_x))',
      clause,
      inputs: ranks,
      value: rankCorrelation,
    },
  ];
  return {
    rounds: n,
    trend,
    rankCorrelation,
    rankPValue: t === null ? null : Math.min(1, 2 * studentTSurvival(t, n - 2)),
    working: options.working ? working : null,
  };
}

/** Pearson's of ranks, whose mean is (n + 1) / 2; sums of halves are exact. */
function correlation(a: Float64Array, b: Float64Array): number {
  const centre = (a.length + 1) / 2;
  let [ab, aa, bb] = [0, 0, 0];
  for (let i = 0; i < a.length; i += 1) {
    const [x, y] = [(a[i] as number) - centre, (b[i] as number) - centre];
    ab += x * y;
    aa += x * x;
    bb += y * y;
  }
  return Math.max(-1, Math.min(1, ab / Math.sqrt(aa * bb)));
}
