import { checkFinite, representable } from '../internal/check-values';

export interface DifferenceInput {
  readonly value: number;
  readonly assignedValue: number;
}

/**
 * Difference D of a result from the assigned value.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @returns x_i - x_pt, unit of the data
 * @throws StatsError not-finite; out-of-domain when the difference is too large to represent
 *
 * Numerics: one subtraction.
 * Source: ISO 13528:2022, 9.3.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-D).
 * @example difference({ value: 11.5, assignedValue: 10 }) // => 1.5
 */
export function difference({ value, assignedValue }: DifferenceInput): number {
  checkFinite('difference', 'result', value);
  checkFinite('difference', 'assigned value', assignedValue);
  return representable('difference', value - assignedValue);
}
