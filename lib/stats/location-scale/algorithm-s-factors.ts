import { chiSquareCdf, chiSquareUpperQuantile } from '../distributions/chi-square';
import { rangeMeanSquare, rangeQuantile } from '../internal/normal-range';
import { StatsError } from '../stats-error';

/** What is pooled: standard deviations with their degrees of freedom, or ranges of so many replicates. */
export type AlgorithmSKind = { readonly degreesOfFreedom: number } | { readonly rangeOf: number };

export interface AlgorithmSFactors {
  /** Limit factor: values above eta w* are pulled down to it; one in ten is, at the normal distribution. */
  readonly eta: number;
  /** Adjustment factor, which makes up for it. */
  readonly xi: number;
  /** Divides a pooled range to give a standard deviation; 1 for standard deviations. */
  readonly toSd: number;
}

/** The share of values that are pulled down when all is normal. */
const PULLED = 0.1;
const MOST_REPLICATES = 1000;

/**
 * Factors eta and xi of Algorithm S, computed for any degrees of freedom and for ranges.
 *
 * The tables print them for 1 to 10 degrees of freedom to three decimals.
 *
 * @param kind.degreesOfFreedom - of each standard deviation. Domain: finite; > 0.
 * @param kind.rangeOf - instead, the number of replicates of each range. Domain: whole; 2 to 1000.
 * @returns { eta, xi, toSd }, no unit
 * @throws StatsError out-of-domain when the number is not one of these
 *
 * Numerics: chi-square to 1e-13; for ranges of three and more quadrature to about 1e-11. A range of two is a standard
 *   deviation with 1 degree of freedom times sqrt(2).
 * Source: ISO 13528:2022, Annex C.4 (Table C.1), ISO 5725-5:1998: eta^2 is the upper 10 % point of chi-square over its
 *   degrees of freedom, xi = 1 / sqrt(P(chi2_{nu + 2} <= nu eta^2) + 0.1 eta^2). For ranges the same definition with the
 *   distribution of the range over its root mean square.
 * Checked by: tests/stats/location-scale/algorithm-s.test.ts, tests/reference/proficiency (algS-eta, algS-xi).
 * @example algorithmSFactors({ degreesOfFreedom: 3 }) // => eta 1.44354, xi 1.03927, toSd 1
 */
export function algorithmSFactors(kind: AlgorithmSKind): AlgorithmSFactors {
  if ('rangeOf' in kind) return rangeFactors(kind.rangeOf);
  const nu = kind.degreesOfFreedom;
  if (!(nu > 0 && Number.isFinite(nu))) {
    throw new StatsError(
      'out-of-domain',
      `algorithmSFactors requires degrees of freedom above 0, found ${nu}`,
    );
  }
  const limit = chiSquareUpperQuantile(PULLED, nu);
  const square = limit / nu;
  return {
    eta: Math.sqrt(square),
    xi: 1 / Math.sqrt(chiSquareCdf(limit, nu + 2) + PULLED * square),
    toSd: 1,
  };
}

function rangeFactors(n: number): AlgorithmSFactors {
  if (!(Number.isInteger(n) && n >= 2 && n <= MOST_REPLICATES)) {
    const rule = `ranges of 2 to ${MOST_REPLICATES} replicates`;
    throw new StatsError('out-of-domain', `algorithmSFactors requires ${rule}, found ${n}`);
  }
  if (n === 2) return { ...algorithmSFactors({ degreesOfFreedom: 1 }), toSd: Math.SQRT2 };
  const square = rangeMeanSquare(n);
  const limit = rangeQuantile(1 - PULLED, n);
  const toSd = Math.sqrt(square);
  return { eta: limit / toSd, xi: Math.sqrt(square / rangeMeanSquare(n, limit)), toSd };
}
