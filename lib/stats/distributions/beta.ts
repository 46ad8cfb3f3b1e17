import { checkParameter, checkPlace, checkProbability } from './core/checks';
import { betaShape, incompleteBeta, logBetaKernel } from './core/incomplete-beta';
import { logOddsQuantile } from './core/log-scale';
import { NO_LOWER, NO_UPPER, logProbability, probability, type Side, type Tail } from './core/tail';

/*
 * The beta distribution on 0 to 1 with shapes a and b, any numbers above 0. Source: regularised incomplete beta
 * function, DLMF 8.17.22. Of the order of sqrt(max(a, b)). They throw StatsError not-finite for NaN, out-of-domain
 * for a shape <= 0 or a probability outside (0, 1). Checked by: tests/stats/distributions/r-grid.test.ts.
 */

/**
 * Density of beta(a, b) at x.
 *
 * @example betaDensity(0.5, 2, 2) // => 1.5
 */
export function betaDensity(x: number, a: number, b: number): number {
  check('betaDensity', x, a, b);
  if (x < 0 || x > 1) return 0;
  if (x === 0) return atEnd(a, b);
  if (x === 1) return atEnd(b, a);
  return Math.exp(logBetaKernel(betaShape(a, b), x, 1 - x)) / x / (1 - x);
}

/**
 * Probability that a beta(a, b) value is at most x.
 *
 * @example betaCdf(0.25, 1, 1) // => 0.25
 */
export function betaCdf(x: number, a: number, b: number): number {
  check('betaCdf', x, a, b);
  return probability(tailAt(x, a, b), 'lower');
}

/** Probability that a beta(a, b) value is above x; keeps its digits in the tail. */
export function betaSurvival(x: number, a: number, b: number): number {
  check('betaSurvival', x, a, b);
  return probability(tailAt(x, a, b), 'upper');
}

/** Logarithm of betaSurvival. */
export function betaLogSurvival(x: number, a: number, b: number): number {
  check('betaLogSurvival', x, a, b);
  return logProbability(tailAt(x, a, b), 'upper');
}

/**
 * The x below which a beta(a, b) value lies with probability p, 0 < p < 1.
 *
 * @example betaQuantile(0.95, 1, 1) // => 0.95
 */
export function betaQuantile(p: number, a: number, b: number): number {
  return quantile('betaQuantile', p, [a, b], 'lower');
}

/** The x above which a beta(a, b) value lies with probability p, 0 < p < 1. */
export function betaUpperQuantile(p: number, a: number, b: number): number {
  return quantile('betaUpperQuantile', p, [a, b], 'upper');
}

function check(caller: string, x: number, a: number, b: number): void {
  checkPlace(caller, x);
  checkParameter(caller, 'shape a', a);
  checkParameter(caller, 'shape b', b);
}

/** Density at the end that belongs to the first shape; unbounded is given as the largest number. */
function atEnd(near: number, far: number): number {
  if (near === 1) return far;
  return near > 1 ? 0 : Number.MAX_VALUE;
}

function tailAt(x: number, a: number, b: number): Tail {
  if (x <= 0) return NO_LOWER;
  if (x >= 1) return NO_UPPER;
  return incompleteBeta(betaShape(a, b), x, 1 - x);
}

function quantile(caller: string, p: number, [a, b]: [number, number], side: Side): number {
  checkProbability(caller, p);
  check(caller, 0, a, b);
  const logOdds = logOddsQuantile(caller, betaShape(a, b), p, side);
  return logOdds < 0 ? Math.exp(logOdds - Math.log1p(Math.exp(logOdds))) : 1 / (1 + Math.exp(-logOdds));
}
