import { checkPositive, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';

/**
 * A standard deviation as a function of the level m: constant a; proportional b m; linear a + b m; power a m^b;
 * characteristic sqrt(a^2 + (b m)^2), which is constant at low levels and proportional at high ones.
 */
export interface SigmaFunction {
  readonly form: 'constant' | 'proportional' | 'linear' | 'power' | 'characteristic';
  /** Unit: unit of the data (for 'power' that of a m^b); 0 for 'proportional'. */
  readonly a: number;
  /** Unit: none; 0 for 'constant'. */
  readonly b: number;
}

/**
 * sigma_pt from a function of the level: one set for fitness for purpose, or fitted to earlier rounds.
 *
 * @param sigma - the function, for instance of fitSigmaFunction
 * @param level - x_pt. Unit: unit of the data. Domain: finite; > 0.
 * @returns sigma_pt, unit of the data
 * @throws StatsError not-finite; no-spread for a level of 0; out-of-domain for a negative level, or where the function is
 *   not above 0
 *
 * Numerics: one formula. Source: ISO 13528:2022, 8.2 and 8.3; characteristic function: Thompson 2011, Anal. Methods 3, 2529.
 * Checked by: tests/stats/sigma-pt/sigma-function.test.ts.
 * @example sigmaFromFunction({ form: 'linear', a: 0.5, b: 0.1 }, 20) // => 2.5
 */
export function sigmaFromFunction(sigma: SigmaFunction, level: number): number {
  checkPositive('sigmaFromFunction', 'level', level);
  const value = representable('sigmaFromFunction', valueOf(sigma, level));
  if (!(value > 0)) {
    throw new StatsError(
      'out-of-domain',
      `sigmaFromFunction requires a function above 0 at the level ${level}, found ${value}`,
    );
  }
  return value;
}

export function valueOf({ form, a, b }: SigmaFunction, level: number): number {
  if (form === 'constant') return a;
  if (form === 'proportional') return b * level;
  if (form === 'linear') return a + b * level;
  return form === 'power' ? a * level ** b : Math.hypot(a, b * level);
}
