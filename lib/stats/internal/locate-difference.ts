import { justAbove, justBelow } from './neighbours';
import { countDifferences, remembering } from './pair-differences';
import { selectKth } from './select-kth';

/** The k-th smallest difference, from 1. O(n log n) at most in practice, O(n) memory. */
export function kthDifference(sorted: Float64Array, k: number): number {
  const count = remembering((t) => countDifferences(sorted, t));
  const n = sorted.length;
  return locateDifference(sorted, {
    target: k,
    measure: count,
    count,
    total: (n * (n - 1)) / 2,
    counts: null,
    single: true,
  });
}

export interface Wanted {
  /** How much is at most t; never falls with t. */
  readonly measure: (t: number) => number;
  readonly target: number;
  /** The measure of all differences. */
  readonly total: number;
  /** How many differences are at most t, whether they count or not. */
  readonly count: (t: number) => number;
  /** Which differences are measured; null when all are. */
  readonly counts: ((i: number, j: number) => boolean) | null;
  /** Whether each of these measures 1; the target is a whole number then. */
  readonly single: boolean;
}

interface Bracket {
  readonly low: number;
  readonly high: number;
  /** The measure of what lies below `low`, and up to `high`. */
  readonly before: number;
  readonly upTo: number;
}

/** So few differences are simply listed. */
const FEW = 1024;

/**
 * The smallest difference whose measure reaches the target. A bracket of differences is kept that holds it; a regular
 * sample of those inside gives two new ends with the target most likely between them, and one walk each says whether
 * it is (after Dillencourt, Mount and Netanyahu 1992). A few rounds leave no more than n differences, which are listed.
 */
export function locateDifference(sorted: Float64Array, wanted: Wanted): number {
  const n = sorted.length;
  const widest = (sorted[n - 1] as number) - (sorted[0] as number);
  let bracket: Bracket = { low: 0, high: widest, before: 0, upTo: wanted.total };
  let inside = (n * (n - 1)) / 2;
  while (inside > Math.max(n, FEW) && bracket.low < bracket.high) {
    const sample = sampleInside(sorted, bracket, inside);
    const share = (wanted.target - bracket.before) / (bracket.upTo - bracket.before);
    const middle = Math.min(1, Math.max(0, share)) * sample.length;
    const margin = 2 + 2.5 * Math.sqrt((middle * (sample.length - middle)) / sample.length);
    const narrowed = narrow(bracket, at(sample, middle - margin), at(sample, middle + margin), wanted);
    const left = countInside(narrowed, wanted);
    // Few distinct differences can leave the ends where they were; then the middle one decides, and is left out.
    const stuck = left > inside / 2;
    bracket = stuck ? narrow(narrowed, at(sample, middle), at(sample, middle), wanted) : narrowed;
    inside = stuck ? countInside(bracket, wanted) : left;
  }
  if (bracket.low >= bracket.high) return bracket.low;
  return pickListed(listInside(sorted, bracket, inside, wanted.counts), bracket, wanted);
}

function at(sample: Float64Array, index: number): number {
  return sample[Math.min(sample.length - 1, Math.max(0, Math.floor(index)))] as number;
}

/** Places a and b, a <= b, inside the bracket and keeps the part that reaches the target. */
function narrow(
  { low, high, before, upTo }: Bracket,
  a: number,
  b: number,
  { measure, target }: Wanted,
): Bracket {
  const beforeA = measure(justBelow(a));
  if (target <= beforeA) return { low, high: justBelow(a), before, upTo: beforeA };
  const upToB = measure(b);
  if (target > upToB) return { low: justAbove(b), high, before: upToB, upTo };
  return { low: a, high: b, before: beforeA, upTo: upToB };
}

function countInside({ low, high }: Bracket, { count }: Wanted): number {
  return count(high) - (low > 0 ? count(justBelow(low)) : 0);
}

const LARGEST_SAMPLE = 16_384;

/** Every so many differences inside the bracket, in the order of rows; sorted by size. */
function sampleInside(sorted: Float64Array, bracket: Bracket, inside: number): Float64Array {
  const n = sorted.length;
  const size = Math.round(Math.max(128, 8 * Math.sqrt(n), Math.min(n / 8, LARGEST_SAMPLE)));
  const stride = inside / size;
  const sample = new Float64Array(size);
  let taken = 0;
  let skip = stride / 2;
  walkInside(sorted, bracket, (j, first, end) => {
    while (skip < end - first && taken < size) {
      sample[taken] = (sorted[j] as number) - (sorted[first + Math.floor(skip)] as number);
      taken += 1;
      skip += stride;
    }
    skip -= end - first;
  });
  return sample.subarray(0, taken).sort();
}

function listInside(
  sorted: Float64Array,
  bracket: Bracket,
  inside: number,
  counts: Wanted['counts'],
): Float64Array {
  const listed = new Float64Array(inside);
  let taken = 0;
  walkInside(sorted, bracket, (j, first, end) => {
    for (let i = first; i < end; i += 1) {
      if (counts !== null && !counts(i, j)) continue;
      listed[taken] = (sorted[j] as number) - (sorted[i] as number);
      taken += 1;
    }
  });
  return listed.subarray(0, taken);
}

/** For each j the i from `first` up to, not including, `end` whose differences lie inside the bracket. */
function walkInside(
  sorted: Float64Array,
  { low, high }: Bracket,
  visit: (j: number, first: number, end: number) => void,
): void {
  let first = 0;
  let end = 0;
  for (let j = 1; j < sorted.length; j += 1) {
    const x = sorted[j] as number;
    while (first < j && x - (sorted[first] as number) > high) first += 1;
    while (end < j && x - (sorted[end] as number) >= low) end += 1;
    if (end > first) visit(j, first, end);
  }
}

function pickListed(listed: Float64Array, { before }: Bracket, { measure, target, single }: Wanted): number {
  if (single) return selectKth(listed, target - before - 1);
  // The measure is asked at O(log n) places.
  listed.sort();
  let low = 0;
  let high = listed.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (measure(listed[middle] as number) >= target) high = middle;
    else low = middle + 1;
  }
  return listed[low] as number;
}
