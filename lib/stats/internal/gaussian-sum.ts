/**
 * Sums of Gaussian kernels, near-linear in the number of values (the fast Gauss transform in one dimension,
 * Greengard and Strain 1991). Values that lie within 0.7 bandwidths share a centre; each group is kept as the
 * moments of its Hermite series, so that a point costs a few groups and not all values.
 */
export interface GaussianSum {
  readonly centres: Float64Array;
  readonly moments: Float64Array;
}

/** With |v| <= 0.25 the first term left out is below 2e-16 of a kernel's height. */
const TERMS = 19;
const HALF_WIDTH = 0.25;
/** exp(-6.2^2) is 2e-17: kernels further away add nothing to a double. */
const REACH = 6.2;

/** `sorted` holds the values in units of sqrt(2) bandwidths, so that a kernel is exp(-(t - x)^2). */
export function gaussianSum(sorted: Float64Array): GaussianSum {
  const centres: number[] = [];
  const moments: number[] = [];
  let first = 0;
  while (first < sorted.length) {
    const centre = (sorted[first] as number) + HALF_WIDTH;
    let next = first;
    const sums = new Float64Array(TERMS);
    while (next < sorted.length && (sorted[next] as number) - centre <= HALF_WIDTH) {
      addMoments(sums, (sorted[next] as number) - centre);
      next += 1;
    }
    centres.push(centre);
    for (const sum of sums) moments.push(sum);
    first = next === first ? first + 1 : next;
  }
  return { centres: Float64Array.from(centres), moments: Float64Array.from(moments) };
}

function addMoments(sums: Float64Array, v: number): void {
  let term = 1;
  for (let k = 0; k < TERMS; k += 1) {
    sums[k] = (sums[k] as number) + term;
    term *= v / (k + 1);
  }
}

/** The sum of kernels at t and its derivative, in the units of the sorted values. */
export function evaluateGaussianSum(
  { centres, moments }: GaussianSum,
  t: number,
): { value: number; slope: number } {
  let group = firstInReach(centres, t - REACH - HALF_WIDTH);
  let value = 0;
  let slope = 0;
  while (group < centres.length && (centres[group] as number) <= t + REACH + HALF_WIDTH) {
    const u = t - (centres[group] as number);
    const weight = Math.exp(-u * u);
    let hermite = weight; // H_k(u) exp(-u^2), by the three-term recurrence
    let next = 2 * u * weight;
    for (let k = 0; k < TERMS; k += 1) {
      const moment = moments[group * TERMS + k] as number;
      value += moment * hermite;
      slope -= moment * next;
      const after = 2 * u * next - 2 * (k + 1) * hermite;
      hermite = next;
      next = after;
    }
    group += 1;
  }
  return { value, slope };
}

function firstInReach(centres: Float64Array, limit: number): number {
  let low = 0;
  let high = centres.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((centres[middle] as number) < limit) low = middle + 1;
    else high = middle;
  }
  return low;
}
