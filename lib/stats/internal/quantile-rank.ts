/** The nine definitions of Hyndman and Fan 1996, numbered as they number them. */
export type QuantileType = 1 | 2 | 3 | 4 | 5 | 6 | 7 | 8 | 9;

/** Offsets (a, b) of the continuous types: the fractional rank is a + p (n + 1 - a - b). */
const OFFSETS: Record<4 | 5 | 6 | 7 | 8 | 9, readonly [number, number]> = {
  4: [0, 1],
  5: [0.5, 0.5],
  6: [0, 0],
  7: [1, 1],
  8: [1 / 3, 1 / 3],
  9: [3 / 8, 3 / 8],
};

/**
 * Where a quantile lies: between the order statistics number `index` and `index + 1` (from 1; the caller keeps them
 * inside the data), at `weight` of the way. A rank that misses a whole number only by rounding is taken as whole.
 */
export function quantileRank(n: number, p: number, type: QuantileType): { index: number; weight: number } {
  const rank = fractionalRank(n, p, type);
  const fuzz = 4 * Number.EPSILON * Math.max(1, rank);
  const index = Math.floor(rank + fuzz);
  const rest = Math.abs(rank - index) < fuzz ? 0 : rank - index;
  if (type === 1) return { index, weight: rest > 0 ? 1 : 0 };
  if (type === 2) return { index, weight: rest > 0 ? 1 : 0.5 };
  if (type === 3) return { index, weight: rest > 0 || Math.abs(index % 2) === 1 ? 1 : 0 };
  return { index, weight: rest };
}

function fractionalRank(n: number, p: number, type: QuantileType): number {
  if (type === 1 || type === 2) return n * p;
  if (type === 3) return n * p - 0.5;
  const [a, b] = OFFSETS[type];
  return a + p * (n + 1 - a - b);
}
