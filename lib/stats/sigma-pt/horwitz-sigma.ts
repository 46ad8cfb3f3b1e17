import { massFractionOf, type LevelInput } from '../internal/mass-fraction';

/**
 * sigma_pt by Horwitz: the reproducibility that collaborative trials show at a level, 0.02 c^0.8495.
 *
 * A general model, not fit for purpose by itself. Below about 0.12 mg/kg laboratories do better than it
 * predicts; there use horwitzThompsonSigma.
 *
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.massFractionPerUnit - the mass fraction of one unit, for instance 1e-9 for micrograms per kilogram.
 *   Domain: finite; > 0; with x_pt at most a mass fraction of 1.
 * @returns sigma_pt, unit of the data
 * @throws StatsError not-finite; no-spread when one is 0; out-of-domain when one is negative or the mass fraction
 *   is above 1
 *
 * Numerics: one power.
 * Source: Horwitz 1982, Anal. Chem. 54, 67A; ISO 13528:2022, 8.4.
 * Checked by: tests/stats/sigma-pt/sigma-pt.test.ts, tests/reference/proficiency (horwitz-rsd).
 * @example horwitzSigma({ assignedValue: 10, massFractionPerUnit: 1e-9 }) // => 3.19912 (32 %)
 */
export function horwitzSigma(input: LevelInput): number {
  const fraction = massFractionOf('horwitzSigma', input);
  return (0.02 * fraction ** 0.8495) / input.massFractionPerUnit;
}
