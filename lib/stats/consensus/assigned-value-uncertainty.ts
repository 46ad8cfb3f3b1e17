import { checkNotNegative, representable } from '../internal/check-values';
import type { WorkingStep } from '../working';

export interface AssignedValueUncertaintyInput {
  readonly characterisation: number;
  readonly homogeneity?: number;
  readonly transport?: number;
  readonly stability?: number;
}

export interface AssignedValueUncertaintyResult {
  readonly standardUncertainty: number;
  /** Each contribution's share of the variance. */
  readonly shares: Readonly<Record<keyof AssignedValueUncertaintyInput, number>>;
  readonly working: readonly WorkingStep[];
}

/**
 * Standard uncertainty of the assigned value from all its sources: characterisation, differences between items, transport
 * and change over the time of the round.
 *
 * With a consensus of participants the differences between items are partly in their spread already; taking them in again is
 * on the safe side.
 *
 * @param input.characterisation - u_char, from formulation, reference or consensus. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.homogeneity - u_hom, the between-item standard deviation. Default 0. Domain: finite; >= 0.
 * @param input.transport - u_trans. Default 0. Domain: finite; >= 0.
 * @param input.stability - u_stab. Default 0. Domain: finite; >= 0.
 * @returns { standardUncertainty: root of the sum of squares, shares, working }, unit of the data
 * @throws StatsError not-finite; out-of-domain when one is negative or the result is too large to represent
 *
 * Zero spread: 0, with shares of 0. Numerics: hypot, no overflow.
 * Source: ISO 13528:2022, 7.2 (u(x_pt) = sqrt(u_char^2 + u_hom^2 + u_trans^2 + u_stab^2)).
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example assignedValueUncertainty({ characterisation: 3, homogeneity: 4 }).standardUncertainty // => 5
 */
export function assignedValueUncertainty(
  input: AssignedValueUncertaintyInput,
): AssignedValueUncertaintyResult {
  const { characterisation, homogeneity = 0, transport = 0, stability = 0 } = input;
  const parts = { characterisation, homogeneity, transport, stability };
  for (const [name, value] of Object.entries(parts)) {
    checkNotNegative('assignedValueUncertainty', `uncertainty of ${name}`, value);
  }
  const all = Object.values(parts);
  const standardUncertainty = representable('assignedValueUncertainty', Math.hypot(...all));
  const share = (part: number) => (standardUncertainty === 0 ? 0 : (part / standardUncertainty) ** 2);
  const shares = {
    characterisation: share(characterisation),
    homogeneity: share(homogeneity),
    transport: share(transport),
    stability: share(stability),
  };
  const step: WorkingStep = {
    name: 'Standard uncertainty of the assigned value',
    formula: 'u = sqrt(u_char^2 + u_hom^2 + u_trans^2 + u_stab^2)',
    clause: 'ISO 13528, 7.2',
    inputs: { u_char: characterisation, u_hom: homogeneity, u_trans: transport, u_stab: stability },
    value: standardUncertainty,
  };
  return { standardUncertainty, shares, working: [step] };
}
