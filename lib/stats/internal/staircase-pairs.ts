import type { PairSet } from './difference-distribution';
import { justAbove, justBelow } from './neighbours';
import { locateDifference, type Wanted } from './locate-difference';
import { countDifferences, remembering } from './pair-differences';

type Staircase = Omit<Wanted, 'target'> & { readonly sorted: Float64Array; readonly tolerance: number };

/** All pairs of single values. */
export function allPairs(sorted: Float64Array, tolerance: number): PairSet {
  const n = sorted.length;
  const count = remembering((t) => countDifferences(sorted, t));
  const total = (n * (n - 1)) / 2;
  return staircasePairs({ sorted, measure: count, count, total, tolerance, counts: null, single: true });
}

/** Pairs of a sorted list that are too many to be written down. */
export function staircasePairs({ sorted, tolerance, ...pairs }: Staircase): PairSet {
  const { measure, total, counts, single } = pairs;
  return {
    measure,
    total,
    tolerance,
    locate: (target) => locateDifference(sorted, { ...pairs, target: single ? Math.ceil(target) : target }),
    largestBelow: (t) => largestBelow(sorted, t, counts ?? always),
    smallestAbove: (t) => smallestAbove(sorted, t, counts ?? always),
  };
}

const always = () => true;

function largestBelow(sorted: Float64Array, t: number, counts: (i: number, j: number) => boolean): number {
  const limit = justBelow(Math.max(0, t));
  let largest = 0;
  let first = 0;
  for (let j = 1; j < sorted.length; j += 1) {
    const x = sorted[j] as number;
    while (first < j && x - (sorted[first] as number) > limit) first += 1;
    let i = first;
    while (i < j && !counts(i, j)) i += 1;
    if (i < j) largest = Math.max(largest, x - (sorted[i] as number));
  }
  return largest;
}

function smallestAbove(sorted: Float64Array, t: number, counts: (i: number, j: number) => boolean): number {
  const limit = justAbove(t);
  let smallest = Infinity;
  let end = 0;
  for (let j = 1; j < sorted.length; j += 1) {
    const x = sorted[j] as number;
    while (end < j && x - (sorted[end] as number) >= limit) end += 1;
    let i = end - 1;
    while (i >= 0 && !counts(i, j)) i -= 1;
    if (i >= 0) smallest = Math.min(smallest, x - (sorted[i] as number));
  }
  return smallest;
}
