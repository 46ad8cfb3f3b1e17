import { checkParameter, checkPlace, checkProbability } from './core/checks';
import { betaShape, incompleteBeta, logBetaKernel } from './core/incomplete-beta';
import { logOddsQuantile } from './core/log-scale';
import { NO_LOWER, NO_UPPER, logProbability, probability, type Side, type Tail } from './core/tail';

/*
 * The F distribution with df1 (numerator) and df2 (denominator) degrees of freedom, any numbers above 0; in this
 * order, as every table has them. Source: df1 F / (df1 F + df2) is beta(df1/2, df2/2), DLMF 8.17. Of the order of
 * sqrt(max(df1, df2)). They throw StatsError not-finite for NaN, out-of-domain for degrees of freedom <= 0 or a
 * probability outside (0, 1). Checked by: tests/stats/distributions/r-grid.test.ts.
 */

/**
 * Density of F at x.
 *
 * @example fDensity(1, 4, 10) // => 0.4553496
 */
export function fDensity(x: number, df1: number, df2: number): number {
  check('fDensity', x, df1, df2);
  if (x < 0 || x === Infinity) return 0;
  if (x === 0) return df1 > 2 ? 0 : df1 === 2 ? 1 : Number.MAX_VALUE;
  return Math.exp(logBetaKernel(betaShape(df1 / 2, df2 / 2), ...shares(x, df1, df2))) / x;
}

/**
 * Probability that an F value with (df1, df2) degrees of freedom is at most x.
 *
 * @example fCdf(3.478049690765229, 4, 10) // => 0.95
 */
export function fCdf(x: number, df1: number, df2: number): number {
  check('fCdf', x, df1, df2);
  return probability(tailAt(x, df1, df2), 'lower');
}

/** Probability that an F value with (df1, df2) degrees of freedom is above x; keeps its digits in the tail. */
export function fSurvival(x: number, df1: number, df2: number): number {
  check('fSurvival', x, df1, df2);
  return probability(tailAt(x, df1, df2), 'upper');
}

/** Logarithm of fSurvival. */
export function fLogSurvival(x: number, df1: number, df2: number): number {
  check('fLogSurvival', x, df1, df2);
  return logProbability(tailAt(x, df1, df2), 'upper');
}

/**
 * The x below which an F value with (df1, df2) degrees of freedom lies with probability p, 0 < p < 1.
 *
 * @example fQuantile(0.95, 4, 10) // => 3.478049690765229
 */
export function fQuantile(p: number, df1: number, df2: number): number {
  return quantile('fQuantile', p, [df1, df2], 'lower');
}

/** The x above which an F value with (df1, df2) degrees of freedom lies with probability p, 0 < p < 1. */
export function fUpperQuantile(p: number, df1: number, df2: number): number {
  return quantile('fUpperQuantile', p, [df1, df2], 'upper');
}

function check(caller: string, x: number, df1: number, df2: number): void {
  checkPlace(caller, x);
  checkParameter(caller, 'degrees of freedom of the numerator', df1);
  checkParameter(caller, 'degrees of freedom of the denominator', df2);
}

/** df1 x / (df1 x + df2) and what it leaves of 1, each with all its digits. */
function shares(x: number, df1: number, df2: number): [number, number] {
  const odds = (df1 / df2) * x;
  if (odds < 1) return [odds / (1 + odds), 1 / (1 + odds)];
  return [1 / (1 + 1 / odds), 1 / (1 + odds)];
}

function tailAt(x: number, df1: number, df2: number): Tail {
  if (x <= 0) return NO_LOWER;
  if (x === Infinity) return NO_UPPER;
  return incompleteBeta(betaShape(df1 / 2, df2 / 2), ...shares(x, df1, df2));
}

function quantile(caller: string, p: number, [df1, df2]: [number, number], side: Side): number {
  checkProbability(caller, p);
  check(caller, 0, df1, df2);
  return Math.exp(logOddsQuantile(caller, betaShape(df1 / 2, df2 / 2), p, side)) * (df2 / df1);
}
