import { checkValues, representable } from '../internal/check-values';
import { medianOfSorted, sortedCopy, upperBound } from '../internal/sorted';
import { compensatedSum } from '../internal/sums';
import { StatsError } from '../stats-error';
import { algorithmSFactors, type AlgorithmSKind } from './algorithm-s-factors';

export type AlgorithmSOptions = AlgorithmSKind & { readonly working?: boolean };

/** One step, in the unit of the data: from `pooled` to `newPooled`. */
export interface AlgorithmSIteration {
  readonly iteration: number;
  readonly pooled: number;
  readonly limit: number;
  readonly countAbove: number;
  readonly newPooled: number;
}

export interface AlgorithmSResult {
  /** w*: the robust pooled value of the standard deviations, or of the ranges. */
  readonly pooled: number;
  /** The robust standard deviation: w* itself, or w* over the factor of the range. */
  readonly standardDeviation: number;
  readonly eta: number;
  readonly xi: number;
  readonly toSd: number;
  readonly count: number;
  readonly start: number;
  readonly startFrom: 'median' | 'root-mean-square' | 'all-zero';
  readonly iterations: number;
  readonly zeroScale: boolean;
  /** The steps, when working was asked for. */
  readonly trace: readonly AlgorithmSIteration[] | null;
}

const TOLERANCE = 1e-13;
const MAX_ITERATIONS = 100_000;
/** w* this far below its start is on its way to zero. */
const COLLAPSE = 1e-12;

/**
 * Robust pooled standard deviation by Algorithm S, from the standard deviations or ranges of the laboratories.
 *
 * The repeatability standard deviation of a round with replicates, or a pooled one over samples. All values must have the
 * same degrees of freedom. Start: w* = median; if that is 0 (half of the values are) their root mean square.
 *
 * @param values - standard deviations or ranges. Shape: p values. Unit: unit of the data. Domain: finite; >= 0; at least 2.
 * @param options.degreesOfFreedom - of each standard deviation, m - 1 for m replicates. Domain: > 0.
 * @param options.rangeOf - instead, the number of replicates of each range. Domain: whole; 2 to 1000.
 * @param options.working - give the steps too. Default false.
 * @returns { pooled: w*, standardDeviation, eta, xi, toSd, count, start, startFrom, iterations, zeroScale, trace }
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for a negative value, degrees of freedom or a
 *   result too large to represent; no-convergence after 100 000 steps
 *
 * Ties and equal values: allowed. All zero, or so many that the iteration shrinks to nothing: 0 and `zeroScale`. Order
 *   of input: does not matter.
 * Numerics: one sort and running sums of squares, O(log p) a step; to a relative change of 1e-13, the sum of later ones
 *   included.
 * Source: ISO 13528:2022, Annex C.4; ISO 5725-5:1998, 5.2; factors computed (algorithmSFactors).
 * Checked by: tests/stats/location-scale/algorithm-s.test.ts, tests/reference/proficiency (antibody-sds-algS-w).
 * @example algorithmS([0.3, 0.4, 0.2, 2], { degreesOfFreedom: 1 }).pooled // => 0.684176
 */
export function algorithmS(values: readonly number[], options: AlgorithmSOptions): AlgorithmSResult {
  checkValues('algorithmS', values, 2);
  const negative = values.find((value) => value < 0);
  if (negative !== undefined) {
    throw new StatsError('out-of-domain', `algorithmS requires values of zero or more, found ${negative}`);
  }
  const factors = algorithmSFactors(options);
  const sorted = sortedCopy(values);
  const largest = sorted[sorted.length - 1] as number;
  const shared = { ...factors, count: values.length };
  const trace: AlgorithmSIteration[] | null = options.working === true ? [] : null;
  if (largest === 0) {
    const none = { pooled: 0, standardDeviation: 0, start: 0, startFrom: 'all-zero', iterations: 0 } as const;
    return { ...shared, ...none, zeroScale: true, trace };
  }
  const { start, startFrom } = startOf(sorted, largest);
  const end = iterate(sorted, start, factors, trace);
  const pooled = representable('algorithmS', end.pooled);
  const standardDeviation = representable('algorithmS', pooled / factors.toSd);
  return {
    ...shared,
    pooled,
    standardDeviation,
    start,
    startFrom,
    iterations: end.iterations,
    zeroScale: pooled === 0,
    trace,
  };
}

function startOf(sorted: Float64Array, largest: number): Pick<AlgorithmSResult, 'start' | 'startFrom'> {
  const median = medianOfSorted(sorted);
  if (median > 0) return { start: median, startFrom: 'median' };
  const n = sorted.length;
  const squares = compensatedSum(n, (i) => ((sorted[i] as number) / largest) ** 2);
  return { start: largest * Math.sqrt(squares / n), startFrom: 'root-mean-square' };
}

/** In units of the start, so that no square leaves the number range where it matters. */
function iterate(
  sorted: Float64Array,
  start: number,
  { eta, xi }: { eta: number; xi: number },
  trace: AlgorithmSIteration[] | null,
): { pooled: number; iterations: number } {
  const p = sorted.length;
  const units = sorted.map((value) => value / start);
  const squares = new Float64Array(p + 1);
  for (let i = 0; i < p; i += 1) squares[i + 1] = (squares[i] as number) + (units[i] as number) ** 2;
  let pooled = 1;
  let lastChange = NaN;
  for (let iteration = 1; iteration <= MAX_ITERATIONS; iteration += 1) {
    const limit = eta * pooled;
    const inside = upperBound(units, limit);
    const next = xi * Math.sqrt(((squares[inside] as number) + (p - inside) * limit * limit) / p);
    const row = {
      pooled: pooled * start,
      limit: limit * start,
      countAbove: p - inside,
      newPooled: next * start,
    };
    trace?.push({ iteration, ...row });
    if (next < COLLAPSE && squares[inside] === 0) return { pooled: 0, iterations: iteration };
    const change = Math.abs(next - pooled);
    const rate = change / lastChange;
    const limitOfChange = TOLERANCE * next;
    if (
      change <= limitOfChange / 1000 ||
      (change <= limitOfChange && rate < 1 && (change * rate) / (1 - rate) <= limitOfChange)
    ) {
      return { pooled: next * start, iterations: iteration };
    }
    lastChange = change;
    pooled = next;
  }
  throw new StatsError('no-convergence', `algorithmS did not settle within ${MAX_ITERATIONS} steps`);
}
