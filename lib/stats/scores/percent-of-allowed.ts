import { checkFinite, checkPositive, representable } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import type { DifferenceInput } from './difference';

export interface PercentOfAllowedInput extends DifferenceInput {
  readonly allowedDifference: number;
}

/**
 * P_A: the difference from the assigned value in percent of an allowed difference delta_E.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.allowedDifference - delta_E. Unit: unit of the data. Domain: finite; > 0.
 * @returns 100 (x_i - x_pt) / delta_E, percent; beyond +-100 is an action signal
 * @throws StatsError not-finite; no-spread when delta_E is 0; out-of-domain when it is negative
 *
 * Numerics: at the limit the comparison is made on the decimal figures, not on their binary rounding.
 * Source: ISO 13528:2022, 9.3.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-PA).
 * @example percentOfAllowed({ value: 11.5, assignedValue: 10, allowedDifference: 3 }) // => 50
 */
export function percentOfAllowed({ value, assignedValue, allowedDifference }: PercentOfAllowedInput): number {
  checkFinite('percentOfAllowed', 'result', value);
  checkFinite('percentOfAllowed', 'assigned value', assignedValue);
  checkPositive('percentOfAllowed', 'allowed difference', allowedDifference);
  const ratio = ratioAtLimit({
    caller: 'percentOfAllowed',
    value,
    assignedValue,
    parts: [allowedDifference],
    limits: [1],
  });
  return representable('percentOfAllowed', 100 * ratio);
}
