import { checkFinite, checkNotNegative } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import { StatsError } from '../stats-error';
import type { DifferenceInput } from './difference';
import { E_N_LIMIT } from './limits';

export interface ENScoreInput extends DifferenceInput {
  readonly expandedUncertainty: number;
  readonly assignedExpandedUncertainty: number;
}

/**
 * E_n score: like zeta, with expanded uncertainties (usually k = 2). |E_n| above 1 is an action signal.
 *
 * @param input.value - x_i, the result. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.expandedUncertainty - U(x_i). Unit: unit of the data. Domain: finite; >= 0.
 * @param input.assignedExpandedUncertainty - U(x_pt), same coverage. Unit: unit of the data. Domain: finite; >= 0.
 * @returns (x_i - x_pt) / sqrt(U(x_i)^2 + U(x_pt)^2), no unit
 * @throws StatsError not-finite; no-spread when both uncertainties are 0; out-of-domain when one is negative or the
 *   score is too large to represent
 *
 * Numerics: hypot, no overflow; near 1 compared on the decimal figures.
 * Source: ISO 13528:2022, 9.7.
 * Checked by: tests/stats/scores/scores.test.ts, tests/reference/proficiency (def-En, nist-En).
 * @example eNScore({ value: 15, assignedValue: 10, expandedUncertainty: 8, assignedExpandedUncertainty: 6 }) // => 0.5
 */
export function eNScore(input: ENScoreInput): number {
  const { value, assignedValue, expandedUncertainty, assignedExpandedUncertainty } = input;
  checkFinite('eNScore', 'result', value);
  checkFinite('eNScore', 'assigned value', assignedValue);
  checkNotNegative('eNScore', 'expanded uncertainty', expandedUncertainty);
  checkNotNegative('eNScore', 'expanded uncertainty of the assigned value', assignedExpandedUncertainty);
  if (expandedUncertainty === 0 && assignedExpandedUncertainty === 0) {
    throw new StatsError('no-spread', 'eNScore requires an uncertainty above zero, found both 0');
  }
  const parts = [expandedUncertainty, assignedExpandedUncertainty];
  return ratioAtLimit({ caller: 'eNScore', value, assignedValue, parts, limits: [E_N_LIMIT] });
}
