import { representable } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { fitPolynomial } from './fit-polynomial';

export interface PolynomialFit {
  readonly degree: number;
  /** Of x^0, x^1, ..., x^degree. */
  readonly coefficients: readonly number[];
  readonly standardErrors: readonly number[];
  readonly residualSd: number;
  readonly degreesOfFreedom: number;
  /** Null when all y are equal. */
  readonly rSquared: number | null;
}

const HIGHEST_DEGREE = 10;

/**
 * Polynomial least squares: is a straight line enough, or does the relation bend?
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; more different values than
 *   the degree.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: finite.
 * @param options.degree - 1 to 10. Default 2.
 * @returns { degree, coefficients, standardErrors, residualSd, degreesOfFreedom, rSquared }
 * @throws StatsError unequal-lengths; too-few-values unless n is at least degree + 2; not-finite; no-spread with too
 *   few different x; out-of-domain for a degree outside 1 to 10 or a result too large to represent
 *
 * Ties and equal values: allowed. Order of input: does not matter.
 * Numerics: normal equations in 32-figure arithmetic about the middle of x, O(n degree^2).
 * Source: Draper and Smith 1998, ch. 12.
 * Checked by: tests/reference/method-comparison (NIST StRD Wampler1, 2, 3, 4).
 * @example polynomialLeastSquares([0, 1, 2, 3], [1, 2, 5, 10]) // => coefficients [1, 0, 1]
 */
export function polynomialLeastSquares(
  x: readonly number[],
  y: readonly number[],
  options: { readonly degree?: number } = {},
): PolynomialFit {
  const caller = 'polynomialLeastSquares';
  const degree = options.degree ?? 2;
  if (!Number.isInteger(degree) || degree < 1 || degree > HIGHEST_DEGREE) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a degree from 1 to ${HIGHEST_DEGREE}, found ${degree}`,
    );
  }
  checkPairs(caller, x, y, degree + 2);
  const solved = fitPolynomial({ caller, x, y, weights: null, degree, intercept: true });
  const degreesOfFreedom = x.length - degree - 1;
  const residualSd = solved.residualSize / Math.sqrt(degreesOfFreedom);
  const standardErrors = solved.errorUnits.map((value) => residualSd * value);
  return {
    degree,
    coefficients: solved.coefficients.map((value) => representable(caller, value)),
    standardErrors: standardErrors.map((value) => representable(caller, value)),
    residualSd: representable(caller, residualSd),
    degreesOfFreedom,
    rSquared: solved.rSquared,
  };
}
