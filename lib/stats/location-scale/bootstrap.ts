import { normalCdf, normalQuantile } from '../distributions/normal';
import { checkFinite, checkValues } from '../internal/check-values';
import { checkResamples, resample, uniformFrom, type RandomSource } from '../internal/random';
import { lowerBound, quantileOfSorted, upperBound } from '../internal/sorted';
import { sampleSd } from '../internal/sums';
import { StatsError } from '../stats-error';

export type { RandomSource };

export interface BootstrapOptions {
  readonly estimator: (values: readonly number[]) => number;
  readonly random: RandomSource;
  readonly resamples?: number;
  readonly level?: number;
  readonly interval?: 'bca' | 'percentile';
}

export interface BootstrapResult {
  readonly estimate: number;
  /** Standard deviation of the resampled estimates. */
  readonly standardError: number;
  readonly lower: number;
  readonly upper: number;
  readonly level: number;
  readonly interval: 'bca' | 'percentile';
  readonly resamples: number;
  /** BCa: z0, how far the median of the resampled estimates is off; null for percentile. */
  readonly biasCorrection: number | null;
  /** BCa: a, how the standard error changes with the value; null for percentile. */
  readonly acceleration: number | null;
}

const DEFAULT_RESAMPLES = 2000;
const FEWEST_RESAMPLES = 50;

/**
 * Bootstrap: standard error and confidence interval of any estimator, by drawing from the results with replacement.
 *
 * For estimators without a formula, such as the mode. With fewer than about 20 results intervals come out too narrow.
 * 'bca' corrects for bias and skewness; 'percentile' takes the quantiles as they are.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.estimator - takes n values and gives a finite number; must not keep or change its argument.
 * @param options.random - seeded source: () => number in [0, 1), or a generator as of pure-rand. It is altered.
 * @param options.resamples - Default 2000, common practice for intervals. Domain: whole; at least 50.
 * @param options.level - Default 0.95. Domain: between 0 and 1.
 * @param options.interval - Default 'bca'.
 * @returns { estimate, standardError, lower, upper, level, interval, resamples, biasCorrection, acceleration }
 * @throws StatsError too-few-values; not-finite when the estimator gives no finite number; out-of-domain for an option;
 *   no-spread when BCa is not defined because all resampled estimates lie on one side of the estimate; and whatever the
 *   estimator throws
 *
 * Ties and equal values: allowed; when all resampled estimates are equal both limits are that value. Order of input:
 *   changes the draws, so the last digits.
 * Numerics: quantiles of type 7. O((resamples + n) cost of the estimator); the n are the jackknife of BCa.
 * Source: Efron 1987, JASA 82, 171-185; Efron and Tibshirani 1993, An Introduction to the Bootstrap, 14.
 * Checked by: tests/stats/location-scale/bootstrap.test.ts.
 * @example bootstrap([1, 2, 4], { estimator: median, random: generator }).estimate // => 2
 */
export function bootstrap(values: readonly number[], options: BootstrapOptions): BootstrapResult {
  const { estimator, resamples = DEFAULT_RESAMPLES, level = 0.95, interval = 'bca' } = options;
  checkValues('bootstrap', values, 2);
  checkResamples('bootstrap', resamples, FEWEST_RESAMPLES);
  if (!(level > 0 && level < 1)) {
    throw new StatsError('out-of-domain', `bootstrap requires a level between 0 and 1, found ${level}`);
  }
  const estimate = finite(estimator(values));
  const drawn = resampledEstimates(values, options, resamples);
  const shared = { estimate, standardError: sampleSd(drawn), level, interval, resamples };
  const tail = (1 - level) / 2;
  const limits = (low: number, high: number) => ({
    lower: quantileOfSorted(drawn, low, 7),
    upper: quantileOfSorted(drawn, high, 7),
  });
  if (interval === 'percentile' || drawn[0] === drawn[drawn.length - 1]) {
    return { ...shared, ...limits(tail, 1 - tail), biasCorrection: null, acceleration: null };
  }
  const biasCorrection = biasOf(drawn, estimate);
  const acceleration = accelerationOf(values, estimator);
  const moved = (z: number) => normalCdf(biasCorrection + z / (1 - acceleration * z));
  const z = normalQuantile(tail);
  const ends = limits(moved(biasCorrection + z), moved(biasCorrection - z));
  return { ...shared, ...ends, biasCorrection, acceleration };
}

function finite(estimate: number): number {
  checkFinite('bootstrap', 'estimate', estimate);
  return estimate;
}

function resampledEstimates(
  values: readonly number[],
  { estimator, random }: BootstrapOptions,
  resamples: number,
): Float64Array {
  const uniform = uniformFrom(random);
  const draw: number[] = [...values];
  const estimates = new Float64Array(resamples);
  for (let i = 0; i < resamples; i += 1) {
    resample(values, uniform, draw);
    estimates[i] = finite(estimator(draw));
  }
  return estimates.sort();
}

function biasOf(drawn: Float64Array, estimate: number): number {
  const share = (lowerBound(drawn, estimate) + upperBound(drawn, estimate)) / 2 / drawn.length;
  if (share === 0 || share === 1) {
    throw new StatsError(
      'no-spread',
      'bootstrap cannot correct for bias: all resampled estimates lie on one side of the estimate',
    );
  }
  return normalQuantile(share);
}

/** Skewness of the jackknife over 6 (Efron 1987, 6.6). */
function accelerationOf(values: readonly number[], estimator: BootstrapOptions['estimator']): number {
  const n = values.length;
  const left = values.slice(1);
  const estimates = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    estimates[i] = finite(estimator(left));
    left[i] = values[i] as number;
  }
  const mean = estimates.reduce((sum, x) => sum + x / n, 0);
  const largest = estimates.reduce((most, x) => Math.max(most, Math.abs(mean - x)), 0);
  if (largest === 0) return 0;
  let [squares, cubes] = [0, 0];
  for (const x of estimates) {
    const d = (mean - x) / largest;
    squares += d * d;
    cubes += d * d * d;
  }
  return cubes / (6 * squares ** 1.5);
}
