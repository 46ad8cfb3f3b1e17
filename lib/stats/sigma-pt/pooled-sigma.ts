import { checkNotNegative, checkPositive, representable } from '../internal/check-values';
import { compensatedSum } from '../internal/sums';
import { StatsError } from '../stats-error';

/** What one earlier round showed. */
export interface RoundSpread {
  readonly standardDeviation: number;
  /** p, the number of results behind it. */
  readonly count: number;
  /** The assigned value, where relative standard deviations are to be pooled. */
  readonly level?: number;
}

export interface PooledSigmaResult {
  readonly standardDeviation: number;
  /** Pooled relative standard deviation; null when a round has no level. */
  readonly relative: number | null;
  readonly rounds: number;
  readonly degreesOfFreedom: number;
}

/**
 * sigma_pt from earlier rounds: their standard deviations pooled, each with the weight of its degrees of freedom.
 *
 * For rounds at about the same level; where levels differ take the relative one times the level, or fitSigmaFunction. The
 * standard deviations are best robust ones, so that a wild result of the past sets no mild limit now.
 *
 * @param rounds - Shape: at least 1 round. standardDeviation - Unit: unit of the data. Domain: finite; >= 0. count - Domain:
 *   whole; at least 2. level - Unit: unit of the data. Domain: finite; > 0.
 * @returns { standardDeviation: sqrt(sum (p - 1) s^2 / sum (p - 1)), relative: the same of s / level, rounds,
 *   degreesOfFreedom }
 * @throws StatsError too-few-values without a round or below 2 results; not-finite; no-spread when all are 0 or a level is
 *   0; out-of-domain for a negative figure
 *
 * Order of input: does not matter but for the last digit. Numerics: scaled by the largest, no overflow, O(n).
 * Source: ISO 13528:2022, 8.3 (experience from earlier rounds); pooling as in ISO 5725-2, 7.4.
 * Checked by: tests/stats/sigma-pt/sigma-function.test.ts.
 * @example pooledSigma([{ standardDeviation: 3, count: 11 }, { standardDeviation: 4, count: 11 }]).standardDeviation // => 3.53553
 */
export function pooledSigma(rounds: readonly RoundSpread[]): PooledSigmaResult {
  if (rounds.length === 0) {
    throw new StatsError('too-few-values', 'pooledSigma requires at least 1 round, found 0');
  }
  for (const round of rounds) check(round);
  const degreesOfFreedom = rounds.reduce((sum, { count }) => sum + count - 1, 0);
  const pooled = (sizes: readonly number[]) => {
    const largest = Math.max(...sizes);
    if (largest === 0) return 0;
    const weigh = (i: number) => ((rounds[i]?.count ?? 1) - 1) * ((sizes[i] as number) / largest) ** 2;
    return largest * Math.sqrt(compensatedSum(rounds.length, weigh) / degreesOfFreedom);
  };
  const standardDeviation = pooled(rounds.map((round) => round.standardDeviation));
  if (standardDeviation === 0) {
    throw new StatsError(
      'no-spread',
      'pooledSigma requires a standard deviation above zero, found 0 in all rounds',
    );
  }
  const ratios = rounds.map((round) =>
    round.level === undefined ? null : round.standardDeviation / round.level,
  );
  const relative = ratios.every((ratio) => ratio !== null)
    ? representable('pooledSigma', pooled(ratios))
    : null;
  return { standardDeviation, relative, rounds: rounds.length, degreesOfFreedom };
}

function check({ standardDeviation, count, level }: RoundSpread): void {
  checkNotNegative('pooledSigma', 'standard deviation', standardDeviation);
  if (!(Number.isInteger(count) && count >= 2)) {
    throw new StatsError(
      'too-few-values',
      `pooledSigma requires at least 2 results in a round, found ${count}`,
    );
  }
  if (level !== undefined) checkPositive('pooledSigma', 'level', level);
}
