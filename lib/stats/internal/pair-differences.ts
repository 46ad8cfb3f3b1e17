import { justAbove, justBelow } from './neighbours';
import { selectKth } from './select-kth';

/*
 * The n (n - 1) / 2 differences x[j] - x[i], i < j, of sorted values, without ever writing them all down. Rows and
 * columns of their matrix are in order, so that one walk along its staircase counts those up to a limit in O(n)
 * (Johnson and Mizoguchi 1978). All comparisons are of the rounded differences, which rounding leaves in order; the
 * results are therefore those of the full list, to the last bit.
 */

/** How many differences are at most t. */
export function countDifferences(sorted: Float64Array, t: number): number {
  const n = sorted.length;
  let count = 0;
  let i = 0;
  for (let j = 1; j < n; j += 1) {
    const x = sorted[j] as number;
    while (i < j && x - (sorted[i] as number) > t) i += 1;
    count += j - i;
  }
  return count;
}

/** The k-th smallest difference, from 1. O(n log n) at most in practice, O(n) memory. */
export function kthDifference(sorted: Float64Array, k: number): number {
  const measure = (t: number) => countDifferences(sorted, t);
  return locateDifference(sorted, { target: k, measure });
}

interface Wanted {
  /** How much is at most t; never falls with t. */
  readonly measure: (t: number) => number;
  readonly target: number;
}

interface Bracket {
  readonly low: number;
  readonly high: number;
  /** The measure of what lies below `low`, and up to `high`. */
  readonly before: number;
  readonly upTo: number;
}

/** So few differences are simply listed. */
const FEW = 4096;
const LARGEST_SAMPLE = 4096;

/**
 * The smallest difference whose measure reaches the target. A bracket of differences is kept that holds it; a regular
 * sample of those inside gives two new ends with the target most likely between them, and one walk each says whether
 * it is (after Dillencourt, Mount and Netanyahu 1992). A few rounds leave no more than n differences, which are listed.
 */
export function locateDifference(sorted: Float64Array, { measure, target }: Wanted): number {
  const n = sorted.length;
  const widest = (sorted[n - 1] as number) - (sorted[0] as number);
  let bracket: Bracket = { low: 0, high: widest, before: 0, upTo: measure(widest) };
  let inside = (n * (n - 1)) / 2;
  while (inside > Math.max(n, FEW) && bracket.low < bracket.high) {
    const sample = sampleInside(sorted, bracket, inside);
    const share = (target - bracket.before) / (bracket.upTo - bracket.before);
    const middle = Math.min(1, Math.max(0, share)) * sample.length;
    const margin = 2 + 3 * Math.sqrt((middle * (sample.length - middle)) / sample.length);
    const narrowed = narrow(
      bracket,
      at(sample, middle - margin),
      at(sample, middle + margin),
      measure,
      target,
    );
    const left = countInside(sorted, narrowed);
    // Few distinct differences can leave the ends where they were; then the middle one decides, and is left out.
    bracket =
      left > inside / 2
        ? narrow(narrowed, at(sample, middle), at(sample, middle), measure, target)
        : narrowed;
    inside = countInside(sorted, bracket);
  }
  if (bracket.low >= bracket.high) return bracket.low;
  return pickListed(listInside(sorted, bracket, inside), bracket, measure, target);
}

function at(sample: Float64Array, index: number): number {
  return sample[Math.min(sample.length - 1, Math.max(0, Math.floor(index)))] as number;
}

/** Places a and b, a <= b, inside the bracket and keeps the part that reaches the target. */
function narrow(
  { low, high, before, upTo }: Bracket,
  a: number,
  b: number,
  measure: (t: number) => number,
  target: number,
): Bracket {
  const beforeA = measure(justBelow(a));
  if (target <= beforeA) return { low, high: justBelow(a), before, upTo: beforeA };
  const upToB = measure(b);
  if (target > upToB) return { low: justAbove(b), high, before: upToB, upTo };
  return { low: a, high: b, before: beforeA, upTo: upToB };
}

function countInside(sorted: Float64Array, { low, high }: Bracket): number {
  return countDifferences(sorted, high) - (low > 0 ? countDifferences(sorted, justBelow(low)) : 0);
}

/** Every so many differences inside the bracket, in the order of rows; sorted by size. */
function sampleInside(sorted: Float64Array, bracket: Bracket, inside: number): Float64Array {
  const size = Math.min(LARGEST_SAMPLE, Math.max(256, Math.round(8 * Math.sqrt(sorted.length))));
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

function listInside(sorted: Float64Array, bracket: Bracket, inside: number): Float64Array {
  const listed = new Float64Array(inside);
  let taken = 0;
  walkInside(sorted, bracket, (j, first, end) => {
    for (let i = first; i < end; i += 1) {
      listed[taken] = (sorted[j] as number) - (sorted[i] as number);
      taken += 1;
    }
  });
  return listed;
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

function pickListed(
  listed: Float64Array,
  { before, upTo }: Bracket,
  measure: (t: number) => number,
  target: number,
): number {
  // Where each difference measures 1 the rank is known; else the measure is asked at O(log n) places.
  if (upTo - before === listed.length && Number.isInteger(target))
    return selectKth(listed, target - before - 1);
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
