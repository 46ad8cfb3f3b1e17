import { checkFinite } from '../../internal/check-values';
import { generalisedEsd, type EsdStep } from '../../outliers';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';

export interface OutlyingPairsOptions {
  /** The line that residuals are taken from. Default the identity, so that residuals are differences y - x. */
  readonly line?: { readonly slope: number; readonly intercept: number };
  /** 'proportional' divides each residual by the level, for errors that grow with it. Default 'constant'. */
  readonly error?: 'constant' | 'proportional';
  readonly maxOutliers?: number;
  readonly alpha?: number;
}

export interface OutlyingPairs {
  readonly count: number;
  /** y - intercept - slope x, over the level for proportional errors. */
  readonly residuals: readonly number[];
  /** Places of the pairs that stand out, from 0, the furthest first. They are named here and nothing else is done. */
  readonly suspects: readonly number[];
  readonly steps: readonly EsdStep[];
  readonly maxOutliers: number;
  readonly alpha: number;
}

/**
 * Outlying pairs of a comparison: residuals from a line that are too far out for normal errors.
 *
 * Nothing is left out: a person looks for the cause and decides, and a report shows both lines, with and without.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 3.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.line - { slope, intercept }; from a robust line outliers stand out best.
 * @param options.error - 'constant' or 'proportional' (levels above 0).
 * @param options.maxOutliers - Domain: whole; 1 to n - 2. Default a tenth of the pairs, at least 1 and at most 10.
 * @param options.alpha - Default 0.05.
 * @returns OutlyingPairs
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all residuals are equal; out-of-domain
 *
 * Ties and equal values: allowed. Order of input: does not matter but for ties. Numerics: O(n maxOutliers).
 * Source: Rosner 1983, Technometrics 25, 165-172 (generalised ESD), on residuals.
 * Checked by: tests/stats/method-comparison/outlying-pairs.test.ts.
 * @example outlyingPairs([1, 2, 3, 4, 5, 6], [1.1, 1.9, 3.1, 3.9, 5.1, 9]).suspects // => [5]
 */
export function outlyingPairs(
  x: readonly number[],
  y: readonly number[],
  options: OutlyingPairsOptions = {},
): OutlyingPairs {
  const caller = 'outlyingPairs';
  checkPairs(caller, x, y, 3);
  const { slope, intercept } = options.line ?? { slope: 1, intercept: 0 };
  checkFinite(caller, 'slope', slope);
  checkFinite(caller, 'intercept', intercept);
  const maxOutliers = options.maxOutliers ?? Math.max(1, Math.min(10, Math.floor(x.length / 10)));
  const alpha = options.alpha ?? 0.05;
  const residuals = x.map((value, i) => {
    const fitted = intercept + slope * value;
    const residual = (y[i] as number) - fitted;
    if (options.error !== 'proportional') return residual;
    const level = ((y[i] as number) + fitted) / 2;
    if (!(level > 0)) {
      throw new StatsError(
        'out-of-domain',
        `${caller} requires levels above zero, found one at or below at pair ${i + 1}`,
      );
    }
    return residual / level;
  });
  const { steps, suspects } = generalisedEsd(residuals, { maxOutliers, alpha });
  return { count: x.length, residuals, suspects, steps, maxOutliers, alpha };
}
