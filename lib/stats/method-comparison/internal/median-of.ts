import { selectKth } from '../../internal/select-kth';
import { midpoint } from '../rank-lines/midpoint';

/** Median in O(n) on average; the values are rearranged. */
export function medianOf(values: Float64Array): number {
  const upper = values.length >> 1;
  const high = selectKth(values, upper);
  if (values.length % 2 === 1) return high + 0;
  let low = values[0] as number;
  for (let i = 1; i < upper; i += 1) low = Math.max(low, values[i] as number);
  return midpoint(low, high) + 0;
}
