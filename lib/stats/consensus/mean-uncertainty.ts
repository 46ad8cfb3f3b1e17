import { checkNotNegative } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface MeanUncertaintyInput {
  readonly standardDeviation: number;
  readonly count: number;
}

/**
 * Standard uncertainty of an arithmetic mean: sd / sqrt(p).
 *
 * For a consensus by the plain mean, which is fit only where wild results were looked at before.
 *
 * @param input.standardDeviation - sd with divisor p - 1. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.count - p, the number of results in the mean. Unit: none. Domain: whole; at least 2.
 * @returns the standard uncertainty, unit of the data
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for a negative standard deviation
 *
 * Zero spread: 0.
 * Numerics: one formula.
 * Source: standard uncertainty of a mean, JCGM 100:2008, 4.2.3.
 * Checked by: tests/stats/consensus/consensus.test.ts.
 * @example meanUncertainty({ standardDeviation: 2, count: 16 }) // => 0.5
 */
export function meanUncertainty({ standardDeviation, count }: MeanUncertaintyInput): number {
  checkNotNegative('meanUncertainty', 'standard deviation', standardDeviation);
  if (!(count >= 2)) {
    throw new StatsError('too-few-values', `meanUncertainty requires at least 2 results, found ${count}`);
  }
  return standardDeviation / Math.sqrt(count);
}
