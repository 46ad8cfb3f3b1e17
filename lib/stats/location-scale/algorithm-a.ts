import { checkValues, representable } from '../internal/check-values';
import { sortedCopy } from '../internal/sorted';
import { StatsError } from '../stats-error';
import { iterateAlgorithmA, type AlgorithmATolerance } from './algorithm-a-iteration';
import { startOfAlgorithmA, type StartScaleSource } from './algorithm-a-start';

export interface AlgorithmAOptions {
  readonly tolerance?: AlgorithmATolerance;
  readonly maxIterations?: number;
  readonly working?: boolean;
}

/** One winsorising step, in the unit of the data: from (location, scale) to (newLocation, newScale). */
export interface AlgorithmAIteration {
  readonly iteration: number;
  readonly location: number;
  readonly scale: number;
  readonly delta: number;
  readonly lower: number;
  readonly upper: number;
  readonly countBelow: number;
  readonly countAbove: number;
  readonly newLocation: number;
  readonly newScale: number;
}

export interface AlgorithmAResult {
  /** The robust mean x*. */
  readonly location: number;
  /** The robust standard deviation s*; 0 only together with `zeroScale`. */
  readonly scale: number;
  readonly count: number;
  readonly iterations: number;
  readonly converged: boolean;
  readonly startLocation: number;
  readonly startScale: number;
  readonly startScaleFrom: StartScaleSource;
  /** True when all values are equal, or so many that the iteration shrinks to nothing: not fit for scoring. */
  readonly zeroScale: boolean;
  /** The steps, when working was asked for. */
  readonly trace: readonly AlgorithmAIteration[] | null;
}

const DEFAULT_TOLERANCE = 1e-9;
/** Values many orders of magnitude apart, most of them tied, can start from a subnormal scale and grow by 1 % a step. */
const DEFAULT_MAX_ITERATIONS = 1_000_000;

/**
 * Robust mean and standard deviation by Algorithm A: winsorise at x* +- 1.5 s* and repeat until nothing moves.
 *
 * The usual consensus value of a round. It bears about a quarter of wild results; for more, or for two groups of
 * laboratories, look at the distribution first. Start: x* = median, s* = MADe. If MADe is 0 (half of the values
 * equal) s* starts from nIQR, then from the mean absolute deviation about the median, and the result says which.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.tolerance - stop when x* and s* change by less than this share of s*, and by the rate of the
 *   changes less is still to come. Default 1e-9. 'third-digit' is the rule of the standard: no change in the third significant figure of s* and in that place of x*.
 * @param options.maxIterations - limit. Default 1,000,000 (ordinary data take 10 to 60, three results with
 *   one of them wild some hundred).
 * @param options.working - keep each iteration in `trace`. Default false.
 * @returns { location, scale, count, iterations, converged, startLocation, startScale, startScaleFrom, zeroScale,
 *   trace }; locations and scales in the unit of the data
 * @throws StatsError too-few-values below 2 values; not-finite when one is not a finite number; no-convergence when
 *   the limit is reached; out-of-domain when an option is senseless or a result is too large to represent
 *
 * Ties and equal values: allowed. Zero spread: scale 0 with zeroScale true; scoring by it is an error. With so many
 *   ties (roughly two thirds) that s* shrinks without end, the limit is reported: the tied value, scale 0, zeroScale.
 * Order of input: does not matter.
 * Numerics: the change of x* is measured against s* and not against x*, so that a shift of the data changes nothing.
 *   Sums over the sorted values, from the median outwards, are kept, so an iteration costs O(log n); in all
 *   O(n log n). Values are scaled by a power of two first. An outlying value never enters a sum.
 * Source: ISO 13528:2022, Annex C.3.1; the factor 1.134 as printed (exact 1.13339). The mean absolute deviation is
 *   multiplied by sqrt(pi / 2), its consistency factor for normal data.
 * Checked by: tests/stats/location-scale/algorithm-a.test.ts (against a slow plain version), tests/reference/proficiency.
 * @example algorithmA([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9]) // => location 5.38649, scale 1.14596
 */
export function algorithmA(values: readonly number[], options: AlgorithmAOptions = {}): AlgorithmAResult {
  checkValues('algorithmA', values, 2);
  return algorithmAOfSorted(sortedCopy(values), options);
}

/** The same for values that are already sorted and checked. */
export function algorithmAOfSorted(sorted: Float64Array, options: AlgorithmAOptions): AlgorithmAResult {
  const tolerance = options.tolerance ?? DEFAULT_TOLERANCE;
  const maxIterations = options.maxIterations ?? DEFAULT_MAX_ITERATIONS;
  checkOptions(tolerance, maxIterations);
  const start = startOfAlgorithmA(sorted);
  const fixed = {
    count: sorted.length,
    startLocation: start.location,
    startScale: representable('algorithmA', start.scale),
    startScaleFrom: start.scaleFrom,
  };
  if (start.scale === 0) {
    const trace = options.working ? [] : null;
    return {
      location: start.location,
      scale: 0,
      ...fixed,
      iterations: 0,
      converged: true,
      zeroScale: true,
      trace,
    };
  }
  const end = iterateAlgorithmA(sorted, start, { tolerance, maxIterations, trace: options.working === true });
  if (!end.converged) {
    const reached = `x* = ${end.location}, s* = ${end.scale}`;
    throw new StatsError(
      'no-convergence',
      `algorithmA did not settle within ${maxIterations} iterations, reached ${reached}`,
    );
  }
  const location = representable('algorithmA', end.location);
  return { ...end, location, scale: representable('algorithmA', end.scale), ...fixed };
}

function checkOptions(tolerance: AlgorithmATolerance, maxIterations: number): void {
  if (tolerance !== 'third-digit' && !(tolerance > 0 && tolerance < 1)) {
    throw new StatsError(
      'out-of-domain',
      `algorithmA requires a tolerance between 0 and 1 or 'third-digit', found ${String(tolerance)}`,
    );
  }
  if (!Number.isInteger(maxIterations) || maxIterations < 1) {
    throw new StatsError('out-of-domain', `algorithmA requires at least 1 iteration, found ${maxIterations}`);
  }
}
