import { quantileRank, type QuantileType } from './quantile-rank';
import { spreadSort } from './spread-order';

/** From here on distribution is faster than the native sort; at 100,000 values by half. */
const MANY = 6000;

/** A sorted copy in a typed array, whose native sort is numeric and several times faster than a comparator. */
export function sortedCopy(values: readonly number[]): Float64Array {
  const copy = new Float64Array(values);
  return copy.length < MANY ? copy.sort() : spreadSort(copy);
}

/** Half-way between two numbers, without overflow. */
export function midpoint(a: number, b: number): number {
  const half = (a + b) / 2;
  return Number.isFinite(half) ? half : a / 2 + b / 2;
}

export function medianOfSorted(sorted: Float64Array): number {
  const n = sorted.length;
  const upper = n >> 1;
  const high = sorted[upper] as number;
  const value = n % 2 === 1 ? high : midpoint(sorted[upper - 1] as number, high);
  return value + 0; // negative zero becomes zero
}

export function quantileOfSorted(sorted: Float64Array, probability: number, type: QuantileType): number {
  const n = sorted.length;
  const { index, weight } = quantileRank(n, probability, type);
  const low = sorted[Math.min(Math.max(index - 1, 0), n - 1)] as number;
  const high = sorted[Math.min(Math.max(index, 0), n - 1)] as number;
  if (weight === 0 || low === high) return low + 0;
  if (weight === 1) return high + 0;
  const span = high - low;
  return (Number.isFinite(span) ? low + weight * span : (1 - weight) * low + weight * high) + 0;
}

/**
 * Median of |x - centre| for sorted x in O(n): the distances grow in both directions from the centre, so the
 * smallest half of them is found by walking outwards, without a second sort.
 */
export function medianDeviationOfSorted(sorted: Float64Array, centre: number): number {
  const n = sorted.length;
  // Halved where the distance of the extremes would overflow; the small values lost by halving do not matter then.
  const unit = Number.isFinite((sorted[n - 1] as number) - (sorted[0] as number)) ? 1 : 0.5;
  const c = centre * unit;
  let right = lowerBound(sorted, centre);
  let left = right - 1;
  let previous = 0;
  let current = 0;
  for (let taken = 0; taken <= n >> 1; taken += 1) {
    const down = left >= 0 ? c - (sorted[left] as number) * unit : Infinity;
    const up = right < n ? (sorted[right] as number) * unit - c : Infinity;
    previous = current;
    if (down < up) {
      current = down;
      left -= 1;
    } else {
      current = up;
      right += 1;
    }
  }
  return (n % 2 === 1 ? current : midpoint(previous, current)) / unit;
}

/** Index of the first value that is not below `limit`. */
export function lowerBound(sorted: Float64Array, limit: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((sorted[middle] as number) < limit) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Index of the first value that is above `limit`. */
export function upperBound(sorted: Float64Array, limit: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((sorted[middle] as number) <= limit) low = middle + 1;
    else high = middle;
  }
  return low;
}
