import { checkPositive, representable } from '../../internal/check-values';
import { sampleSd, scaledMean } from '../../internal/sums';
import { withinVariance } from '../internal/within-variance';

export interface ReadingRepeatability {
  readonly items: number;
  readonly degreesOfFreedom: number;
  /** Standard deviation of readings of one item. */
  readonly withinSd: number;
  /** Root mean square of the difference of two readings, sqrt(2) withinSd. */
  readonly rmsDifference: number;
  /** multiplier rmsDifference: two readings of one item differ by less with about 95 %. */
  readonly coefficient: number;
  /** First less second reading, where every item has two and there are at least 2 items; otherwise null. */
  readonly meanDifference: number | null;
  readonly sdDifference: number | null;
}

/**
 * Repeatability of one method from readings of the same items.
 *
 * @param readings - readings by item. Shape: items of one or more values, one at least with 2. Unit: unit of the data.
 * @param options.multiplier - Domain: > 0. Default 2 (Bland and Altman 1986, after BS 5497); 1.96 in their 1999 paper.
 * @returns ReadingRepeatability, unit of the data. A mean difference far from 0 says that the second reading knew of
 *   the first, or that the item changed: then the coefficient is not one of repeatability alone.
 * @throws StatsError too-few-values when no item has 2 readings; not-finite; out-of-domain
 *
 * Ties and equal values: allowed, withinSd is then 0. Order of input: only the sign of meanDifference. Numerics: O(n).
 * Source: Bland and Altman 1986, Lancet 327, 307-310 (repeatability); 1999, section 2.
 * Checked by: tests/reference/method-comparison (pefr).
 * @example readingRepeatability([[10, 12], [20, 20]]) // => withinSd 1, rmsDifference 1.4142, coefficient 2.8284
 */
export function readingRepeatability(
  readings: readonly (readonly number[])[],
  options: { readonly multiplier?: number } = {},
): ReadingRepeatability {
  const caller = 'readingRepeatability';
  const multiplier = options.multiplier ?? 2;
  checkPositive(caller, 'multiplier', multiplier);
  const { variance, degreesOfFreedom } = withinVariance(caller, readings);
  const withinSd = representable(caller, Math.sqrt(variance));
  const paired = readings.length > 1 && readings.every((values) => values.length === 2);
  const differences = paired ? readings.map(([first, second]) => (first as number) - (second as number)) : [];
  return {
    items: readings.length,
    degreesOfFreedom,
    withinSd,
    rmsDifference: Math.SQRT2 * withinSd,
    coefficient: multiplier * Math.SQRT2 * withinSd,
    meanDifference: paired ? scaledMean(differences, 1) : null,
    sdDifference: paired ? sampleSd(differences) : null,
  };
}
