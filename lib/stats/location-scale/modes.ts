import { representable } from '../internal/check-values';
import { evaluateGaussianSum, gaussianSum, type GaussianSum } from '../internal/gaussian-sum';
import { kernelHeight, kernelUnits } from '../internal/kernel-units';

export interface ModesOptions {
  readonly bandwidth: number;
}

export interface Mode {
  readonly location: number;
  /** The density there, in 1 / unit of the data. */
  readonly height: number;
  /** The height as a share of the highest mode's. */
  readonly relativeHeight: number;
}

export interface ModesResult {
  readonly bandwidth: number;
  /** In ascending order of location; at least one. */
  readonly modes: readonly Mode[];
  /** The location of the highest mode; of equal ones the first. */
  readonly highest: number;
  readonly unimodal: boolean;
}

/** Step of the search in units of sqrt(2) bandwidths: two modes closer than 0.04 bandwidths may be seen as one. */
const STEP = 1 / 32;
/** A mode lies between the values, and within this reach of one of them. */
const REACH = 5;
const MOST_BISECTIONS = 200;

/**
 * Modes: all local maxima of the kernel density of the results, with their heights.
 *
 * More than one mode may mean two methods, two units or two materials; it depends on the bandwidth, and a single
 * wild result makes a small mode of its own, so read the relative heights.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param options.bandwidth - standard deviation of the kernel. Unit: unit of the data. Domain: finite; > 0.
 * @returns { bandwidth, modes: { location, height, relativeHeight }[], highest, unimodal }
 * @throws StatsError too-few-values; not-finite; no-spread for a bandwidth of 0; out-of-domain for a negative one or
 *   values out of the number range
 *
 * Ties and equal values: allowed. Zero spread: one mode, that value. Order of input: does not matter.
 * Numerics: sign changes of the derivative on steps of 0.04 bandwidths wherever there are values, then bisection to
 *   the last digits. O(n log n), and O(1) a step.
 * Source: ISO 13528:2022, 10.3; IUPAC/ISO/AOAC Harmonized Protocol 2006.
 * Checked by: tests/stats/location-scale/kernel-density.test.ts, tests/reference/proficiency (kde).
 * @example modes([1, 1.1, 1.2, 9], { bandwidth: 0.5 }).modes.length // => 2
 */
export function modes(values: readonly number[], { bandwidth }: ModesOptions): ModesResult {
  const { sorted, origin, unit } = kernelUnits('modes', values, bandwidth);
  const sum = gaussianSum(sorted);
  const perKernel = kernelHeight(values.length, unit);
  const found = localMaxima(sorted, sum).map((t) => ({ t, value: evaluateGaussianSum(sum, t).value }));
  const top = found.reduce((best, mode) => (mode.value > best.value ? mode : best));
  return {
    bandwidth,
    modes: found.map(({ t, value }) => ({
      location: origin + t * unit,
      height: representable('modes', value * perKernel),
      relativeHeight: value / top.value,
    })),
    highest: origin + top.t * unit,
    unimodal: found.length === 1,
  };
}

/** Where the derivative goes from rising to falling; the gaps between far-off groups of values are skipped. */
function localMaxima(sorted: Float64Array, sum: GaussianSum): number[] {
  const found: number[] = [];
  const slope = (t: number) => evaluateGaussianSum(sum, t).slope;
  let first = 0;
  while (first < sorted.length) {
    let last = first;
    while (last + 1 < sorted.length && (sorted[last + 1] as number) - (sorted[last] as number) <= 2 * REACH)
      last += 1;
    scan((sorted[first] as number) - STEP, (sorted[last] as number) + STEP, slope, found);
    first = last + 1;
  }
  return found;
}

function scan(from: number, to: number, slope: (t: number) => number, found: number[]): void {
  const steps = Math.ceil((to - from) / STEP);
  let rising = from;
  let wasRising = slope(from) > 0;
  for (let i = 1; i <= steps; i += 1) {
    const t = i === steps ? to : from + i * STEP;
    const isRising = slope(t) > 0;
    if (wasRising && !isRising) found.push(bisect(rising, t, slope));
    rising = t;
    wasRising = isRising;
  }
}

function bisect(low: number, high: number, slope: (t: number) => number): number {
  let [a, b] = [low, high];
  for (let i = 0; i < MOST_BISECTIONS; i += 1) {
    const middle = a + (b - a) / 2;
    if (middle <= a || middle >= b) break;
    if (slope(middle) > 0) a = middle;
    else b = middle;
  }
  return a + (b - a) / 2;
}
