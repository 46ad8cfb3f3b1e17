import { chiSquareQuantile, chiSquareUpperQuantile } from '../distributions';
import { checkFinite, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ROUND_CLAUSES } from './clauses';

export interface ScorePair {
  readonly z: number;
  readonly zeta: number;
}

/** What one round says: of the result by z, of the stated uncertainty by zeta. */
export type ScorePairClass =
  /** Neither beyond 2. */
  | 'fit-and-covered'
  /** z fine, zeta beyond 2: the stated uncertainty is too small for this result. */
  | 'uncertainty-small'
  /** z beyond 2, zeta fine: the uncertainty covers the error, but is larger than the purpose allows. */
  | 'uncertainty-large'
  /** Both beyond 2. */
  | 'error-not-covered';

export interface ZetaAgainstZResult {
  readonly rounds: number;
  readonly classes: readonly ScorePairClass[];
  readonly counts: Readonly<Record<ScorePairClass, number>>;
  /** Root mean square of zeta: 1 when stated uncertainties are realistic. */
  readonly factor: number;
  /** 95 percent interval of it: the factor by which the combined uncertainty would have to be multiplied. */
  readonly factorLower: number;
  readonly factorUpper: number;
  readonly verdict: 'realistic' | 'understated' | 'overstated' | 'too-few-rounds';
  readonly working: readonly WorkingStep[] | null;
}

/** With fewer rounds the interval is wider than a factor of four and says nothing useful. */
const FEWEST = 4;

/**
 * Is the stated uncertainty realistic: zeta against z over rounds.
 *
 * If it is, zeta behaves like a standard normal value, so its mean square is 1. Above, the laboratory states too small
 * uncertainties; below, too large ones. A bias counts as uncertainty not stated. The combined uncertainty includes that
 * of the assigned value, so a large u(x_pt) hides what the laboratory states.
 *
 * @param scores - z and zeta of each round. Shape: n pairs. Unit: none. Domain: finite; at least 1.
 * @param options.working - keep the steps. Default false.
 * @returns classes of the rounds, counts, factor with interval, verdict
 * @throws StatsError too-few-values; not-finite; out-of-domain for scores too large
 *
 * Ties and equal values: allowed; |score| of 2 is not beyond. Zeta 0 throughout: factor 0, overstated. Order of input:
 *   kept. Below 4 rounds: verdict 'too-few-rounds'. Numerics: O(n).
 * Source: sum of squares of zeta against chi-square with n degrees of freedom; reading of z with zeta: ISO 13528:2022,
 *   9.6; Eurachem guide on selection and use of proficiency testing.
 * Checked by: tests/stats/over-rounds/over-rounds.test.ts.
 * @example zetaAgainstZ([{ z: 0.5, zeta: 3 }, { z: -0.8, zeta: -4 }, { z: 1, zeta: 5 }, { z: 0.2, zeta: 1 }]).verdict
 *   // => 'understated'
 */
export function zetaAgainstZ(
  scores: readonly ScorePair[],
  options: { readonly working?: boolean } = {},
): ZetaAgainstZResult {
  if (scores.length === 0) {
    throw new StatsError('too-few-values', 'zetaAgainstZ requires at least 1 round, found 0');
  }
  for (const { z, zeta } of scores) {
    checkFinite('zetaAgainstZ', 'z', z);
    checkFinite('zetaAgainstZ', 'zeta', zeta);
  }
  const classes = scores.map(classOf);
  const counts = {
    'fit-and-covered': 0,
    'uncertainty-small': 0,
    'uncertainty-large': 0,
    'error-not-covered': 0,
  };
  for (const name of classes) counts[name] += 1;
  const n = scores.length;
  const largest = scores.reduce((most, { zeta }) => Math.max(most, Math.abs(zeta)), Number.MIN_VALUE);
  const squares = scores.reduce((sum, { zeta }) => sum + (zeta / largest) ** 2, 0);
  const factor = representable('zetaAgainstZ', largest * Math.sqrt(squares / n));
  const [low, high] = [chiSquareQuantile(0.025, n), chiSquareUpperQuantile(0.025, n)];
  const factorLower = factor * Math.sqrt(n / high);
  const factorUpper = representable('zetaAgainstZ', factor * Math.sqrt(n / low));
  const verdict =
    n < FEWEST
      ? 'too-few-rounds'
      : factorLower > 1
        ? 'understated'
        : factorUpper < 1
          ? 'overstated'
          : 'realistic';
  const clause = ROUND_CLAUSES.uncertainty;
  const working: WorkingStep[] | null = options.working
    ? [
        {
          name: 'Root mean square of zeta',
          formula: 'factor = sqrt(sum(zeta^2) / n)',
          clause,
          inputs: { zeta: scores.map(({ zeta }) => zeta), n },
          value: factor,
        },
        {
          name: 'Lower limit',
          formula: 'lower = factor * sqrt(n / chi2)',
          clause,
          inputs: { factor, n, chi2: high },
          value: factorLower,
        },
        {
          name: 'Upper limit',
          formula: 'upper = factor * sqrt(n / chi2)',
          clause,
          inputs: { factor, n, chi2: low },
          value: factorUpper,
        },
      ]
    : null;
  return { rounds: n, classes, counts, factor, factorLower, factorUpper, verdict, working };
}

function classOf({ z, zeta }: ScorePair): ScorePairClass {
  const [wide, uncovered] = [Math.abs(z) > 2, Math.abs(zeta) > 2];
  if (wide) return uncovered ? 'error-not-covered' : 'uncertainty-large';
  return uncovered ? 'uncertainty-small' : 'fit-and-covered';
}
