import { representable } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { countAtMinusOne, type MinusOneCount } from '../slopes/minus-one';
import type { OrderedPoints } from '../slopes/point-grid';
import type { SlopeRanks } from '../slopes/slope-ranks';
import type { Interval } from '../types';
import { midpoint } from './midpoint';
import type { SlopeSearch } from './passing-bablok';

/** Median of the slopes of all pairs, shifted by the slopes below -1. */
export function shiftedSlopes(ranks: SlopeRanks, spread: number): SlopeSearch {
  const cut = countAtMinusOne(ranks);
  const total = ranks.total + ranks.points.verticalPairs - cut.equal;
  if (ranks.total - cut.equal <= 0) {
    throw new StatsError(
      'no-spread',
      'passingBablok finds no slope: no two points differ in x but by a slope of -1',
    );
  }
  const at = shiftedRank(ranks, cut);
  const slope = total % 2 === 1 ? at((total + 1) / 2) : midpoint(at(total / 2), at(total / 2 + 1));
  if (!Number.isFinite(slope)) {
    throw new StatsError(
      'no-spread',
      'passingBablok finds no slope above -1: most pairs fall more steeply or have the same x',
    );
  }
  return { slope, ...limitsOf(at, total, spread), ...countsOf(ranks, cut) };
}

/**
 * The slope with a rank (from 1) counted from the first one above -1. Vertical pairs stand at both ends of the list;
 * those at the lower end move K and the ranks alike, so they need not be looked at.
 */
export function shiftedRank(ranks: SlopeRanks, cut: MinusOneCount): (rank: number) => number {
  return (rank) => {
    const place = cut.below + cut.equal + rank - 1;
    if (place >= ranks.total) return Infinity;
    return representable('passingBablok', ranks.select(place));
  };
}

/** Limits at ranks M1 and M2 after the shift. */
export function limitsOf(
  at: (rank: number) => number,
  total: number,
  spread: number,
): { interval: Interval; lowerRank: number; upperRank: number } {
  const lowerRank = Math.round((total - spread) / 2);
  const upperRank = total - lowerRank + 1;
  const interval =
    lowerRank < 1 ? { lower: -Infinity, upper: Infinity } : { lower: at(lowerRank), upper: at(upperRank) };
  return { interval, lowerRank, upperRank };
}

export function countsOf(
  ranks: SlopeRanks,
  cut: MinusOneCount,
): { slopes: number; shift: number; excluded: number } {
  return {
    slopes: ranks.total + ranks.points.verticalPairs - cut.equal,
    shift: cut.below + fallingVerticals(ranks.points),
    excluded: cut.equal,
  };
}

/** Vertical pairs whose slope is -Infinity: y_i < y_j with i before j in the input. */
function fallingVerticals({ count, x, y, source }: OrderedPoints): number {
  let falling = 0;
  for (let start = 0; start < count;) {
    let end = start + 1;
    while (end < count && x[end] === x[start]) end += 1;
    if (end - start > 1) falling += growingPairs(y.subarray(start, end), source.subarray(start, end));
    start = end;
  }
  return falling;
}

/** Pairs where both y and the place in the input grow; y is ascending. */
function growingPairs(y: Float64Array, source: Int32Array): number {
  const order = Array.from(source.keys()).sort((a, b) => (source[a] as number) - (source[b] as number));
  const place = new Int32Array(order.length);
  order.forEach((point, at) => (place[point] = at + 1));
  const tree = new Int32Array(order.length + 1);
  let pairs = 0;
  for (let start = 0; start < y.length;) {
    let end = start + 1;
    while (end < y.length && y[end] === y[start]) end += 1;
    for (let i = start; i < end; i += 1)
      for (let k = place[i] as number; k > 0; k -= k & -k) pairs += tree[k] as number;
    for (let i = start; i < end; i += 1)
      for (let k = place[i] as number; k < tree.length; k += k & -k) tree[k] = (tree[k] as number) + 1;
    start = end;
  }
  return pairs;
}
