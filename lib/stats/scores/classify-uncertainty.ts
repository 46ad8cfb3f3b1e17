import { checkNotNegative } from '../internal/check-values';

export interface ClassifyUncertaintyInput {
  readonly standardUncertainty: number;
  readonly assignedUncertainty: number;
  readonly robustSd: number;
}

export type UncertaintyClass = 'plausible' | 'low' | 'high';

/** u(x_i) above this multiple of s* is more than a typical laboratory has. */
export const HIGH_UNCERTAINTY_MULTIPLE = 1.5;

/**
 * Is a stated uncertainty plausible? Between u_min = u(x_pt) and u_max = 1.5 s* it is.
 *
 * Below u_min it may be underestimated, above u_max overestimated: a hint to look, not a fault.
 *
 * @param input.standardUncertainty - u(x_i), standard. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.assignedUncertainty - u(x_pt), standard. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.robustSd - s* of the round. Unit: unit of the data. Domain: finite; >= 0.
 * @returns 'low', 'plausible' or 'high'; below u_min comes first when u_min is above u_max
 * @throws StatsError not-finite; out-of-domain when one is negative
 *
 * Numerics: plain comparison; both ends are plausible.
 * Source: ISO 13528:2022, 9.8.
 * Checked by: tests/stats/scores/scores.test.ts.
 * @example classifyUncertainty({ standardUncertainty: 1, assignedUncertainty: 0.2, robustSd: 1 }) // => 'plausible'
 */
export function classifyUncertainty(input: ClassifyUncertaintyInput): UncertaintyClass {
  checkNotNegative('classifyUncertainty', 'standard uncertainty', input.standardUncertainty);
  checkNotNegative('classifyUncertainty', 'uncertainty of the assigned value', input.assignedUncertainty);
  checkNotNegative('classifyUncertainty', 'robust standard deviation', input.robustSd);
  if (input.standardUncertainty < input.assignedUncertainty) return 'low';
  return input.standardUncertainty > HIGH_UNCERTAINTY_MULTIPLE * input.robustSd ? 'high' : 'plausible';
}
