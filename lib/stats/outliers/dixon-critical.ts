import { StatsError } from '../stats-error';
import { checkAlpha, checkCount } from './check-alpha';
import { dixonTail, type DixonRatio } from './dixon-distribution';
import { solveMonotone } from './solve-monotone';

export type DixonRatioName = 'r10' | 'r11' | 'r21' | 'r22';

export interface DixonCriticalInput {
  readonly count: number;
  readonly alpha: number;
  readonly sides: 1 | 2;
  readonly ratio?: DixonRatioName;
}

export const DIXON_RATIOS: Readonly<Record<DixonRatioName, DixonRatio & { readonly minimum: number }>> = {
  r10: { near: 1, far: 1, minimum: 3 },
  r11: { near: 1, far: 2, minimum: 4 },
  r21: { near: 2, far: 2, minimum: 5 },
  r22: { near: 2, far: 3, minimum: 6 },
};

/** Dixon is for small samples; beyond, Grubbs and generalised ESD serve. */
export const DIXON_LARGEST = 100;

/** The ratio that Dixon 1953 advises for n values: r10 to 7, r11 to 10, r21 to 13, r22 above. */
export function dixonRatioFor(count: number): DixonRatioName {
  if (count <= 7) return 'r10';
  if (count <= 10) return 'r11';
  return count <= 13 ? 'r21' : 'r22';
}

/**
 * Critical value of Dixon's test, for n up to 100.
 *
 * @param input.count - n. Domain: whole; 3 to 100 (4, 5, 6 or more for r11, r21, r22).
 * @param input.alpha - significance level. Domain: between 0 and 1.
 * @param input.sides - 1 for one given end (Dixon's tables), 2 when either end could be the outlier (Rorabacher's).
 * @param input.ratio - r10 (the Q test), r11, r21 or r22. Default by n, as Dixon 1953 advises.
 * @returns the critical ratio, no unit
 * @throws StatsError too-few-values; out-of-domain above 100, for an alpha outside (0, 1) or n not whole
 *
 * Numerics: the null distribution by Gauss quadrature, good to about 1e-9; two sides as one side at alpha / 2, which is
 *   exact where both ends cannot be beyond (critical values above 0.5) and a bound elsewhere. Tens of milliseconds.
 * Source: Dixon 1951, Annals of Mathematical Statistics 22, 68; Rorabacher 1991, Analytical Chemistry 63, 139.
 * Checked by: tests/stats/outliers/critical-values.test.ts (tables from memory, seeded simulation).
 * @example dixonCritical({ count: 5, alpha: 0.05, sides: 2 }) // => 0.710
 */
export function dixonCritical({ count, alpha, sides, ratio }: DixonCriticalInput): number {
  const kind = DIXON_RATIOS[ratio ?? dixonRatioFor(count)];
  checkDixonCount('dixonCritical', count, kind.minimum);
  checkAlpha('dixonCritical', alpha);
  const tail = dixonTail(count, kind);
  return solveMonotone((c) => -tail(c), -alpha / sides, 0, 1);
}

/** Throws unless the number of values is one that the ratio is defined, and tabled, for. */
export function checkDixonCount(caller: string, count: number, minimum: number): void {
  checkCount(caller, 'values', count, minimum);
  if (count > DIXON_LARGEST) {
    throw new StatsError('out-of-domain', `${caller} is for at most ${DIXON_LARGEST} values, found ${count}`);
  }
}
