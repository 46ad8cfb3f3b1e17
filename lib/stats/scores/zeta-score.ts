import { checkFinite, checkNotNegative } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import { StatsError } from '../stats-error';
import type { DifferenceInput } from './difference';
import { ACTION_LIMIT, WARNING_LIMIT } from './limits';

export interface ZetaScoreInput extends DifferenceInput {
  readonly standardUncertainty: number;
  readonly assignedUncertainty: number;
}

/**
 * zeta score: does a result agree with the assigned value within the uncertainties that both claim?
 *
 * To be read beside z: a large zeta with a small z says that the stated uncertainty is too small. The result should
 * not be part of the assigned value; with a consensus it is, and zeta is then a little too small.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.standardUncertainty - u(x_i), standard. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.assignedUncertainty - u(x_pt), standard. Unit: unit of the data. Domain: finite; >= 0.
 * @returns (x_i - x_pt) / sqrt(u(x_i)^2 + u(x_pt)^2), no unit
 * @throws StatsError not-finite; no-spread when both uncertainties are 0; out-of-domain when one is negative or the
 *   score is too large to represent
 *
 * Numerics: hypot, no overflow; near 2 and 3 compared on the decimal figures.
 * Source: ISO 13528:2022, 9.6.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-zeta, nist-zeta).
 * @example zetaScore({ value: 15, assignedValue: 10, standardUncertainty: 4, assignedUncertainty: 3 }) // => 1
 */
export function zetaScore(input: ZetaScoreInput): number {
  const { value, assignedValue, standardUncertainty, assignedUncertainty } = input;
  checkFinite('zetaScore', 'result', value);
  checkFinite('zetaScore', 'assigned value', assignedValue);
  checkNotNegative('zetaScore', 'standard uncertainty', standardUncertainty);
  checkNotNegative('zetaScore', 'uncertainty of the assigned value', assignedUncertainty);
  if (standardUncertainty === 0 && assignedUncertainty === 0) {
    throw new StatsError('no-spread', 'zetaScore requires an uncertainty above zero, found both 0');
  }
  const parts = [standardUncertainty, assignedUncertainty];
  return ratioAtLimit({
    caller: 'zetaScore',
    value,
    assignedValue,
    parts,
    limits: [WARNING_LIMIT, ACTION_LIMIT],
  });
}
