import { checkFinite, checkNotNegative, checkPositive } from '../internal/check-values';
import type { ReferenceValue } from './formulation-value';

export interface CertifiedValueInput {
  readonly certifiedValue: number;
  /** U as the certificate gives it. */
  readonly expandedUncertainty: number;
  /** k of that U. Default 2, the usual one of certificates. */
  readonly coverageFactor?: number;
}

/**
 * Assigned value of a certified reference material used as test item: the certified value, with u = U / k.
 *
 * @param input.certifiedValue - Unit: unit of the data. Domain: finite.
 * @param input.expandedUncertainty - U. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.coverageFactor - k. Default 2. Domain: finite; > 0.
 * @returns { value, standardUncertainty, working }, unit of the data
 * @throws StatsError not-finite; no-spread for k = 0; out-of-domain for a negative U or k
 *
 * Numerics: one division. Source: ISO 13528:2022, 7.4.
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example certifiedValue({ certifiedValue: 10, expandedUncertainty: 0.4 }).standardUncertainty // => 0.2
 */
export function certifiedValue(input: CertifiedValueInput): ReferenceValue {
  const { certifiedValue: value, expandedUncertainty, coverageFactor = 2 } = input;
  checkFinite('certifiedValue', 'certified value', value);
  checkNotNegative('certifiedValue', 'expanded uncertainty', expandedUncertainty);
  checkPositive('certifiedValue', 'coverage factor', coverageFactor);
  const standardUncertainty = expandedUncertainty / coverageFactor;
  const step = {
    name: 'Standard uncertainty of the certified value',
    formula: 'u = U / k',
    clause: 'ISO 13528, 7.4',
    inputs: { U: expandedUncertainty, k: coverageFactor },
    value: standardUncertainty,
  };
  return { value, standardUncertainty, working: [step] };
}
