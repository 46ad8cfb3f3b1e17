import { mergeOrder } from './merge-order';

/** Points ordered by x, then y, then place in the input; coordinates are whole numbers when `decimal` is true. */
export interface OrderedPoints {
  readonly count: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Coordinates less the middle of their range, rounded: what keys are made from. */
  readonly centredX: Float64Array;
  readonly centredY: Float64Array;
  /** Place in the input of each ordered point. */
  readonly source: Int32Array;
  /**
   * True when x and y are decimals that fit a common grid: then coordinates are counts of grid steps, differences are
   * exact and each slope is the correctly rounded value of the slope of the decimals.
   */
  readonly decimal: boolean;
  /** Pairs of points with the same x and y. */
  readonly identicalPairs: number;
  /** Pairs with the same x and different y. */
  readonly verticalPairs: number;
}

// Differences and sums of two coordinates stay below 2^53, where every whole number has its own double.
const GRID_LIMIT = 2 ** 51;
const MOST_DECIMALS = 22;
// Differences of values above 2^1000 could overflow; 2^-30 takes that away and, as a power of two, keeps the digits.
const LARGE = 2 ** 1000;
const SHRINK = 2 ** -30;

/** Orders the points and puts them on their decimal grid where there is one. */
export function orderPoints(x: readonly number[], y: readonly number[]): OrderedPoints {
  const step = decimalStep(x, y);
  const decimal = step !== null;
  const unit = step ?? 1 / binaryFactor(x, y);
  const place = (value: number) => (decimal ? Math.round(value * unit) : value / unit) + 0;
  // Ordered as placed: shrinking can make the smallest numbers equal.
  const placedX = Float64Array.from(x, place);
  const placedY = Float64Array.from(y, place);
  const source = orderOf(placedX, placedY);
  const count = source.length;
  const px = new Float64Array(count);
  const py = new Float64Array(count);
  for (let i = 0; i < count; i += 1) {
    px[i] = placedX[source[i] as number] as number;
    py[i] = placedY[source[i] as number] as number;
  }
  const centredX = centred(px, decimal);
  const centredY = centred(py, decimal);
  const places = decimal ? { x: centredX, y: centredY } : { x: px, y: py };
  return { count, ...places, centredX, centredY, source, decimal, ...coincidences(px, py) };
}

/** 10^k for the fewest decimals k that write every value, or null when the digits do not fit a double. */
function decimalStep(x: readonly number[], y: readonly number[]): number | null {
  let decimals = 0;
  let power = 1;
  for (const values of [x, y]) {
    for (let i = 0; i < values.length; i += 1) {
      const value = values[i] as number;
      // A whole number over a power of ten up to 10^22 is correctly rounded: equality says that value is that decimal.
      while (Math.round(value * power) / power !== value) {
        decimals += 1;
        power = 10 ** decimals;
        if (decimals > MOST_DECIMALS || Math.abs(value * power) > GRID_LIMIT) return null;
      }
    }
  }
  const fits = (values: readonly number[]) => values.every((value) => Math.abs(value) * power <= GRID_LIMIT);
  return fits(x) && fits(y) ? power : null;
}

function binaryFactor(x: readonly number[], y: readonly number[]): number {
  const large = (value: number) => Math.abs(value) > LARGE;
  return x.some(large) || y.some(large) ? SHRINK : 1;
}

/** Order by x, equal x by y, equal points by place in the input. */
function orderOf(x: Float64Array, y: Float64Array): Int32Array {
  const { order } = mergeOrder(x);
  const n = order.length;
  const byY = (a: number, b: number) => (y[a] as number) - (y[b] as number) || a - b;
  for (let start = 0; start < n;) {
    let end = start + 1;
    while (end < n && x[order[end] as number] === x[order[start] as number]) end += 1;
    if (end - start > 1) order.subarray(start, end).sort(byY);
    start = end;
  }
  return order;
}

/** The values less the middle of their range, so that products with a slope stay small; exact on a grid. */
function centred(values: Float64Array, whole: boolean): Float64Array {
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i] as number;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const middle = whole ? Math.round(low / 2 + high / 2) : (values[values.length >> 1] as number);
  return values.map((value) => value - middle);
}

function coincidences(x: Float64Array, y: Float64Array): { identicalPairs: number; verticalPairs: number } {
  let identicalPairs = 0;
  let sameX = 0;
  let xRun = 0;
  let pointRun = 0;
  for (let i = 1; i < x.length; i += 1) {
    xRun = x[i] === x[i - 1] ? xRun + 1 : 0;
    pointRun = xRun > 0 && y[i] === y[i - 1] ? pointRun + 1 : 0;
    sameX += xRun;
    identicalPairs += pointRun;
  }
  return { identicalPairs, verticalPairs: sameX - identicalPairs };
}
