import { checkNotNegative, checkValues, representable } from '../internal/check-values';
import {
  lowerBound,
  medianDeviationOfSorted,
  medianOfSorted,
  sortedCopy,
  upperBound,
} from '../internal/sorted';
import { StatsError } from '../stats-error';
import { centre } from './algorithm-a-step';
import { HUBER_K } from './huber-factor';

export interface HuberLocationOptions {
  readonly k?: number;
  readonly scale?: number;
}

export interface HuberLocationResult {
  readonly location: number;
  /** The scale that was held fixed. */
  readonly scale: number;
  readonly iterations: number;
  readonly zeroScale: boolean;
}

/** 1 / Phi^-1(3/4), which statistics programs apply to the median deviation; ISO 13528 rounds it to 1.483. */
const MAD_CONSTANT = 1.4826;
const MAX_ITERATIONS = 10_000;

/**
 * Huber's M-estimate of location with the scale held fixed.
 *
 * The mean of the values pulled to location +- k scale. For comparison; the consensus of a round estimates both.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param options.k - limit in units of the scale. Default 1.5. Domain: > 0.
 * @param options.scale - Unit: unit of the data. Domain: >= 0. Default 1.4826 times the median absolute deviation.
 * @returns { location, scale, iterations, zeroScale }
 * @throws StatsError too-few-values; not-finite; out-of-domain for k <= 0 or a negative scale; no-convergence
 *
 * Ties and equal values: allowed. Zero scale: the median, and `zeroScale`. Order of input: does not matter.
 * Numerics: Newton's method on a piecewise linear falling function, exact after finitely many steps; O(n log n).
 * Source: Huber 1964, Ann. Math. Statist. 35, 73-101.
 * Checked by: tests/stats/location-scale/huber.test.ts, tests/reference/proficiency (estimators).
 * @example huberLocation([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9]).location // => 5.359455
 */
export function huberLocation(
  values: readonly number[],
  { k = HUBER_K, scale: given }: HuberLocationOptions = {},
): HuberLocationResult {
  checkValues('huberLocation', values, 1);
  if (!(k > 0 && Number.isFinite(k))) {
    throw new StatsError('out-of-domain', `huberLocation requires k above 0, found ${k}`);
  }
  if (given !== undefined) checkNotNegative('huberLocation', 'scale', given);
  const sorted = sortedCopy(values);
  const start = medianOfSorted(sorted);
  const scale = representable(
    'huberLocation',
    given ?? MAD_CONSTANT * medianDeviationOfSorted(sorted, start),
  );
  if (scale === 0) return { location: start, scale, iterations: 0, zeroScale: true };
  const { z, sum, unit } = centre(sorted, start, scale);
  const limit = k * scale * unit;
  let m = 0;
  for (let iteration = 1; iteration <= MAX_ITERATIONS; iteration += 1) {
    const low = lowerBound(z, m - limit);
    const high = upperBound(z, m + limit);
    const inside = high - low;
    const total = (sum[high] as number) - (sum[low] as number) - inside * m + (z.length - high - low) * limit;
    // No value inside: only as many above as below can be a solution, and then m is one.
    if (inside === 0 && total !== 0) throw noSolution(iteration);
    const step = inside === 0 ? 0 : total / inside;
    if (Math.abs(step) <= 4 * Number.EPSILON * Math.max(limit, Math.abs(m))) {
      return { location: start + (m + step) / unit + 0, scale, iterations: iteration, zeroScale: false };
    }
    m += step;
  }
  throw noSolution(MAX_ITERATIONS);
}

const noSolution = (steps: number) =>
  new StatsError('no-convergence', `huberLocation found no solution within ${steps} steps`);
