import { selectKth } from './select-kth';
import { midpoint } from './sorted';

/** Median in O(n) on average, without a sort; the values are rearranged. */
export function medianInPlace(values: Float64Array): number {
  const n = values.length;
  const upper = n >> 1;
  const high = selectKth(values, upper);
  if (n % 2 === 1) return high + 0; // negative zero becomes zero
  let low = values[0] as number;
  for (let i = 1; i < upper; i += 1) if ((values[i] as number) > low) low = values[i] as number;
  return midpoint(low, high) + 0;
}

/** Median of |x - centre|; the values are overwritten with these distances. */
export function medianDeviationInPlace(values: Float64Array, centre: number): number {
  let largest = 0;
  for (let i = 0; i < values.length; i += 1) {
    const distance = Math.abs((values[i] as number) - centre);
    if (distance > largest) largest = distance;
  }
  // Halved where a distance would overflow; the small values lost by halving do not matter then.
  const unit = largest < Infinity ? 1 : 0.5;
  const c = centre * unit;
  for (let i = 0; i < values.length; i += 1) values[i] = Math.abs((values[i] as number) * unit - c);
  return medianInPlace(values) / unit;
}
