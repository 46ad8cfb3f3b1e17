import { StatsError } from '../stats-error';
import { bracketedRoot } from './core/bracketed-root';
import { checkParameter, checkPlace, checkProbability } from './core/checks';
import { gammaShape, logGammaKernel } from './core/incomplete-gamma';
import { normalCdf, normalQuantile, normalSurvival } from './normal';

/*
 * Noncentral t: (Z + ncp) / sqrt(chi-square(df) / df). For the power of a t test and for exact limits of a normal
 * quantile. Source: the probability is the mean of Phi(x w - ncp) over w = sqrt(chi-square / df); the trapezoidal rule
 * on log w converges geometrically there, and all terms are positive, so that either tail keeps its digits, which the
 * usual series (Lenth 1989, AS 243) does not. They throw StatsError not-finite for NaN and infinities, out-of-domain
 * for df <= 0 or a probability outside (0, 1), no-convergence when no quantile is found.
 * Checked by: tests/stats/distributions/noncentral-t.test.ts.
 */

/**
 * Probability that a noncentral t value is at most x.
 *
 * @example noncentralTCdf(2, 5, 1) // => 0.7780747
 */
export function noncentralTCdf(x: number, df: number, ncp: number): number {
  check('noncentralTCdf', x, df, ncp);
  return Math.min(
    1,
    meanOverChi(df, ncp, (w) => normalCdf(x * w - ncp)),
  );
}

/** Probability that a noncentral t value is above x; keeps its digits in the tail. */
export function noncentralTSurvival(x: number, df: number, ncp: number): number {
  check('noncentralTSurvival', x, df, ncp);
  return Math.min(
    1,
    meanOverChi(df, ncp, (w) => normalSurvival(x * w - ncp)),
  );
}

/**
 * The x below which a noncentral t value lies with probability p, 0 < p < 1.
 *
 * @example noncentralTQuantile(0.5, 10, 2) // => 2.0536912
 */
export function noncentralTQuantile(p: number, df: number, ncp: number): number {
  const caller = 'noncentralTQuantile';
  checkProbability(caller, p);
  check(caller, 0, df, ncp);
  const wanted = normalQuantile(p);
  const off = (x: number) => normalScore(x, df, ncp) - wanted;
  const middle = ncp + wanted * Math.sqrt(1 + (ncp * ncp) / (2 * df));
  let step = 1 + Math.abs(middle) / 4;
  let [low, high] = [middle - step, middle + step];
  while (off(low) > 0) {
    if (!Number.isFinite(low)) throw noBracket();
    low -= step *= 2;
  }
  while (off(high) < 0) {
    if (!Number.isFinite(high)) throw noBracket();
    high += step *= 2;
  }
  return bracketedRoot(caller, off, low, high);
}

function check(caller: string, x: number, df: number, ncp: number): void {
  checkPlace(caller, x);
  checkParameter(caller, 'degrees of freedom', df);
  if (!Number.isFinite(ncp) || !Number.isFinite(x)) {
    throw new StatsError(
      'not-finite',
      `${caller} requires a finite value and noncentrality, found ${x}, ${ncp}`,
    );
  }
}

const noBracket = () =>
  new StatsError('no-convergence', 'noncentralTQuantile found no bracket within the number range');

/** The cdf on the scale of a normal quantile, on which it is nearly a straight line; from the smaller tail. */
function normalScore(x: number, df: number, ncp: number): number {
  const lower = noncentralTCdf(x, df, ncp);
  if (lower <= 0.5) return lower > 0 ? normalQuantile(lower) : -40;
  const upper = noncentralTSurvival(x, df, ncp);
  return upper > 0 ? -normalQuantile(upper) : 40;
}

const NEGLIGIBLE = 1e-19;
const MOST_POINTS = 10_000_000;

/** Mean of g(w) over w = sqrt(chi-square(df) / df), 0 <= g <= 1. */
function meanOverChi(df: number, ncp: number, g: (w: number) => number): number {
  const shape = gammaShape(df / 2);
  // Fine enough for the bell of log w, of sd 1 / sqrt(2 df), and for the rise of Phi, of width 1 / ncp.
  const step = Math.min(0.125, 0.4 / Math.sqrt(2 * df), 0.4 / Math.max(1, Math.abs(ncp)));
  const density = (u: number) => Math.exp(logGammaKernel(shape, (df / 2) * Math.exp(2 * u)));
  let sum = density(0) * g(1);
  let [left, right] = [true, true];
  for (let i = 1; (left || right) && i < MOST_POINTS; i += 1) {
    for (const u of [i * step, -i * step]) {
      if (!(u > 0 ? right : left)) continue;
      const height = density(u);
      sum += height * g(Math.exp(u));
      // Outwards the density only falls, and g is at most 1.
      const done = height < NEGLIGIBLE * sum || height === 0;
      if (u > 0) right = !done;
      else left = !done;
    }
  }
  return 2 * step * sum;
}
