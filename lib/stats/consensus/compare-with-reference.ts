import { checkFinite, checkNotNegative, representable } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import type { WorkingStep } from '../working';

export interface CompareWithReferenceInput {
  readonly consensus: number;
  readonly consensusUncertainty: number;
  readonly reference: number;
  readonly referenceUncertainty: number;
}

export interface CompareWithReferenceResult {
  readonly difference: number;
  readonly standardUncertainty: number;
  /** |difference| / standardUncertainty; null when both uncertainties are 0. */
  readonly ratio: number | null;
  /** At most twice its standard uncertainty. */
  readonly agrees: boolean;
  readonly statement: string;
  readonly working: readonly WorkingStep[];
}

/** A difference beyond this many standard uncertainties asks for a cause. */
const LIMIT = 2;

/**
 * Consensus of the participants against an independent reference value: their difference and its uncertainty.
 *
 * Beyond twice the standard uncertainty one of them is off: a bias that many participants share, or a reference that does
 * not fit the item. Which, the figures do not say; the cause is to be looked for and reported.
 *
 * @param input.consensus, input.reference - Unit: unit of the data. Domain: finite.
 * @param input.consensusUncertainty, input.referenceUncertainty - standard. Unit: unit of the data. Domain: finite; >= 0.
 * @returns { difference: consensus - reference, standardUncertainty, ratio, agrees, statement, working }
 * @throws StatsError not-finite; out-of-domain for a negative uncertainty or a result too large to represent
 *
 * Zero spread: equal values agree, others do not. Numerics: hypot; at the limit compared on the decimal figures.
 * Source: ISO 13528:2022, 7.8: u_diff = sqrt(u(x_ref)^2 + u(x_pt)^2).
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example compareWithReference({ consensus: 12, consensusUncertainty: 0.3, reference: 10, referenceUncertainty: 0.4 }).ratio // => 4
 */
export function compareWithReference(input: CompareWithReferenceInput): CompareWithReferenceResult {
  const { consensus, consensusUncertainty, reference, referenceUncertainty } = input;
  const caller = 'compareWithReference';
  checkFinite(caller, 'consensus value', consensus);
  checkFinite(caller, 'reference value', reference);
  checkNotNegative(caller, 'uncertainty of the consensus', consensusUncertainty);
  checkNotNegative(caller, 'uncertainty of the reference', referenceUncertainty);
  const difference = representable(caller, consensus - reference);
  const parts = [consensusUncertainty, referenceUncertainty];
  const standardUncertainty = representable(caller, Math.hypot(...parts));
  const ratio =
    standardUncertainty === 0
      ? null
      : Math.abs(
          ratioAtLimit({ caller, value: consensus, assignedValue: reference, parts, limits: [LIMIT] }),
        );
  const agrees = ratio === null ? difference === 0 : ratio <= LIMIT;
  const clause = 'ISO 13528, 7.8';
  return {
    difference,
    standardUncertainty,
    ratio,
    agrees,
    statement: agrees
      ? 'Consensus and reference value agree within twice the standard uncertainty of their difference.'
      : 'Consensus and reference value differ by more than twice the standard uncertainty of their difference; look for the cause.',
    working: [
      {
        name: 'Difference',
        formula: 'd = x_pt - x_ref',
        clause,
        inputs: { x_pt: consensus, x_ref: reference },
        value: difference,
      },
      {
        name: 'Standard uncertainty of the difference',
        formula: 'u_d = sqrt(u_pt^2 + u_ref^2)',
        clause,
        inputs: { u_pt: consensusUncertainty, u_ref: referenceUncertainty },
        value: standardUncertainty,
      },
    ],
  };
}
