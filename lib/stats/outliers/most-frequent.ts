/** The count that occurs most often; of equally frequent ones the smallest, which is the cautious one. */
export function mostFrequent(counts: readonly number[]): number {
  const seen = new Map<number, number>();
  for (const count of counts) seen.set(count, (seen.get(count) ?? 0) + 1);
  return [...seen].sort((a, b) => b[1] - a[1] || a[0] - b[0])[0]?.[0] ?? 1;
}
