import { continuedFraction } from './continued-fraction';
import { HALF_LOG_TWO_PI, deviancePart, stirlingError } from './stirling';
import { NO_LOWER, NO_UPPER, type Tail } from './tail';

/** Shapes of a beta distribution with the part of its density that does not depend on x. */
export interface BetaShape {
  readonly a: number;
  readonly b: number;
  readonly sum: number;
  readonly logConstant: number;
}

export function betaShape(a: number, b: number): BetaShape {
  const sum = a + b;
  const errors = stirlingError(sum) - stirlingError(a) - stirlingError(b);
  // a b / (a + b), without overflow or loss when one is far larger than the other.
  const logConstant = errors + 0.5 * Math.log(a < b ? a * (b / sum) : b * (a / sum)) - HALF_LOG_TWO_PI;
  return { a, b, sum, logConstant };
}

/**
 * log of x^a y^b / B(a, b) with y = 1 - x: the density of log(x / y). Both x and y are given, so that neither loses
 * its digits near 0. Saddle-point form of Loader 2000: no large logarithms cancel.
 */
export function logBetaKernel({ a, b, sum, logConstant }: BetaShape, x: number, y: number): number {
  return logConstant - deviancePart(a, sum * x) - deviancePart(b, sum * y);
}

/**
 * Regularised incomplete beta function I_x(a, b), the tail on the near side of the mean, by the continued fraction of
 * DiDonato and Morris 1992 (Algorithm 708, ACM TOMS 18, 360-373): all its denominators are sums of positive terms there,
 * so that nothing cancels even for shapes of 1e15. Of the order of sqrt(min(a, b)) terms, a few dozen at most shapes.
 */
export function incompleteBeta(shape: BetaShape, x: number, y: number): Tail {
  if (x <= 0) return NO_LOWER;
  if (y <= 0) return NO_UPPER;
  const { a, b, sum } = shape;
  const kernel = logBetaKernel(shape, x, y);
  // The distance from the mean, from whichever of x and y is the small one.
  const below = a > b ? sum * y - b : a - sum * x;
  if (below >= 0) return { log: Math.min(0, kernel + logFraction([a, b], x, y, below)), side: 'lower' };
  return { log: Math.min(0, kernel + logFraction([b, a], y, x, -below)), side: 'upper' };
}

function logFraction([a, b]: [number, number], x: number, y: number, below: number): number {
  const numerator = (n: number) => {
    const middle = a + 2 * n - 1;
    return ((a + n - 1) / middle) * ((a + b + n - 1) / middle) * n * (b - n) * x * x;
  };
  const denominator = (n: number) =>
    n + (n * (b - n) * x) / (a + 2 * n - 1) + ((a + n) / (a + 2 * n + 1)) * (below + 1 + n * (1 + y));
  const first = (a / (a + 1)) * (below + 1);
  return Math.log(continuedFraction('incomplete beta function', first, numerator, denominator));
}
