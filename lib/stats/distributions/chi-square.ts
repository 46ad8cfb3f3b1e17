import { checkParameter, checkPlace, checkProbability } from './core/checks';
import { gammaShape, incompleteGamma, logGammaKernel } from './core/incomplete-gamma';
import { logGammaQuantile } from './core/log-scale';
import { logProbability, probability, type Side, type Tail } from './core/tail';

/*
 * The chi-square distribution with df degrees of freedom, any number above 0: twice a gamma(df/2).
 * Source: regularised incomplete gamma function, DLMF 8.7.1 and 8.9.2. O(sqrt(df)). They throw StatsError
 * not-finite for NaN, out-of-domain for df <= 0 or a probability outside (0, 1).
 * Checked by: tests/stats/distributions/r-grid.test.ts.
 */

/**
 * Density of chi-square at x.
 *
 * @example chiSquareDensity(3, 4) // => 0.16734762
 */
export function chiSquareDensity(x: number, df: number): number {
  check('chiSquareDensity', x, df);
  if (x < 0 || x === Infinity) return 0;
  // At 0 the density is 0, 1/2 or unbounded; unbounded is given as the largest number.
  if (x === 0) return df > 2 ? 0 : df === 2 ? 0.5 : Number.MAX_VALUE;
  return Math.exp(logGammaKernel(gammaShape(df / 2), x / 2)) / x;
}

/**
 * Probability that a chi-square value with df degrees of freedom is at most x.
 *
 * @example chiSquareCdf(3.841458820694124, 1) // => 0.95
 */
export function chiSquareCdf(x: number, df: number): number {
  check('chiSquareCdf', x, df);
  return probability(tailAt(x, df), 'lower');
}

/** Probability that a chi-square value with df degrees of freedom is above x; keeps its digits in the tail. */
export function chiSquareSurvival(x: number, df: number): number {
  check('chiSquareSurvival', x, df);
  return probability(tailAt(x, df), 'upper');
}

/** Logarithm of chiSquareSurvival. */
export function chiSquareLogSurvival(x: number, df: number): number {
  check('chiSquareLogSurvival', x, df);
  return logProbability(tailAt(x, df), 'upper');
}

/**
 * The x below which a chi-square value with df degrees of freedom lies with probability p, 0 < p < 1.
 *
 * @example chiSquareQuantile(0.95, 1) // => 3.841458820694124
 */
export function chiSquareQuantile(p: number, df: number): number {
  return quantile('chiSquareQuantile', p, df, 'lower');
}

/** The x above which a chi-square value with df degrees of freedom lies with probability p, 0 < p < 1. */
export function chiSquareUpperQuantile(p: number, df: number): number {
  return quantile('chiSquareUpperQuantile', p, df, 'upper');
}

function check(caller: string, x: number, df: number): void {
  checkPlace(caller, x);
  checkParameter(caller, 'degrees of freedom', df);
}

function tailAt(x: number, df: number): Tail {
  return incompleteGamma(gammaShape(df / 2), x / 2);
}

function quantile(caller: string, p: number, df: number, side: Side): number {
  checkProbability(caller, p);
  checkParameter(caller, 'degrees of freedom', df);
  return 2 * Math.exp(logGammaQuantile(caller, gammaShape(df / 2), p, side));
}
