import { lastPlace, signOfProductDifference, toWholeUnits } from './exact-sign';
import { mergeOrder, type CloseCall } from './merge-order';
import type { OrderedPoints } from './point-grid';

/** A slope given as rise over run (run above zero), with the pair of points that it belongs to, if any. */
export interface Pivot {
  readonly rise: number;
  readonly run: number;
  /** Ordered points whose slope this is; null when rise and run are exact as they stand. */
  readonly pair: readonly [number, number] | null;
  /** True for the negative of the slope of the pair. */
  readonly mirrored: boolean;
}

/** How many pairs lie below and on a slope, and the order of the points across that direction. */
export interface Bracket {
  /** The slope as a double; -Infinity and Infinity for the two ends. */
  readonly slope: number;
  /** Pairs with different x whose slope is less. */
  readonly below: number;
  /** Pairs with different x whose slope is the same, exactly. */
  readonly equal: number;
  /** Order across the direction in which pairs of exactly this slope are not yet turned round (upper end). */
  readonly asUpper: Int32Array;
  /** The same with those pairs turned round (lower end). */
  readonly asLower: Int32Array;
}

/** Largest size of a product of grid steps that is kept exactly. */
const EXACT = 2 ** 53;

/**
 * Orders the points by y - slope x, and so counts the pairs below and on the slope: O(n log n).
 *
 * `base` is a bracket at a lower slope; the nearer it is, the less there is to sort.
 */
export function bracketAt(points: OrderedPoints, pivot: Pivot, base: Bracket): Bracket {
  const { keys, tolerance } = keysAcross(points, pivot);
  const sign = exactSign(points, pivot);
  const closeCall: CloseCall = (a, b) => sign(a, b) < 0;
  const { order, inversions } =
    tolerance === 0 ? mergeOrder(keys, base.asLower) : mergeOrder(keys, base.asLower, tolerance, closeCall);
  const { asLower, equal } = turnTies(points, order, (a, b) => {
    const gap = (keys[b] as number) - (keys[a] as number);
    return gap <= tolerance && (tolerance === 0 || sign(a, b) === 0);
  });
  const below = base.below + base.equal + inversions;
  return { slope: pivot.rise / pivot.run, below, equal, asUpper: order, asLower };
}

/** Turns the runs of points on one line of the direction round, and counts their pairs. */
function turnTies(
  points: OrderedPoints,
  order: Int32Array,
  same: (a: number, b: number) => boolean,
): { asLower: Int32Array; equal: number } {
  const { count, x, y } = points;
  const asLower = order.slice();
  let equal = -points.identicalPairs;
  for (let start = 0; start < count;) {
    let end = start + 1;
    while (end < count && same(order[end - 1] as number, order[end] as number)) end += 1;
    const size = end - start;
    if (size > 1) {
      equal += (size * (size - 1)) / 2;
      turnRound(asLower, start, end, x, y);
    }
    start = end;
  }
  return { asLower, equal };
}

/** Reverses a run of points on one line, but leaves identical points as they were. */
function turnRound(order: Int32Array, start: number, end: number, x: Float64Array, y: Float64Array): void {
  order.subarray(start, end).reverse();
  for (let from = start; from < end;) {
    const first = order[from] as number;
    let to = from + 1;
    while (to < end && x[order[to] as number] === x[first] && y[order[to] as number] === y[first]) to += 1;
    if (to - from > 1) order.subarray(from, to).reverse();
    from = to;
  }
}

/** y run - x rise for every point, and how far apart two of them must be for their order to be certain. */
function keysAcross(points: OrderedPoints, pivot: Pivot): { keys: Float64Array; tolerance: number } {
  const { count, centredX: x, centredY: y, decimal } = points;
  const largest = largestSize(points);
  const exact = decimal && largest.y * pivot.run + largest.x * Math.abs(pivot.rise) < EXACT;
  const size = exact ? 1 : Math.max(pivot.run, Math.abs(pivot.rise));
  const run = pivot.run / size;
  const rise = pivot.rise / size;
  const keys = new Float64Array(count);
  for (let i = 0; i < count; i += 1) keys[i] = (y[i] as number) * run - (x[i] as number) * rise;
  // A rounding in each centred value, two in the pivot, two products, one difference, each 2^-53 of the size: 2^-48
  // covers both keys. A pivot or product that falls below the normal numbers is off by half of 2^-1074.
  const underflow = 2 ** -1070 * (1 + largest.x + largest.y);
  const bound = 2 ** -48 * (largest.y * run + largest.x * Math.abs(rise)) + underflow;
  return { keys, tolerance: exact ? 0 : bound };
}

const sizes = new WeakMap<OrderedPoints, { x: number; y: number }>();

function largestSize(points: OrderedPoints): { x: number; y: number } {
  const known = sizes.get(points);
  if (known) return known;
  const size = { x: 0, y: 0 };
  for (let i = 0; i < points.count; i += 1) {
    size.x = Math.max(size.x, Math.abs(points.centredX[i] as number));
    size.y = Math.max(size.y, Math.abs(points.centredY[i] as number));
  }
  sizes.set(points, size);
  return size;
}

/** Sign of the key of b minus the key of a, without rounding. */
function exactSign(points: OrderedPoints, pivot: Pivot): (a: number, b: number) => number {
  const { x, y, decimal } = points;
  if (decimal) {
    // Both differences are whole numbers below 2^53, so only their products need care.
    return (a, b) => {
      const dy = (y[b] as number) - (y[a] as number);
      const dx = (x[b] as number) - (x[a] as number);
      return signOfProductDifference(dy, pivot.run, dx, pivot.rise);
    };
  }
  const { pair, mirrored } = pivot;
  let whole: WholeUnits | null = null;
  let rise = 0n;
  let run = 0n;
  return (a, b) => {
    if (x[a] === x[b] && y[a] === y[b]) return 0;
    // The pair of the pivot itself is the one close call that always happens.
    if (pair !== null && !mirrored && pair[0] + pair[1] === a + b && (pair[0] === a || pair[0] === b))
      return 0;
    if (whole === null) {
      whole = wholeUnits(points);
      if (pair === null) [rise, run] = wholeRatio(pivot);
      else {
        run = whole.x(pair[1]) - whole.x(pair[0]);
        rise = whole.y(pair[1]) - whole.y(pair[0]);
      }
      if (mirrored) rise = -rise;
    }
    const gap = (whole.y(b) - whole.y(a)) * run - (whole.x(b) - whole.x(a)) * rise;
    return gap > 0n ? 1 : gap < 0n ? -1 : 0;
  };
}

function wholeRatio({ rise, run }: Pivot): [bigint, bigint] {
  const place = Math.min(lastPlace(run), rise === 0 ? Infinity : lastPlace(rise));
  return [rise === 0 ? 0n : toWholeUnits(rise, place), toWholeUnits(run, place)];
}

interface WholeUnits {
  readonly x: (i: number) => bigint;
  readonly y: (i: number) => bigint;
}

const wholes = new WeakMap<OrderedPoints, WholeUnits>();

/** Coordinates as whole numbers of the smallest binary place among them. */
function wholeUnits(points: OrderedPoints): WholeUnits {
  const known = wholes.get(points);
  if (known) return known;
  const { x, y } = points;
  let place = Infinity;
  for (const values of [x, y])
    for (let i = 0; i < values.length; i += 1)
      if (values[i] !== 0) place = Math.min(place, lastPlace(values[i] as number));
  const whole = (value: number) => (value === 0 ? 0n : toWholeUnits(value, place));
  const made = { x: (i: number) => whole(x[i] as number), y: (i: number) => whole(y[i] as number) };
  wholes.set(points, made);
  return made;
}
