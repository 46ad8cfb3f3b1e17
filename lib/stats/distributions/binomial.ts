import { StatsError } from '../stats-error';
import { betaShape, incompleteBeta } from './core/incomplete-beta';
import { checkPlace } from './core/checks';
import { HALF_LOG_TWO_PI, deviancePart, stirlingError } from './core/stirling';
import { probability, type Side } from './core/tail';

/*
 * The binomial distribution: number of successes in `trials` independent trials with the same probability of
 * success. Sources: mass by Loader 2000; sums by the incomplete beta function, DLMF 8.17.5. Of the order of
 * sqrt(trials). They throw StatsError not-finite for NaN, out-of-domain for trials that are not a whole number >= 0 or
 * a probability outside 0 to 1. Checked by: tests/stats/distributions/r-grid.test.ts.
 */

/**
 * Probability of exactly k successes; 0 where k is not a whole number from 0 to trials.
 *
 * @example binomialMass(2, 4, 0.5) // => 0.375
 */
export function binomialMass(k: number, trials: number, success: number): number {
  check('binomialMass', k, trials, success);
  if (!Number.isInteger(k) || k < 0 || k > trials) return 0;
  if (success === 0 || success === 1) return k === success * trials ? 1 : 0;
  if (k === 0) return Math.exp(trials * Math.log1p(-success));
  if (k === trials) return Math.exp(trials * Math.log(success));
  const rest = trials - k;
  const errors = stirlingError(trials) - stirlingError(k) - stirlingError(rest);
  const deviance = deviancePart(k, trials * success) + deviancePart(rest, trials * (1 - success));
  return Math.exp(errors - deviance - 0.5 * Math.log(k * (rest / trials)) - HALF_LOG_TWO_PI);
}

/**
 * Probability of at most k successes.
 *
 * @example binomialCdf(1, 4, 0.5) // => 0.3125
 */
export function binomialCdf(k: number, trials: number, success: number): number {
  check('binomialCdf', k, trials, success);
  return sumAt(k, trials, success, 'lower');
}

/**
 * Probability of more than k successes; keeps its digits where binomialCdf is nearly 1.
 *
 * @example binomialSurvival(1, 4, 0.5) // => 0.6875
 */
export function binomialSurvival(k: number, trials: number, success: number): number {
  check('binomialSurvival', k, trials, success);
  return sumAt(k, trials, success, 'upper');
}

/** A sum that misses p by rounding alone counts as p. */
const ROUNDING = 64 * Number.EPSILON;

/**
 * The smallest number of successes k for which binomialCdf(k) is at least p, 0 <= p <= 1. O(log(trials)) sums.
 *
 * @example binomialQuantile(0.5, 4, 0.5) // => 2
 */
export function binomialQuantile(p: number, trials: number, success: number): number {
  check('binomialQuantile', 0, trials, success);
  if (!(p >= 0 && p <= 1)) {
    throw new StatsError('out-of-domain', `binomialQuantile requires a probability from 0 to 1, found ${p}`);
  }
  const reached = (k: number) =>
    p <= 0.5
      ? sumAt(k, trials, success, 'lower') >= p * (1 - ROUNDING)
      : sumAt(k, trials, success, 'upper') <= (1 - p) * (1 + ROUNDING);
  let low = 0;
  let high = trials;
  while (low < high) {
    const middle = Math.floor((low + high) / 2);
    if (reached(middle)) high = middle;
    else low = middle + 1;
  }
  return low;
}

function check(caller: string, k: number, trials: number, success: number): void {
  checkPlace(caller, k);
  if (!(Number.isInteger(trials) && trials >= 0)) {
    throw new StatsError('out-of-domain', `${caller} requires a whole number of trials, found ${trials}`);
  }
  if (!(success >= 0 && success <= 1)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a probability of success from 0 to 1, found ${success}`,
    );
  }
}

function sumAt(k: number, trials: number, success: number, side: Side): number {
  const whole = Math.floor(k);
  if (whole < 0 || whole >= trials || success === 0 || success === 1) {
    const below = whole >= trials || (whole >= 0 && success === 0) ? 1 : 0;
    return side === 'lower' ? below : 1 - below;
  }
  return probability(incompleteBeta(betaShape(trials - whole, whole + 1), 1 - success, success), side);
}
