/**
 * Walks over the pairs whose slope lies strictly between two brackets: those that stand in opposite order in the two.
 *
 * `lower` and `upper` are orders of the same points across the lower and the upper direction. With `targets` null
 * every pair is reported; otherwise those with the given numbers (ascending, from 0) in an order of no meaning.
 * Merge sort: O(n log n + pairs reported), three arrays of n.
 */
export function forTurnedPairs(
  lower: Int32Array,
  upper: Int32Array,
  targets: Float64Array | null,
  report: (a: number, b: number) => void,
): void {
  const n = lower.length;
  const placeInUpper = new Int32Array(n);
  for (let i = 0; i < n; i += 1) placeInUpper[upper[i] as number] = i;
  let places = new Int32Array(n);
  for (let i = 0; i < n; i += 1) places[i] = placeInUpper[lower[i] as number] as number;
  let next = new Int32Array(n);
  const walk: Walk = { targets, at: 0, seen: 0, report, upper };
  for (let width = 1; width < n; width *= 2) {
    for (let start = 0; start < n; start += 2 * width) {
      mergeReporting(places, next, [start, Math.min(start + width, n), Math.min(start + 2 * width, n)], walk);
    }
    [places, next] = [next, places];
  }
}

interface Walk {
  readonly targets: Float64Array | null;
  at: number;
  seen: number;
  readonly report: (a: number, b: number) => void;
  readonly upper: Int32Array;
}

function mergeReporting(
  from: Int32Array,
  to: Int32Array,
  [start, middle, end]: readonly [number, number, number],
  walk: Walk,
): void {
  let left = start;
  let right = middle;
  for (let out = start; out < end; out += 1) {
    if (left < middle && (right >= end || (from[left] as number) < (from[right] as number))) {
      to[out] = from[left] as number;
      left += 1;
      continue;
    }
    if (left < middle) reportTurned(from, left, middle, from[right] as number, walk);
    to[out] = from[right] as number;
    right += 1;
  }
}

/** The point at `right` overtakes all of left..middle-1. */
function reportTurned(from: Int32Array, left: number, middle: number, right: number, walk: Walk): void {
  const { upper, report, targets } = walk;
  const point = upper[right] as number;
  if (targets === null) {
    for (let i = left; i < middle; i += 1) report(upper[from[i] as number] as number, point);
    return;
  }
  const beyond = walk.seen + middle - left;
  while (walk.at < targets.length && (targets[walk.at] as number) < beyond) {
    report(upper[from[left + (targets[walk.at] as number) - walk.seen] as number] as number, point);
    walk.at += 1;
  }
  walk.seen = beyond;
}
