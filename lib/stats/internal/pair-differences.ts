/*
 * The n (n - 1) / 2 differences x[j] - x[i], i < j, of sorted values, without ever writing them all down. Rows and
 * columns of their matrix are in order, so that one walk along its staircase counts those up to a limit in O(n)
 * (Johnson and Mizoguchi 1978). All comparisons are of the rounded differences, which rounding leaves in order; the
 * results are therefore those of the full list, to the last bit.
 */

/** How many differences are at most t. */
export function countDifferences(sorted: Float64Array, t: number): number {
  const n = sorted.length;
  let count = 0;
  let i = 0;
  for (let j = 1; j < n; j += 1) {
    const x = sorted[j] as number;
    while (i < j && x - (sorted[i] as number) > t) i += 1;
    count += j - i;
  }
  return count;
}

/** The function with its last few values kept, for limits that are asked twice. */
export function remembering(f: (t: number) => number): (t: number) => number {
  const known = new Map<number, number>();
  return (t) => {
    const found = known.get(t);
    if (found !== undefined) return found;
    const value = f(t);
    if (known.size >= 16) known.clear();
    known.set(t, value);
    return value;
  };
}
