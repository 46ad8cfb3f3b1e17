import { checkNotNegative, representable } from '../internal/check-values';
import type { LevelInput } from '../internal/mass-fraction';
import { horwitzSigma } from './horwitz-sigma';
import { horwitzThompsonSigma } from './horwitz-thompson-sigma';

export interface HorRatInput extends LevelInput {
  readonly standardDeviation: number;
}

export interface HorRatOptions {
  readonly prediction?: 'horwitz' | 'horwitz-thompson';
}

/**
 * HorRat: a reproducibility standard deviation, or a sigma_pt, over the one Horwitz predicts at that level.
 *
 * About 0.5 to 2 is what collaborative trials usually show (common practice).
 *
 * @param input.standardDeviation - sd or sigma_pt. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.massFractionPerUnit - the mass fraction of one unit. Domain: finite; > 0.
 * @param options.prediction - Default 'horwitz', by which the ratio is defined; 'horwitz-thompson' truncates the
 *   prediction at low and high levels.
 * @returns the ratio, no unit
 * @throws StatsError not-finite; no-spread; out-of-domain as horwitzSigma
 *
 * Numerics: one division.
 * Source: Horwitz and Albert 2006, J. AOAC Int. 89, 1095.
 * Checked by: tests/stats/sigma-pt/sigma-pt.test.ts, tests/reference/proficiency (horrat).
 * @example horRat({ standardDeviation: 3.2, assignedValue: 10, massFractionPerUnit: 1e-9 }) // => 1.00028
 */
export function horRat(input: HorRatInput, { prediction = 'horwitz' }: HorRatOptions = {}): number {
  checkNotNegative('horRat', 'standard deviation', input.standardDeviation);
  const predicted = prediction === 'horwitz' ? horwitzSigma(input) : horwitzThompsonSigma(input);
  return representable('horRat', input.standardDeviation / predicted);
}
