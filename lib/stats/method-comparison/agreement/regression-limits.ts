import { checkFinite, checkPositive } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import type { LineFit } from '../lines/line-fit';
import { ordinaryLeastSquares } from '../lines/ordinary-least-squares';
import type { ConfidenceOptions } from '../types';
import { LIMITS_MULTIPLIER } from './bland-altman';
import { pairDifferences } from './pair-differences';

export interface RegressionLimits {
  readonly count: number;
  /** Regression of the differences y - x on the means of the pairs: does the bias depend on the level? */
  readonly bias: LineFit;
  /** Regression of the sizes of its residuals on the means: does the spread? */
  readonly spread: LineFit;
  readonly multiplier: number;
}

export interface LimitsAtLevel {
  readonly level: number;
  readonly bias: number;
  readonly sd: number;
  readonly lowerLimit: number;
  readonly upperLimit: number;
}

/** The size of a normal value is sqrt(2 / pi) sigma in the mean. */
const SD_PER_SIZE = Math.sqrt(Math.PI / 2);

/**
 * Regression-based limits of agreement: for a bias, or a spread, that depends on the level.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of the data. Domain: finite.
 * @param options.multiplier - of the sd. Domain: > 0. Default 1.96.
 * @param options.confidence - of the intervals of both regressions. Default 0.95.
 * @returns { count, bias, spread, multiplier }; limits at a level come from limitsAtLevel
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all means are equal; out-of-domain
 *
 * Ties and equal values: allowed. Order of input: does not matter. Numerics: two least squares fits, O(n).
 * Source: Bland and Altman 1999, Stat Methods Med Res 8, 135-160, section 3.2.
 * Checked by: tests/reference/method-comparison (milkfat), tests/stats/method-comparison/bland-altman.test.ts.
 * @example regressionLimits([1, 2, 3, 4], [1.1, 2.3, 3.2, 4.6]).bias.slope // => 0.1236
 */
export function regressionLimits(
  x: readonly number[],
  y: readonly number[],
  options: ConfidenceOptions & { readonly multiplier?: number } = {},
): RegressionLimits {
  const caller = 'regressionLimits';
  checkPairs(caller, x, y, 3);
  const confidence = confidenceOf(caller, options.confidence);
  const multiplier = options.multiplier ?? LIMITS_MULTIPLIER;
  checkPositive(caller, 'multiplier', multiplier);
  const { differences, averages } = pairDifferences(caller, 'difference', x, y);
  if (averages.every((average) => average === averages[0])) {
    throw new StatsError(
      'no-spread',
      `${caller} requires pairs at two or more levels, found all at ${averages[0]}`,
    );
  }
  const bias = ordinaryLeastSquares(averages, differences, { confidence });
  const away = (average: number) => bias.meanY + bias.slope * (average - bias.meanX);
  const sizes = averages.map((average, i) => Math.abs((differences[i] as number) - away(average)));
  return { count: x.length, bias, spread: ordinaryLeastSquares(averages, sizes, { confidence }), multiplier };
}

/**
 * Limits of agreement at one level from regressionLimits.
 *
 * @param limits - from regressionLimits
 * @param level - mean of the two methods. Unit: unit of the data. Domain: finite.
 * @param options.spread - 'constant' (default): the residual sd of the bias regression; 'modelled': sqrt(pi / 2) times
 *   the regression of the sizes of the residuals (2.46 = 1.96 sqrt(pi / 2) in the paper).
 * @returns { level, bias, sd, lowerLimit, upperLimit }
 * @throws StatsError not-finite; out-of-domain when a modelled sd is negative at the level
 *
 * Source: as regressionLimits. Checked by: tests/reference/method-comparison (milkfat).
 * @example limitsAtLevel(regressionLimits([1, 2, 3, 4], [1.1, 2.3, 3.2, 4.6]), 2).bias // => 0.235
 */
export function limitsAtLevel(
  limits: RegressionLimits,
  level: number,
  options: { readonly spread?: 'constant' | 'modelled' } = {},
): LimitsAtLevel {
  checkFinite('limitsAtLevel', 'level', level);
  const { bias: line, spread, multiplier } = limits;
  const at = (fit: LineFit) => fit.meanY + fit.slope * (level - fit.meanX);
  const sd = options.spread === 'modelled' ? SD_PER_SIZE * at(spread) : line.residualSd;
  if (sd < 0) {
    throw new StatsError(
      'out-of-domain',
      `limitsAtLevel finds a spread below 0 at ${level}, outside the data`,
    );
  }
  const bias = at(line);
  return { level, bias, sd, lowerLimit: bias - multiplier * sd, upperLimit: bias + multiplier * sd };
}
