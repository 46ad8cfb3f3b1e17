import { checkNotNegative, checkPositive, representable } from '../internal/check-values';

export interface NegligibleUncertaintyInput {
  readonly standardUncertainty: number;
  readonly sigmaPt: number;
}

export interface NegligibleUncertaintyResult {
  readonly ratio: number;
  readonly limit: number;
  readonly negligible: boolean;
}

/** u(x_pt) up to this share of sigma_pt hardly changes a score. */
export const NEGLIGIBLE_SHARE = 0.3;

/**
 * Check of the assigned value's uncertainty against sigma_pt: negligible when u(x_pt) <= 0.3 sigma_pt.
 *
 * Above, score by z' (or choose a larger sigma_pt) and say so to the participants.
 *
 * @param input.standardUncertainty - u(x_pt). Unit: unit of the data. Domain: finite; >= 0.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @returns { ratio: u(x_pt) / sigma_pt, limit: 0.3, negligible }
 * @throws StatsError not-finite; no-spread when sigma_pt is 0; out-of-domain when one is negative
 *
 * Numerics: the ratio is compared with 0.3 unrounded, bearing two units in the last digit for binary rounding, so
 *   that 0.03 against 0.1 is at the limit and negligible.
 * Source: ISO 13528:2022, 9.2.1.
 * Checked by: tests/stats/consensus/consensus.test.ts.
 * @example negligibleUncertainty({ standardUncertainty: 0.2, sigmaPt: 1 }) // => ratio 0.2, negligible true
 */
export function negligibleUncertainty(input: NegligibleUncertaintyInput): NegligibleUncertaintyResult {
  checkNotNegative('negligibleUncertainty', 'standard uncertainty', input.standardUncertainty);
  checkPositive('negligibleUncertainty', 'sigma_pt', input.sigmaPt);
  const ratio = representable('negligibleUncertainty', input.standardUncertainty / input.sigmaPt);
  const negligible = ratio <= NEGLIGIBLE_SHARE * (1 + 2 * Number.EPSILON);
  return { ratio, limit: NEGLIGIBLE_SHARE, negligible };
}
