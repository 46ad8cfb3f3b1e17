import { checkPlace, checkProbability } from './core/checks';
import { NORMAL_TAIL_FROM, logNormalTail, normalCentral } from './core/error-function';
import { rationalNormalQuantile } from './core/normal-quantile';
import { HALF_LOG_TWO_PI } from './core/stirling';

/*
 * The standard normal distribution. Sources: series and continued fraction of DLMF 7.6.2 and 7.9.2; quantile by
 * Wichura 1988, Algorithm AS 241, Applied Statistics 37, 477-484. Each function costs a few dozen operations, takes
 * the infinities where the value there is finite, and throws StatsError not-finite for NaN, out-of-domain for a
 * probability outside (0, 1). Checked by: tests/stats/distributions/r-grid.test.ts (R, p down to 1e-300).
 */

/**
 * Standard normal density at x.
 *
 * @example normalDensity(0) // => 0.3989422804014327
 */
export function normalDensity(x: number): number {
  checkPlace('normalDensity', x);
  return Math.exp(-(x * x) / 2 - HALF_LOG_TWO_PI);
}

/**
 * Probability that a standard normal value is at most x.
 *
 * @example normalCdf(1.959963984540054) // => 0.975
 */
export function normalCdf(x: number): number {
  checkPlace('normalCdf', x);
  return upperTail(-x);
}

/**
 * Probability that a standard normal value is above x; keeps its digits where normalCdf is nearly 1.
 *
 * @example normalSurvival(10) // => 7.61985302416e-24
 */
export function normalSurvival(x: number): number {
  checkPlace('normalSurvival', x);
  return upperTail(x);
}

/**
 * Logarithm of normalCdf, for tails that underflow.
 *
 * @example normalLogCdf(-40) // => -804.608442
 */
export function normalLogCdf(x: number): number {
  checkPlace('normalLogCdf', x);
  return logUpperTail(-x);
}

/** Logarithm of normalSurvival. */
export function normalLogSurvival(x: number): number {
  checkPlace('normalLogSurvival', x);
  return logUpperTail(x);
}

/**
 * The x below which a standard normal value lies with probability p, 0 < p < 1.
 *
 * @example normalQuantile(0.975) // => 1.959963984540054
 */
export function normalQuantile(p: number): number {
  checkProbability('normalQuantile', p);
  return rationalNormalQuantile(p);
}

/** The x above which a standard normal value lies with probability p, 0 < p < 1. */
export function normalUpperQuantile(p: number): number {
  checkProbability('normalUpperQuantile', p);
  return -rationalNormalQuantile(p) + 0;
}

function upperTail(x: number): number {
  if (x > NORMAL_TAIL_FROM) return x === Infinity ? 0 : Math.exp(logNormalTail(x));
  if (x < -NORMAL_TAIL_FROM) return x === -Infinity ? 1 : 1 - Math.exp(logNormalTail(-x));
  return 0.5 - normalCentral(x);
}

function logUpperTail(x: number): number {
  if (x > NORMAL_TAIL_FROM) return x === Infinity ? -Infinity : logNormalTail(x);
  if (x < -NORMAL_TAIL_FROM) return x === -Infinity ? 0 : Math.log1p(-Math.exp(logNormalTail(-x)));
  return Math.log(0.5 - normalCentral(x));
}
