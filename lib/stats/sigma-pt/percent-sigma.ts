import { checkFinite, checkPositive, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface PercentSigmaInput {
  readonly assignedValue: number;
  readonly percent: number;
}

/**
 * sigma_pt as a percentage of the assigned value.
 *
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite; not 0.
 * @param input.percent - the relative standard deviation. Unit: percent. Domain: finite; > 0.
 * @returns |x_pt| percent / 100, unit of the data
 * @throws StatsError not-finite; no-spread when x_pt or the percentage is 0; out-of-domain when the percentage is
 *   negative
 *
 * Numerics: one formula.
 * Source: ISO 13528:2022, 8.2.
 * Checked by: tests/stats/sigma-pt/sigma-pt.test.ts.
 * @example percentSigma({ assignedValue: 20, percent: 25 }) // => 5
 */
export function percentSigma({ assignedValue, percent }: PercentSigmaInput): number {
  checkFinite('percentSigma', 'assigned value', assignedValue);
  checkPositive('percentSigma', 'percentage', percent);
  const sigma = representable('percentSigma', (Math.abs(assignedValue) * percent) / 100);
  if (sigma === 0) {
    throw new StatsError('no-spread', 'percentSigma requires an assigned value other than zero, found 0');
  }
  return sigma;
}
