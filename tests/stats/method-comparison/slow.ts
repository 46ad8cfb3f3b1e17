/*
 * The definitions, pair by pair, for comparison with the fast versions. Coordinates are whole numbers, so that every
 * difference is exact and a slope is the correctly rounded value of its fraction.
 */
export interface WholePairs {
  readonly x: readonly number[];
  readonly y: readonly number[];
}

export function plainMedian(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const high = sorted.length >> 1;
  const upper = sorted[high] as number;
  return sorted.length % 2 === 1 ? upper : ((sorted[high - 1] as number) + upper) / 2;
}

function forPairs(n: number, run: (i: number, j: number) => void): void {
  for (let i = 0; i < n; i += 1) for (let j = i + 1; j < n; j += 1) run(i, j);
}

/** Slopes of all pairs with different x, ascending. */
export function allSlopes({ x, y }: WholePairs): number[] {
  const slopes: number[] = [];
  forPairs(x.length, (i, j) => {
    const dx = (x[j] as number) - (x[i] as number);
    if (dx !== 0) slopes.push(((y[j] as number) - (y[i] as number)) / dx + 0);
  });
  return slopes.sort((a, b) => a - b);
}

export interface SlowPassingBablok {
  readonly slope: number;
  readonly shift: number;
  readonly slopes: number;
  readonly lowerRank: number;
  readonly upperRank: number;
  readonly lower: number;
  readonly upper: number;
}

/** Passing and Bablok 1983 as printed, at the given normal factor; null when no slope is left or the line is vertical. */
export function slowPassingBablok({ x, y }: WholePairs, z: number): SlowPassingBablok | null {
  const n = x.length;
  const list: number[] = [];
  forPairs(n, (i, j) => {
    const dx = (x[i] as number) - (x[j] as number);
    const dy = (y[i] as number) - (y[j] as number);
    if (dx === 0 && dy === 0) return;
    if (dx === 0) list.push(dy > 0 ? Infinity : -Infinity);
    else if (dx + dy !== 0) list.push(dy / dx + 0);
  });
  list.sort((a, b) => (a < b ? -1 : a > b ? 1 : 0));
  const count = list.length;
  if (!list.some(Number.isFinite)) return null;
  const shift = list.filter((slope) => slope < -1).length;
  // Vertical pairs have no sign of their own: those at the end of the list follow after the first ones again.
  const at = (rank: number) => list[rank + shift - 1] ?? Infinity;
  const slope = count % 2 === 1 ? at((count + 1) / 2) : (at(count / 2) + at(count / 2 + 1)) / 2;
  if (!Number.isFinite(slope)) return null;
  const c = z * Math.sqrt((n * (n - 1) * (2 * n + 5)) / 18);
  const lowerRank = Math.round((count - c) / 2);
  const upperRank = count - lowerRank + 1;
  const none = lowerRank < 1;
  return {
    slope,
    shift,
    slopes: count,
    lowerRank,
    upperRank,
    lower: none ? -Infinity : at(lowerRank),
    upper: none ? Infinity : at(upperRank),
  };
}

/** Repeated median slope; null when all x are equal. */
export function slowRepeatedMedian({ x, y }: WholePairs): number | null {
  const inner: number[] = [];
  for (let i = 0; i < x.length; i += 1) {
    const slopes: number[] = [];
    for (let j = 0; j < x.length; j += 1) {
      const dx = (x[j] as number) - (x[i] as number);
      if (dx !== 0) slopes.push(((y[j] as number) - (y[i] as number)) / dx);
    }
    if (slopes.length > 0) inner.push(plainMedian(slopes));
  }
  return inner.length === 0 ? null : plainMedian(inner) + 0;
}
