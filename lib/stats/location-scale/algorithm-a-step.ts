import { lowerBound, upperBound } from '../internal/sorted';
import { WINSOR_MULTIPLE, WINSOR_SCALE_FACTOR } from './winsorise';

/** Values as distances from the median in units of a power of two, with their running sums from the median outwards. */
export interface Centred {
  readonly unit: number;
  readonly z: Float64Array;
  readonly sum: Float64Array;
  readonly squares: Float64Array;
}

export interface State {
  readonly location: number;
  readonly scale: number;
}

export interface Step extends State {
  readonly below: number;
  readonly above: number;
  readonly tied: boolean;
}

/** A power of two whose product with the scale is near 1; bounded so that the power itself can be represented. */
function powerOfTwoNear(scale: number): number {
  return 2 ** -Math.min(900, Math.max(-1000, Math.floor(Math.log2(scale))));
}

export function centre(sorted: Float64Array, location: number, scale: number): Centred {
  const n = sorted.length;
  const unit = powerOfTwoNear(scale);
  const z = new Float64Array(n);
  const middle = location * unit;
  for (let i = 0; i < n; i += 1) z[i] = (sorted[i] as number) * unit - middle;
  const sum = new Float64Array(n + 1);
  const squares = new Float64Array(n + 1);
  const split = lowerBound(z, 0);
  accumulate(z, split, n, 1, sum, squares);
  accumulate(z, split, 0, -1, sum, squares);
  return { unit, z, sum, squares };
}

/**
 * sum[j] - sum[i] is the sum of z[i..j). Both halves start at the median, so that a wild value at an end enters
 * only sums that reach beyond it. Compensated as in compensatedSum.
 */
function accumulate(
  z: Float64Array,
  from: number,
  to: number,
  direction: 1 | -1,
  sum: Float64Array,
  squares: Float64Array,
): void {
  let total = 0;
  let lost = 0;
  let square = 0;
  let squareLost = 0;
  for (let i = from; i !== to; i += direction) {
    const x = z[direction === 1 ? i : i - 1] as number;
    const next = total + x;
    lost += Math.abs(total) >= Math.abs(x) ? total - next + x : x - next + total;
    total = next;
    const xx = x * x;
    const nextSquare = square + xx;
    squareLost += square >= xx ? square - nextSquare + xx : xx - nextSquare + square;
    square = nextSquare;
    sum[i + direction] = direction * (total + lost);
    squares[i + direction] = direction * (square + squareLost);
  }
}

/** How far out values stay as they are, and what makes up for the spread that winsorising takes away. */
export interface WinsorShape {
  readonly multiple: number;
  readonly factor: number;
}

export const ALGORITHM_A_SHAPE: WinsorShape = { multiple: WINSOR_MULTIPLE, factor: WINSOR_SCALE_FACTOR };

/** One step: pull the values outside x* +- 1.5 s* to these limits, then mean and 1.134 sd; or as `shape` has them. */
export function winsoriseCentred(
  data: Centred,
  { location, scale }: State,
  { multiple, factor }: WinsorShape = ALGORITHM_A_SHAPE,
): Step {
  const { z, sum, squares } = data;
  const n = z.length;
  const lower = location - multiple * scale;
  const upper = location + multiple * scale;
  const low = lowerBound(z, lower);
  const high = upperBound(z, upper);
  const above = n - high;
  const inside = (sum[high] as number) - (sum[low] as number);
  const mean = (low * lower + inside + above * upper) / n;
  const insideSquares = (squares[high] as number) - (squares[low] as number);
  const total = low * lower * lower + insideSquares + above * upper * upper - n * mean * mean;
  const tied = high > low && z[low] === z[high - 1];
  return {
    location: mean,
    scale: factor * Math.sqrt(Math.max(0, total) / (n - 1)),
    below: low,
    above,
    tied,
  };
}
