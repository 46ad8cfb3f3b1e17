/** Ranks from 1; equal values share the mean of theirs. `ties` is the sum of t^3 - t over groups of t equal values. */
export function midranks(values: readonly number[]): { ranks: Float64Array; ties: number } {
  const order = Int32Array.from(values.keys()).sort((a, b) => (values[a] as number) - (values[b] as number));
  const ranks = new Float64Array(values.length);
  let ties = 0;
  for (let from = 0; from < order.length;) {
    let to = from + 1;
    while (to < order.length && values[order[to] as number] === values[order[from] as number]) to += 1;
    const rank = (from + 1 + to) / 2;
    for (let i = from; i < to; i += 1) ranks[order[i] as number] = rank;
    const size = to - from;
    ties += size ** 3 - size;
    from = to;
  }
  return { ranks, ties };
}
