import { checkFinite, checkPositive } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import type { DifferenceInput } from './difference';
import { ACTION_LIMIT, WARNING_LIMIT } from './limits';

export interface ZScoreInput extends DifferenceInput {
  readonly sigmaPt: number;
}

/**
 * z score: the difference from the assigned value in units of sigma_pt.
 *
 * To be used when u(x_pt) <= 0.3 sigma_pt; above, z' takes the uncertainty of the assigned value into account.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @returns (x_i - x_pt) / sigma_pt, no unit
 * @throws StatsError not-finite; no-spread when sigma_pt is 0; out-of-domain when it is negative or the score is
 *   too large to represent
 *
 * Numerics: near 2 and 3 the comparison is made on the decimal figures, so that (1.1 - 0.9) / 0.1 is 2.
 * Source: ISO 13528:2022, 9.4.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-z).
 * @example zScore({ value: 11.5, assignedValue: 10, sigmaPt: 1 }) // => 1.5
 */
export function zScore({ value, assignedValue, sigmaPt }: ZScoreInput): number {
  checkFinite('zScore', 'result', value);
  checkFinite('zScore', 'assigned value', assignedValue);
  checkPositive('zScore', 'sigma_pt', sigmaPt);
  const limits = [WARNING_LIMIT, ACTION_LIMIT];
  return ratioAtLimit({ caller: 'zScore', value, assignedValue, parts: [sigmaPt], limits });
}
