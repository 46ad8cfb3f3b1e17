import { representable } from '../internal/check-values';
import { StatsError } from '../stats-error';
import { difference, type DifferenceInput } from './difference';

/**
 * Percentage difference D% of a result from the assigned value.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite; not 0.
 * @returns 100 (x_i - x_pt) / x_pt, percent; the sign turns with a negative x_pt, as the definition has it
 * @throws StatsError not-finite; out-of-domain when x_pt is 0 or the result is too large to represent
 *
 * Numerics: one formula.
 * Source: ISO 13528:2022, 9.3.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-Dpct).
 * @example percentDifference({ value: 11.5, assignedValue: 10 }) // => 15
 */
export function percentDifference(input: DifferenceInput): number {
  const found = difference(input);
  if (input.assignedValue === 0) {
    throw new StatsError(
      'out-of-domain',
      'percentDifference requires an assigned value other than zero, found 0',
    );
  }
  return representable('percentDifference', 100 * (found / input.assignedValue));
}
