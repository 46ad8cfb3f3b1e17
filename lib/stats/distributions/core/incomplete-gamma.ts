import { StatsError } from '../../stats-error';
import { continuedFraction } from './continued-fraction';
import { HALF_LOG_TWO_PI, deviancePart, stirlingError } from './stirling';
import { NO_LOWER, type Tail } from './tail';

/** Shape of a gamma distribution with the part of its density that does not depend on x. */
export interface GammaShape {
  readonly a: number;
  readonly logConstant: number;
}

export function gammaShape(a: number): GammaShape {
  return { a, logConstant: 0.5 * Math.log(a) - HALF_LOG_TWO_PI - stirlingError(a) };
}

/** log of x^a e^-x / Gamma(a): the density of log x, in the saddle-point form of Loader 2000. */
export function logGammaKernel({ a, logConstant }: GammaShape, x: number): number {
  return logConstant - deviancePart(a, x);
}

/** Regularised incomplete gamma function: P(a, x) by its series up to a + 1, Q(a, x) by DLMF 8.9.2 above. */
export function incompleteGamma(shape: GammaShape, x: number): Tail {
  if (x <= 0) return NO_LOWER;
  if (x === Infinity) return { log: -Infinity, side: 'upper' };
  const { a } = shape;
  const kernel = logGammaKernel(shape, x);
  if (x <= a + 1) return { log: Math.min(0, kernel + Math.log(series(a, x) / a)), side: 'lower' };
  const numerator = (i: number) => i * (a - i);
  const denominator = (i: number) => x - a + (2 * i + 1);
  const fraction = continuedFraction('incomplete gamma function', x - a + 1, numerator, denominator);
  return { log: Math.min(0, kernel + Math.log(fraction)), side: 'upper' };
}

const MOST_TERMS = 1_000_000;

/** 1 + x / (a + 1) + x^2 / ((a + 1) (a + 2)) + ... (DLMF 8.7.1). */
function series(a: number, x: number): number {
  let term = 1;
  let sum = 1;
  for (let i = 1; i <= MOST_TERMS; i += 1) {
    term *= x / (a + i);
    const next = sum + term;
    if (next === sum) return sum;
    sum = next;
  }
  throw new StatsError(
    'no-convergence',
    `incomplete gamma function did not settle within ${MOST_TERMS} terms`,
  );
}
