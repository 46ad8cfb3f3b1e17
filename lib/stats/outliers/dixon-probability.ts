import { StatsError } from '../stats-error';
import { DIXON_RATIOS, checkDixonCount, dixonRatioFor, type DixonRatioName } from './dixon-critical';
import { dixonTail } from './dixon-distribution';

export interface DixonProbabilityInput {
  readonly count: number;
  readonly statistic: number;
  readonly sides: 1 | 2;
  readonly ratio?: DixonRatioName;
}

/**
 * Probability that Dixon's ratio of a normal sample is above a value.
 *
 * @param input.count - n. Domain: whole; 3 to 100 (4, 5, 6 or more for r11, r21, r22).
 * @param input.statistic - the ratio. Unit: none. Domain: 0 to 1.
 * @param input.sides - 1 for a given end; 2 for the end with the larger ratio (twice that of one end, a bound).
 * @param input.ratio - r10, r11, r21 or r22. Default by n, as Dixon 1953 advises.
 * @returns the probability
 * @throws StatsError too-few-values; out-of-domain above 100, for a ratio outside 0 to 1 or n not whole
 *
 * Numerics: Gauss quadrature, good to about 1e-9.
 * Source: Dixon 1951, Annals of Mathematical Statistics 22, 68.
 * Checked by: tests/stats/outliers/critical-values.test.ts.
 * @example dixonProbability({ count: 3, statistic: 0.9412, sides: 1 }) // => 0.0500
 */
export function dixonProbability({ count, statistic, sides, ratio }: DixonProbabilityInput): number {
  const kind = DIXON_RATIOS[ratio ?? dixonRatioFor(count)];
  checkDixonCount('dixonProbability', count, kind.minimum);
  if (!(statistic >= 0 && statistic <= 1)) {
    const message = `dixonProbability requires a ratio from 0 to 1, found ${statistic}`;
    throw new StatsError('out-of-domain', message);
  }
  return Math.min(1, sides * dixonTail(count, kind)(statistic));
}
