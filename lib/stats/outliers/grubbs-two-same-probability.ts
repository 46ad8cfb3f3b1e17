import { checkCount } from './check-alpha';
import { StatsError } from '../stats-error';
import { twoLargestDistribution } from './two-largest-distribution';

export interface GrubbsTwoSameProbabilityInput {
  readonly count: number;
  readonly ratio: number;
  readonly sides: 1 | 2;
}

/**
 * Probability that taking two values off one end of a normal sample leaves at most this share of the sum of squares.
 *
 * @param input.count - n. Domain: whole; at least 4.
 * @param input.ratio - what is left. Unit: none. Domain: 0 to 1.
 * @param input.sides - 1 for a given end; 2 for the end that leaves less (twice that of one end, a bound).
 * @returns the probability
 * @throws StatsError too-few-values below 4; out-of-domain for a ratio outside 0 to 1 or n not whole
 *
 * Numerics: exact to about 1e-7, tens of milliseconds.
 * Source: Grubbs 1950, Annals of Mathematical Statistics 21, 27.
 * Checked by: tests/stats/outliers/critical-values.test.ts.
 * @example grubbsTwoSameProbability({ count: 9, ratio: 0.1492, sides: 2 }) // => 0.0500
 */
export function grubbsTwoSameProbability(input: GrubbsTwoSameProbabilityInput): number {
  const { count, ratio, sides } = input;
  checkCount('grubbsTwoSameProbability', 'values', count, 4);
  if (!(ratio >= 0 && ratio <= 1)) {
    const message = `grubbsTwoSameProbability requires a ratio from 0 to 1, found ${ratio}`;
    throw new StatsError('out-of-domain', message);
  }
  return Math.min(1, sides * twoLargestDistribution(count)(ratio));
}
