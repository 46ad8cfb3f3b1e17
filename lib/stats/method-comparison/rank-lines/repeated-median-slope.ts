import { selectKth } from '../../internal/select-kth';
import { medianOf } from '../internal/median-of';
import { CountTree } from '../slopes/minus-one';
import type { OrderedPoints } from '../slopes/point-grid';
import { SlopeRanks } from '../slopes/slope-ranks';
import type { Bracket } from '../slopes/pivot-order';
import { seededGenerator } from '../slopes/seeded-generator';
import { DIRECT_POINTS, directRepeatedMedian } from './direct-repeated-median';

const SEED = 19_820_242;
const FEW = 24;

/** The repeated median of the slopes, or null when all x are equal. */
export function repeatedMedianSlope(points: OrderedPoints): number | null {
  return points.count <= DIRECT_POINTS ? directRepeatedMedian(points) : searchedRepeatedMedian(points);
}

/** The same for many points, most of whose medians are never worked out. */
export function searchedRepeatedMedian(points: OrderedPoints): number | null {
  const inner = new InnerMedians(points);
  const all = inner.withSlopes();
  if (all.length === 0) return null;
  const high = all.length >> 1;
  const upper = inner.select(all, high);
  if (all.length % 2 === 1) return upper + 0;
  return (inner.select(all, high - 1) + upper) / 2 + 0;
}

/** The median slope of each point, found only where it is needed. */
class InnerMedians {
  private readonly ranks: SlopeRanks;
  private readonly known = new Map<number, number>();
  private readonly random = seededGenerator(SEED);
  private readonly partners: Int32Array;
  /** Number of points equal to each, itself included. */
  private readonly copies: Int32Array;

  constructor(private readonly points: OrderedPoints) {
    this.ranks = new SlopeRanks(points);
    const { count, x, y } = points;
    this.partners = new Int32Array(count);
    this.copies = new Int32Array(count);
    forRuns(
      count,
      (a, b) => x[a] === x[b],
      (start, end) => this.partners.fill(count - (end - start), start, end),
    );
    forRuns(
      count,
      (a, b) => x[a] === x[b] && y[a] === y[b],
      (start, end) => this.copies.fill(end - start, start, end),
    );
  }

  withSlopes(): number[] {
    return Array.from(this.partners.keys()).filter((i) => (this.partners[i] as number) > 0);
  }

  /** The median with the given rank among those of the candidates: random halving. */
  select(candidates: readonly number[], rank: number): number {
    let left = candidates;
    let at = rank;
    while (left.length > FEW) {
      const chosen = left[this.random() % left.length] as number;
      const pivot = this.medianOf(chosen);
      const side = this.sidesOf(pivot, chosen);
      const lower = left.filter((i) => side(i) < 0);
      const same = left.filter((i) => side(i) === 0).length;
      if (at < lower.length) left = lower;
      else if (at < lower.length + same) return pivot;
      else {
        at -= lower.length + same;
        left = left.filter((i) => side(i) > 0);
      }
    }
    return selectKth(
      Float64Array.from(left, (i) => this.medianOf(i)),
      at,
    );
  }

  /** Median of the slopes from one point to all others with different x: O(n), kept. */
  private medianOf(i: number): number {
    const known = this.known.get(i);
    if (known !== undefined) return known;
    const median = medianOf(this.slopesOf(i));
    this.known.set(i, median);
    return median;
  }

  private slopesOf(i: number): Float64Array {
    const { count, x, y } = this.points;
    const slopes = new Float64Array(this.partners[i] as number);
    let at = 0;
    for (let j = 0; j < count; j += 1) {
      if (x[j] === x[i]) continue;
      slopes[at] = ((y[j] as number) - (y[i] as number)) / ((x[j] as number) - (x[i] as number));
      at += 1;
    }
    return slopes;
  }

  /** Is the median of a point below, at or above the pivot? From counts where they decide, else from the median. */
  private sidesOf(pivot: number, chosen: number): (i: number) => number {
    const bracket = this.ranks.measure(this.pivotAt(pivot, chosen));
    const { below, equal } = this.countsAt(bracket);
    const place = (i: number, rank: number) => {
      if (rank < (below[i] as number)) return -1;
      return rank < (below[i] as number) + (equal[i] as number) ? 0 : 1;
    };
    return (i) => {
      const partners = this.partners[i] as number;
      const low = place(i, (partners - 1) >> 1);
      if (low === place(i, partners >> 1)) return low;
      return Math.sign(this.medianOf(i) - pivot);
    };
  }

  /** The slope itself as a pair of points where there is one, so that ties with it are exact. */
  private pivotAt(slope: number, chosen: number) {
    const { count, x, y } = this.points;
    for (let j = 0; j < count; j += 1) {
      if (x[j] === x[chosen]) continue;
      const [from, to] = j < chosen ? [j, chosen] : [chosen, j];
      const rise = (y[to] as number) - (y[from] as number);
      const run = (x[to] as number) - (x[from] as number);
      if (rise / run === slope) return { rise, run, pair: [from, to] as const, mirrored: false };
    }
    return { rise: slope, run: 1, pair: null, mirrored: false };
  }

  /** For each point the slopes below the bracket and equal to it: turned pairs on either side of the point. */
  private countsAt(bracket: Bracket): { below: Int32Array; equal: Int32Array } {
    const { count } = this.points;
    const place = new Int32Array(count);
    bracket.asUpper.forEach((point, at) => (place[point] = at + 1));
    const below = new Int32Array(count);
    const tree = new CountTree(count);
    for (let i = 0; i < count; i += 1) {
      const before = i - tree.upTo(place[i] as number);
      // Of the points before, `before` stand behind now; those from behind that moved up follow from the new place.
      below[i] = 2 * before + (place[i] as number) - 1 - i;
      tree.add(place[i] as number);
    }
    const equal = new Int32Array(count);
    const line = lineNumbers(bracket, count);
    const sizes = new Int32Array(count);
    for (const number of line) sizes[number] = (sizes[number] as number) + 1;
    for (let i = 0; i < count; i += 1)
      equal[i] = (sizes[line[i] as number] as number) - (this.copies[i] as number);
    return { below, equal };
  }
}

/** Which points lie on one line across the direction: they stand in opposite order in the two orders of a bracket. */
function lineNumbers({ asUpper, asLower }: Bracket, count: number): Int32Array {
  const line = new Int32Array(count);
  const placeInLower = new Int32Array(count);
  asLower.forEach((point, at) => (placeInLower[point] = at));
  let furthest = -1;
  let number = -1;
  for (let at = 0; at < count; at += 1) {
    const point = asUpper[at] as number;
    if (at > furthest) number += 1;
    furthest = Math.max(furthest, placeInLower[point] as number);
    line[point] = number;
  }
  return line;
}

function forRuns(
  count: number,
  same: (a: number, b: number) => boolean,
  run: (start: number, end: number) => void,
) {
  for (let start = 0; start < count;) {
    let end = start + 1;
    while (end < count && same(start, end)) end += 1;
    run(start, end);
    start = end;
  }
}
