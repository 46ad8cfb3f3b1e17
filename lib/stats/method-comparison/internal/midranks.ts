import { mergeOrder } from '../slopes/merge-order';

/** Ranks from 1; equal values get the mean of their ranks. O(n log n). */
export function midranks(values: readonly number[]): number[] {
  const { order } = mergeOrder(Float64Array.from(values));
  const ranks = values.map(() => 0);
  for (let start = 0; start < order.length;) {
    let end = start + 1;
    while (end < order.length && values[order[end] as number] === values[order[start] as number]) end += 1;
    for (let i = start; i < end; i += 1) ranks[order[i] as number] = (start + 1 + end) / 2;
    start = end;
  }
  return ranks;
}
