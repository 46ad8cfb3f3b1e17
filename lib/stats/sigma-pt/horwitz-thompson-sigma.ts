import { massFractionOf, type LevelInput } from '../internal/mass-fraction';

/** Bounds of the middle branch, as mass fractions; both belong to it. */
const LOW = 1.2e-7;
const HIGH = 0.138;

/**
 * sigma_pt by Thompson's modification of Horwitz: 0.22 c below 1.2e-7, 0.02 c^0.8495, 0.01 c^0.5 above 0.138.
 *
 * A general model for foods and feeds at any level, not fit for purpose by itself.
 *
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.massFractionPerUnit - the mass fraction of one unit, for instance 1e-9 for micrograms per kilogram.
 *   Domain: finite; > 0; with x_pt at most a mass fraction of 1.
 * @returns sigma_pt, unit of the data
 * @throws StatsError not-finite; no-spread when one is 0; out-of-domain when one is negative or the mass fraction
 *   is above 1
 *
 * Numerics: one power. The branches do not meet exactly: at 1.2e-7 sigma_pt steps by 0.04 percent.
 * Source: Thompson 2000, Analyst 125, 385-386; ISO 13528:2022, 8.4.
 * Checked by: tests/stats/sigma-pt/sigma-pt.test.ts, tests/reference/proficiency (thompson-sigma).
 * @example horwitzThompsonSigma({ assignedValue: 10, massFractionPerUnit: 1e-9 }) // => 2.2
 */
export function horwitzThompsonSigma(input: LevelInput): number {
  const fraction = massFractionOf('horwitzThompsonSigma', input);
  if (fraction < LOW) return 0.22 * input.assignedValue;
  if (fraction <= HIGH) return (0.02 * fraction ** 0.8495) / input.massFractionPerUnit;
  return (0.01 * Math.sqrt(fraction)) / input.massFractionPerUnit;
}
