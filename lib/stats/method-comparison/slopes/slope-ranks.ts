import { selectKth } from '../../internal/select-kth';
import { StatsError } from '../../stats-error';
import { bracketAt, type Bracket, type Pivot } from './pivot-order';
import type { OrderedPoints } from './point-grid';
import { seededGenerator } from './seeded-generator';
import { forTurnedPairs } from './turned-pairs';

export interface SlopeRanksOptions {
  /** Most pairs that are listed and sorted outright; smaller values are for tests of the contraction. */
  readonly listLimit?: number;
}

const SEED = 20_261_201;
// A sample quantile lies within 2.3 standard deviations with 98 %; a miss costs one round more and nothing else.
const MARGIN = 2.3;
// Two or three are usual. Every round takes a pair out, so the limit is a guard against a fault here.
export const MOST_ROUNDS = 10_000;
const SMALLEST_LIST = 2_000;

/**
 * Order statistics of the slopes of all pairs of points with different x, without making the pairs.
 *
 * Interval contraction: the pairs between two slopes are those that change order when the points are sorted across the
 * one and the other direction. A random sample of them gives two new slopes that very likely enclose the wanted rank;
 * counting the pairs below each is a merge sort. Two or three rounds leave O(n) pairs, which are listed and sorted.
 * Expected O(n log n) time, O(n) memory, and exact whatever the sample.
 * Source: Matousek 1991, Information Processing Letters 39, 183-187; Dillencourt, Mount and Netanyahu 1992, Int. J.
 * Computational Geometry and Applications 2, 1-27.
 */
export class SlopeRanks {
  readonly points: OrderedPoints;
  /** Pairs with different x. */
  readonly total: number;
  readonly listLimit: number;
  private readonly brackets: Bracket[];
  private readonly lists = new Map<Bracket, { upper: Bracket; slopes: Float64Array }>();
  private readonly random = seededGenerator(SEED);

  constructor(points: OrderedPoints, options: SlopeRanksOptions = {}) {
    const n = points.count;
    this.points = points;
    this.listLimit = options.listLimit ?? Math.max(3 * n, SMALLEST_LIST);
    this.total = (n * (n - 1)) / 2 - points.identicalPairs - points.verticalPairs;
    this.brackets = ends(points, this.total);
  }

  /** The bracket at a slope, which is kept; `base` is one at a lower slope. */
  at(pivot: Pivot, base: Bracket = this.ends[0]): Bracket {
    const made = bracketAt(this.points, pivot, base);
    this.brackets.splice(1, 0, made);
    return made;
  }

  /** The bracket at a slope, not kept. */
  measure(pivot: Pivot): Bracket {
    return bracketAt(this.points, pivot, this.ends[0]);
  }

  /** Brackets of the two ends, below and above every slope. */
  get ends(): readonly [Bracket, Bracket] {
    return [this.brackets[0] as Bracket, this.brackets[this.brackets.length - 1] as Bracket];
  }

  /** The slope with the given rank among all, from 0. */
  select(rank: number): number {
    for (let round = 0; round < MOST_ROUNDS; round += 1) {
      const [lower, upper] = this.around(rank);
      if (lower === upper) return lower.slope;
      const inside = between(lower, upper);
      if (inside <= this.listLimit) {
        return selectKth(this.listed(lower, upper), rank - lower.below - lower.equal);
      }
      this.contract(lower, upper, (rank - lower.below - lower.equal + 0.5) / inside);
    }
    throw new StatsError('no-convergence', `the slope with rank ${rank + 1} was not found`);
  }

  /** The closest brackets that enclose the rank; twice the same when the rank is one of its equal slopes. */
  private around(rank: number): readonly [Bracket, Bracket] {
    let [lower, upper] = this.ends;
    for (const bracket of this.brackets) {
      if (bracket.below + bracket.equal <= rank) {
        if (bracket.below + bracket.equal >= lower.below + lower.equal) lower = bracket;
      } else if (bracket.below > rank) {
        if (bracket.below < upper.below || upper === this.ends[1]) upper = bracket;
      } else return [bracket, bracket];
    }
    return [lower, upper];
  }

  private contract(lower: Bracket, upper: Bracket, share: number): void {
    const size = sampleSize(this.points.count, between(lower, upper));
    const sample = new SlopeSample(this.points, size);
    this.draw(lower, upper, size, sample);
    let base = lower;
    for (const pivot of sample.around(share)) base = this.at(pivot, clearlyBelow(base, pivot) ? base : lower);
  }

  /** Draws pairs strictly between two brackets, with repetition at most of neighbours. */
  draw(lower: Bracket, upper: Bracket, size: number, sample: SlopeSample): void {
    const inside = between(lower, upper);
    const targets = new Float64Array(size);
    // One pair from each of `size` equal stretches of their numbering: ascending without a sort.
    for (let i = 0; i < size; i += 1) {
      const fraction = this.random() * 2 ** -32;
      targets[i] = Math.min(inside - 1, Math.floor(((i + fraction) / size) * inside));
    }
    forTurnedPairs(lower.asLower, upper.asUpper, targets, (a, b) => sample.add(a, b));
  }

  /** All slopes strictly between two brackets, in no order; kept, and rearranged by each selection. */
  listed(lower: Bracket, upper: Bracket): Float64Array {
    const known = this.lists.get(lower);
    if (known?.upper === upper) return known.slopes;
    const { x, y } = this.points;
    const slopes = new Float64Array(between(lower, upper));
    let at = 0;
    forTurnedPairs(lower.asLower, upper.asUpper, null, (a, b) => {
      slopes[at] = ((y[b] as number) - (y[a] as number)) / ((x[b] as number) - (x[a] as number));
      at += 1;
    });
    this.lists.set(lower, { upper, slopes });
    return slopes;
  }
}

/** Rounded slopes can stand in the wrong order when they are nearly the same. */
export function clearlyBelow(bracket: Bracket, pivot: Pivot): boolean {
  const slope = pivot.rise / pivot.run;
  return slope - bracket.slope > 1e-14 * (Math.abs(slope) + Math.abs(bracket.slope));
}

/** Pairs strictly between two brackets. */
export function between(lower: Bracket, upper: Bracket): number {
  return upper.below - lower.below - lower.equal;
}

/** As many pairs as points: a smaller sample leaves a wider interval, a larger one costs more than it saves. */
export function sampleSize(count: number, inside: number): number {
  return Math.max(32, Math.min(count, Math.ceil(inside / 4)));
}

/** Pairs drawn from an interval, with their slopes. */
export class SlopeSample {
  private readonly slopes: Float64Array;
  private readonly from: Int32Array;
  private readonly to: Int32Array;
  private size = 0;

  constructor(
    private readonly points: OrderedPoints,
    capacity: number,
    /** Keep |slope| instead of the slope. */
    private readonly absolute = false,
  ) {
    this.slopes = new Float64Array(capacity);
    this.from = new Int32Array(capacity);
    this.to = new Int32Array(capacity);
  }

  add(a: number, b: number): void {
    const { x, y } = this.points;
    const [from, to] = (x[a] as number) < (x[b] as number) ? [a, b] : [b, a];
    const i = this.size;
    this.from[i] = from;
    this.to[i] = to;
    const slope = ((y[to] as number) - (y[from] as number)) / ((x[to] as number) - (x[from] as number));
    this.slopes[i] = this.absolute ? Math.abs(slope) : slope;
    this.size += 1;
  }

  /** Pivots that very likely lie on either side of the quantile of the interval; one when they are the same. */
  around(share: number): Pivot[] {
    const m = this.size;
    const copy = this.slopes.slice(0, m);
    const margin = MARGIN * Math.sqrt(m * share * (1 - share)) + 1;
    const low = Math.floor(share * m - margin);
    const high = Math.ceil(share * m + margin);
    const wanted = new Set<number>();
    if (low >= 0) wanted.add(selectKth(copy, low));
    if (high < m) wanted.add(selectKth(copy, high));
    if (wanted.size === 0) wanted.add(selectKth(copy, m >> 1));
    return [...wanted].map((slope) => this.pivotOf(this.slopes.indexOf(slope)));
  }

  private pivotOf(i: number): Pivot {
    const { x, y } = this.points;
    const pair = [this.from[i] as number, this.to[i] as number] as const;
    const rise = (y[pair[1]] as number) - (y[pair[0]] as number);
    const run = (x[pair[1]] as number) - (x[pair[0]] as number);
    return { rise, run, pair, mirrored: false };
  }
}

/** Below every slope the points stand by x, above every slope in the opposite order, equal x always by y. */
function ends(points: OrderedPoints, total: number): Bracket[] {
  const { count, x } = points;
  const forward = new Int32Array(count);
  const backward = new Int32Array(count);
  for (let i = 0; i < count; i += 1) forward[i] = i;
  for (let end = count, out = 0; end > 0;) {
    let start = end - 1;
    while (start > 0 && x[start - 1] === x[end - 1]) start -= 1;
    for (let i = start; i < end; i += 1, out += 1) backward[out] = i;
    end = start;
  }
  return [
    { slope: -Infinity, below: 0, equal: 0, asUpper: forward, asLower: forward },
    { slope: Infinity, below: total, equal: 0, asUpper: backward, asLower: backward },
  ];
}
