/** Two-sided exact probability of at least this distance of the concordant pairs from the middle, without ties. */
export function kendallExactProbability(n: number, concordant: number): number {
  const pairs = (n * (n - 1)) / 2;
  const few = Math.min(concordant, pairs - concordant);
  // Shares of the orders of 1..m with k inversions, k no more than needed, built up one value at a time.
  let shares = Float64Array.of(1);
  for (let m = 2; m <= n; m += 1) {
    const next = new Float64Array(Math.min((m * (m - 1)) / 2, few) + 1);
    for (let k = 0; k < next.length; k += 1) {
      let sum = 0;
      const last = Math.min(k, shares.length - 1);
      for (let from = Math.max(0, k - m + 1); from <= last; from += 1) sum += shares[from] as number;
      next[k] = sum / m;
    }
    shares = next;
  }
  let tail = 0;
  for (let k = 0; k <= few; k += 1) tail += shares[k] as number;
  return Math.min(1, 2 * tail);
}
