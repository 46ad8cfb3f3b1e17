import type { OrderedPoints } from './point-grid';
import type { SlopeRanks } from './slope-ranks';

export interface MinusOneCount {
  /** Pairs with different x whose slope is below -1. */
  readonly below: number;
  /** Pairs whose slope is -1: exactly on a decimal grid, else within the rounding of the values. */
  readonly equal: number;
}

/** Counts the pairs below and at slope -1: O(n log n). */
export function countAtMinusOne(ranks: SlopeRanks): MinusOneCount {
  if (ranks.points.decimal || allSumsApart(ranks.points)) {
    const { below, equal } = ranks.at({ rise: -1, run: 1, pair: null, mirrored: false });
    return { below, equal };
  }
  const below = countFalling(ranks.points, 1);
  const above = countFalling(ranks.points, -1);
  return { below, equal: ranks.total - below - above };
}

/** Means of replicates and the like are decimals but for their last place; each value may be off by 2 of those. */
const ROUNDING = 2 ** -51;

/** True when no two sums x + y are so close that rounding could matter: then exact counts need no allowance. */
function allSumsApart({ count, x, y }: OrderedPoints): boolean {
  const sums = Float64Array.from({ length: count }, (_, i) => (x[i] as number) + (y[i] as number)).sort();
  let size = 0;
  for (let i = 0; i < count; i += 1) {
    size = Math.max(size, Math.abs(x[i] as number) + Math.abs(y[i] as number));
  }
  for (let i = 1; i < count; i += 1) {
    if ((sums[i] as number) - (sums[i - 1] as number) <= 2 * ROUNDING * size) return false;
  }
  return true;
}

/** Pairs with different x where sign (x + y) falls by more than rounding from the point of less x to the other. */
function countFalling({ count, x, y }: OrderedPoints, sign: number): number {
  const sum = (i: number) => sign * ((x[i] as number) + (y[i] as number));
  const slack = (i: number) => ROUNDING * (Math.abs(x[i] as number) + Math.abs(y[i] as number));
  const lows = Float64Array.from({ length: count }, (_, i) => sum(i) - slack(i));
  const sorted = lows.slice().sort();
  const placeOf = (value: number) => {
    let [from, to] = [0, count];
    while (from < to) {
      const middle = (from + to) >>> 1;
      if ((sorted[middle] as number) <= value) from = middle + 1;
      else to = middle;
    }
    return from;
  };
  const tree = new CountTree(count);
  let falling = 0;
  for (let start = 0; start < count;) {
    let end = start;
    while (end < count && x[end] === x[start]) end += 1;
    for (let i = start; i < end; i += 1) falling += start - tree.upTo(placeOf(sum(i) + slack(i)));
    for (let i = start; i < end; i += 1) tree.add(placeOf(lows[i] as number));
    start = end;
  }
  return falling;
}

/** Counts of places 1..n with sums over the first ones (Fenwick 1994). */
export class CountTree {
  private readonly counts: Int32Array;

  constructor(size: number) {
    this.counts = new Int32Array(size + 1);
  }

  add(place: number): void {
    for (let i = place; i < this.counts.length; i += i & -i) this.counts[i] = (this.counts[i] as number) + 1;
  }

  upTo(place: number): number {
    let sum = 0;
    for (let i = place; i > 0; i -= i & -i) sum += this.counts[i] as number;
    return sum;
  }
}
