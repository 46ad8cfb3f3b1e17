import { checkFinite, checkNotNegative, checkPositive } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import { ACTION_LIMIT, WARNING_LIMIT } from './limits';
import type { ZScoreInput } from './z-score';

export interface ZPrimeScoreInput extends ZScoreInput {
  readonly assignedUncertainty: number;
}

/**
 * z' score: like z, with the standard uncertainty of the assigned value in the divisor.
 *
 * To be used when u(x_pt) > 0.3 sigma_pt. z' is always nearer to zero than z.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.assignedUncertainty - u(x_pt), standard. Unit: unit of the data. Domain: finite; >= 0.
 * @returns (x_i - x_pt) / sqrt(sigma_pt^2 + u(x_pt)^2), no unit
 * @throws StatsError not-finite; no-spread when sigma_pt is 0; out-of-domain when one is negative or the score is
 *   too large to represent
 *
 * Numerics: hypot, no overflow; near 2 and 3 compared on the decimal figures.
 * Source: ISO 13528:2022, 9.5.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-zprime).
 * @example zPrimeScore({ value: 15, assignedValue: 10, sigmaPt: 4, assignedUncertainty: 3 }) // => 1
 */
export function zPrimeScore({
  value,
  assignedValue,
  sigmaPt,
  assignedUncertainty,
}: ZPrimeScoreInput): number {
  checkFinite('zPrimeScore', 'result', value);
  checkFinite('zPrimeScore', 'assigned value', assignedValue);
  checkPositive('zPrimeScore', 'sigma_pt', sigmaPt);
  checkNotNegative('zPrimeScore', 'uncertainty of the assigned value', assignedUncertainty);
  const parts = [sigmaPt, assignedUncertainty];
  return ratioAtLimit({
    caller: 'zPrimeScore',
    value,
    assignedValue,
    parts,
    limits: [WARNING_LIMIT, ACTION_LIMIT],
  });
}
