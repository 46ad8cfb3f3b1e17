import { checkParameter, checkPlace, checkProbability } from './core/checks';
import { betaShape, incompleteBeta, logBetaKernel } from './core/incomplete-beta';
import { logOddsQuantile } from './core/log-scale';
import { logProbability, probability, type Tail } from './core/tail';
import { normalDensity, normalLogSurvival, normalQuantile, normalSurvival } from './normal';

/*
 * Student's t distribution with df degrees of freedom, any number above 0; Infinity gives the normal distribution.
 * Source: T^2 / (T^2 + df) is beta(1/2, df/2) (DLMF 8.17 with Abramowitz and Stegun 26.7.1). All are O(sqrt(df)) at
 * most, throw StatsError not-finite for NaN and out-of-domain for df <= 0 or a probability outside (0, 1), and are
 * checked by: tests/stats/distributions/r-grid.test.ts.
 */

/**
 * Density of Student's t at x.
 *
 * @example studentTDensity(0, 5) // => 0.3796066898224944
 */
export function studentTDensity(x: number, df: number): number {
  check('studentTDensity', x, df);
  if (df > AS_NORMAL) return normalDensity(x);
  if (Math.abs(x) === Infinity) return 0;
  const shape = betaShape(0.5, df / 2);
  const [share, rest] = shares(x, df);
  // The kernel is the density of log(t^2 / df); dt = t / 2 d(log t^2), and half of it lies on either side.
  if (x === 0)
    return (
      Math.exp(
        shape.logConstant + 0.5 * Math.log(shape.sum / 0.5) + (df / 2) * Math.log(shape.sum / (df / 2)),
      ) / Math.sqrt(df)
    );
  return Math.exp(logBetaKernel(shape, share, rest)) / Math.abs(x);
}

/**
 * Probability that a t value with df degrees of freedom is at most x.
 *
 * @example studentTCdf(2, 5) // => 0.9490302605850709
 */
export function studentTCdf(x: number, df: number): number {
  check('studentTCdf', x, df);
  return survival(-x, df);
}

/**
 * Probability that a t value with df degrees of freedom is above x; keeps its digits in the tail.
 *
 * @example studentTSurvival(10, 5) // => 8.547379e-5
 */
export function studentTSurvival(x: number, df: number): number {
  check('studentTSurvival', x, df);
  return survival(x, df);
}

/** Logarithm of studentTSurvival. */
export function studentTLogSurvival(x: number, df: number): number {
  check('studentTLogSurvival', x, df);
  if (df > AS_NORMAL) return normalLogSurvival(x);
  if (x <= 0) return Math.log(survival(x, df));
  return x === Infinity ? -Infinity : logProbability(squared(x, df), 'upper') - Math.LN2;
}

/**
 * The x below which a t value with df degrees of freedom lies with probability p, 0 < p < 1.
 *
 * @example studentTQuantile(0.975, 5) // => 2.570581835636314
 */
export function studentTQuantile(p: number, df: number): number {
  checkProbability('studentTQuantile', p);
  checkParameter('studentTQuantile', 'degrees of freedom', df, true);
  return p <= 0.5 ? -upperQuantile(p, df) + 0 : upperQuantile(1 - p, df);
}

/** The x above which a t value with df degrees of freedom lies with probability p, 0 < p < 1. */
export function studentTUpperQuantile(p: number, df: number): number {
  checkProbability('studentTUpperQuantile', p);
  checkParameter('studentTUpperQuantile', 'degrees of freedom', df, true);
  return p <= 0.5 ? upperQuantile(p, df) : -upperQuantile(1 - p, df);
}

/** Above, t differs from normal by less than 1e-15 of the probability wherever that is above 1e-60. */
const AS_NORMAL = 1e20;

function check(caller: string, x: number, df: number): void {
  checkPlace(caller, x);
  checkParameter(caller, 'degrees of freedom', df, true);
}

/** x^2 / (x^2 + df) and df / (x^2 + df), without overflow. */
function shares(x: number, df: number): [number, number] {
  const odds = (x / df) * x;
  if (odds < 1) return [odds / (1 + odds), 1 / (1 + odds)];
  const inverse = df / x / x;
  return [1 / (1 + inverse), inverse / (1 + inverse)];
}

function squared(x: number, df: number): Tail {
  return incompleteBeta(betaShape(0.5, df / 2), ...shares(x, df));
}

function survival(x: number, df: number): number {
  if (df > AS_NORMAL) return normalSurvival(x);
  if (x === 0) return 0.5;
  if (Math.abs(x) === Infinity) return x > 0 ? 0 : 1;
  const tail = squared(x, df);
  return x > 0 ? probability(tail, 'upper') / 2 : 0.5 + probability(tail, 'lower') / 2;
}

/** p <= 0.5. Near the middle t^2 is found from the part between -t and t, which 1 - 2 p gives exactly. */
function upperQuantile(p: number, df: number): number {
  if (p === 0.5) return 0;
  if (df > AS_NORMAL) return -normalQuantile(p);
  const shape = betaShape(0.5, df / 2);
  const caller = 'studentTQuantile';
  const logOdds =
    p <= 0.25
      ? logOddsQuantile(caller, shape, 2 * p, 'upper')
      : logOddsQuantile(caller, shape, 1 - 2 * p, 'lower');
  return Math.exp(logOdds / 2) * Math.sqrt(df);
}
