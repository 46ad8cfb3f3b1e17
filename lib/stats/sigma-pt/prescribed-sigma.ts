import { checkPositive } from '../internal/check-values';

/**
 * sigma_pt as prescribed: a value that the scheme, a regulation or experts set.
 *
 * @param value - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @returns the value itself, checked, unit of the data
 * @throws StatsError not-finite; no-spread when 0; out-of-domain when negative
 *
 * Numerics: none.
 * Source: ISO 13528:2022, 8.2.
 * Checked by: tests/stats/sigma-pt/sigma-pt.test.ts.
 * @example prescribedSigma(0.5) // => 0.5
 */
export function prescribedSigma(value: number): number {
  checkPositive('prescribedSigma', 'value', value);
  return value;
}
