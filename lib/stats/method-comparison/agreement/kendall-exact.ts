/** Two-sided exact probability of at least this distance of the concordant pairs from the middle, without ties. */
export function kendallExactProbability(n: number, concordant: number): number {
  const pairs = (n * (n - 1)) / 2;
  const few = Math.min(concordant, pairs - concordant);
  // Shares of the orders of 1..m with k inversions, built up one value at a time.
  let shares = Float64Array.of(1);
  for (let m = 2; m <= n; m += 1) {
    const next = new Float64Array((m * (m - 1)) / 2 + 1);
    for (let k = 0; k < shares.length; k += 1)
      for (let moved = 0; moved < m; moved += 1)
        next[k + moved] = (next[k + moved] as number) + (shares[k] as number) / m;
    shares = next;
  }
  let tail = 0;
  for (let k = 0; k <= few; k += 1) tail += shares[k] as number;
  return Math.min(1, 2 * tail);
}
