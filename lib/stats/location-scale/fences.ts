import { checkValues, representable } from '../internal/check-values';
import { sortedCopy } from '../internal/sorted';
import { hingesOfSorted, type Hinges } from './hinges';

export interface Fences extends Hinges {
  readonly innerLow: number;
  readonly innerHigh: number;
  readonly outerLow: number;
  readonly outerHigh: number;
  /** Outside the inner fences but not the outer ones. */
  readonly unusual: number;
  /** Outside the outer fences. */
  readonly extreme: number;
}

/**
 * Tukey's fences about the hinges: 1.5 and 3 times the distance of the hinges outside them.
 *
 * For a look at the data: values between the fences are called unusual, values outside both extreme. They flag; they do
 * not exclude.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @returns { lower, upper: the hinges; innerLow, innerHigh, outerLow, outerHigh, unusual, extreme: how many }
 * @throws StatsError too-few-values; not-finite; out-of-domain when a fence is too large to represent
 *
 * Ties and equal values: allowed; a value on a fence is inside it. Order of input: does not matter.
 * Numerics: one sort, O(n log n).
 * Source: Tukey 1977, Exploratory Data Analysis, 2; ASTM E2489 uses them for one sample.
 * Checked by: tests/stats/location-scale/trimmed-mean.test.ts, tests/reference/proficiency (estimators).
 * @example fences([1, 2, 3, 4, 100]).extreme // => 1
 */
export function fences(values: readonly number[]): Fences {
  checkValues('fences', values, 1);
  const { lower, upper } = hingesOfSorted(sortedCopy(values));
  const range = representable('fences', upper - lower);
  const at = (hinge: number, steps: number) => representable('fences', hinge + steps * range);
  const [innerLow, innerHigh] = [at(lower, -1.5), at(upper, 1.5)];
  const [outerLow, outerHigh] = [at(lower, -3), at(upper, 3)];
  const outside = (low: number, high: number) => values.filter((x) => x < low || x > high).length;
  const extreme = outside(outerLow, outerHigh);
  const unusual = outside(innerLow, innerHigh) - extreme;
  return { lower, upper, innerLow, innerHigh, outerLow, outerHigh, unusual, extreme };
}
