import { checkFinite, checkNotNegative, checkValues, representable } from '../internal/check-values';
import { mean } from './mean';
import { sd } from './sd';

export interface WinsoriseLimits {
  readonly location: number;
  readonly scale: number;
  readonly multiple?: number;
}

export interface WinsoriseResult {
  readonly lower: number;
  readonly upper: number;
  readonly values: readonly number[];
  readonly mean: number;
  /** 1.134 times the standard deviation of the winsorised values. */
  readonly scale: number;
}

/** Makes up for the spread that winsorising at 1.5 s* takes away, as the standard prints it; exactly 1.13339. */
export const WINSOR_SCALE_FACTOR = 1.134;
export const WINSOR_MULTIPLE = 1.5;

/**
 * One step of Algorithm A by hand: values outside location +- 1.5 scale are moved to these limits.
 *
 * For showing and checking a step; algorithmA repeats it, faster, until nothing moves.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param limits.location - x* before the step. Unit: unit of the data. Domain: finite.
 * @param limits.scale - s* before the step. Unit: unit of the data. Domain: finite; >= 0.
 * @param limits.multiple - Default 1.5, because Algorithm A takes it; the factor 1.134 belongs to it.
 * @returns { lower, upper, values: in the order of the input, mean, scale }, unit of the data
 * @throws StatsError too-few-values below 2 values; not-finite; out-of-domain for a negative scale or multiple, or
 *   limits too large to represent
 *
 * Ties and equal values: allowed. Order of input: kept.
 * Numerics: O(n).
 * Source: ISO 13528:2022, Annex C.3.1; AMC Technical Brief No. 6 (2001).
 * Checked by: tests/reference/proficiency (amctb6), tests/stats/location-scale/algorithm-a.test.ts.
 * @example winsorise([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9], { location: 5.2, scale: 1.05 }).upper // => 6.775
 */
export function winsorise(values: readonly number[], limits: WinsoriseLimits): WinsoriseResult {
  const { location, scale, multiple = WINSOR_MULTIPLE } = limits;
  checkValues('winsorise', values, 2);
  checkFinite('winsorise', 'location', location);
  checkNotNegative('winsorise', 'scale', scale);
  checkNotNegative('winsorise', 'multiple', multiple);
  const lower = representable('winsorise', location - multiple * scale);
  const upper = representable('winsorise', location + multiple * scale);
  const moved = values.map((value) => Math.min(upper, Math.max(lower, value)));
  const newScale = representable('winsorise', WINSOR_SCALE_FACTOR * sd(moved));
  return { lower, upper, values: moved, mean: mean(moved), scale: newScale };
}
