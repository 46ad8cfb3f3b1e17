import { lowerBound, upperBound } from '../internal/sorted';
import type { AlgorithmAIteration } from './algorithm-a';
import type { AlgorithmAStart } from './algorithm-a-start';
import { WINSOR_MULTIPLE, WINSOR_SCALE_FACTOR } from './winsorise';

export type AlgorithmATolerance = number | 'third-digit';

interface IterationSettings {
  readonly tolerance: AlgorithmATolerance;
  readonly maxIterations: number;
  readonly trace: boolean;
}

interface IterationEnd {
  readonly location: number;
  readonly scale: number;
  readonly iterations: number;
  readonly converged: boolean;
  readonly zeroScale: boolean;
  readonly trace: readonly AlgorithmAIteration[] | null;
}

/** s* this far below its start, with nothing but ties inside the limits, is on its way to zero. */
const COLLAPSE = 1e-12;

/** Values as distances from the median in units of a power of two, with their running sums from the median outwards. */
interface Centred {
  readonly z: Float64Array;
  readonly sum: Float64Array;
  readonly squares: Float64Array;
}

interface State {
  readonly location: number;
  readonly scale: number;
}

interface Step extends State {
  readonly below: number;
  readonly above: number;
  readonly tied: boolean;
}

export function iterateAlgorithmA(
  sorted: Float64Array,
  start: AlgorithmAStart,
  settings: IterationSettings,
): IterationEnd {
  const unit = powerOfTwoNear(start.scale);
  const data = centre(sorted, start.location, unit);
  const toData = (state: State): State => ({
    location: start.location + state.location / unit,
    scale: state.scale / unit,
  });
  const trace: AlgorithmAIteration[] | null = settings.trace ? [] : null;
  const first = start.scale * unit;
  let state: State = { location: 0, scale: first };
  let lastChange = NaN;
  for (let iteration = 1; iteration <= settings.maxIterations; iteration += 1) {
    const next = winsorise(data, state);
    trace?.push(traceRow(iteration, toData(state), toData(next), next));
    if (next.scale === 0 || (next.tied && next.scale < COLLAPSE * first)) {
      const location = tiedValue(sorted, data, state);
      return { location, scale: 0, iterations: iteration, converged: true, zeroScale: true, trace };
    }
    const change = Math.max(Math.abs(next.location - state.location), Math.abs(next.scale - state.scale));
    const settled =
      settings.tolerance === 'third-digit'
        ? sameThirdDigit(toData(state), toData(next))
        : closeEnough(change, lastChange, settings.tolerance * next.scale);
    if (settled) return { ...toData(next), iterations: iteration, converged: true, zeroScale: false, trace };
    lastChange = change;
    state = next;
  }
  return { ...toData(state), iterations: settings.maxIterations, converged: false, zeroScale: false, trace };
}

/** A power of two whose product with the scale is near 1; bounded so that the power itself can be represented. */
function powerOfTwoNear(scale: number): number {
  return 2 ** -Math.min(900, Math.max(-1000, Math.floor(Math.log2(scale))));
}

function centre(sorted: Float64Array, location: number, unit: number): Centred {
  const n = sorted.length;
  const z = new Float64Array(n);
  const middle = location * unit;
  for (let i = 0; i < n; i += 1) z[i] = (sorted[i] as number) * unit - middle;
  const sum = new Float64Array(n + 1);
  const squares = new Float64Array(n + 1);
  const split = lowerBound(z, 0);
  accumulate(z, split, n, 1, sum, squares);
  accumulate(z, split, 0, -1, sum, squares);
  return { z, sum, squares };
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

/** One step of the algorithm: pull the values outside x* +- 1.5 s* to these limits, then mean and 1.134 sd. */
function winsorise(data: Centred, { location, scale }: State): Step {
  const { z, sum, squares } = data;
  const n = z.length;
  const lower = location - WINSOR_MULTIPLE * scale;
  const upper = location + WINSOR_MULTIPLE * scale;
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
    scale: WINSOR_SCALE_FACTOR * Math.sqrt(Math.max(0, total) / (n - 1)),
    below: low,
    above,
    tied,
  };
}

function tiedValue(sorted: Float64Array, data: Centred, { location, scale }: State): number {
  return sorted[lowerBound(data.z, location - WINSOR_MULTIPLE * scale)] as number;
}

/**
 * The change is below the limit, and so is the sum of those still to come. With few results or many ties each change
 * can be 0.9 of the one before; ten times the last change would then be missing if one looked at it alone.
 */
function closeEnough(change: number, lastChange: number, limit: number): boolean {
  if (change > limit) return false;
  if (change <= limit / 1000) return true;
  const rate = change / lastChange;
  return rate < 1 && (change * rate) / (1 - rate) <= limit;
}

/** The standard's own rule: the third significant figure of s*, and that decimal place of x*, stand still. */
function sameThirdDigit(before: State, after: State): boolean {
  const place = Math.floor(Math.log10(after.scale)) - 2;
  return (
    roundedAt(before.scale, place) === roundedAt(after.scale, place) &&
    roundedAt(before.location, place) === roundedAt(after.location, place)
  );
}

/** The number rounded to the decimal place 10^place, as a count of that unit. */
function roundedAt(value: number, place: number): number {
  if (place >= 0) return Math.round(value / 10 ** place);
  // 10 ** 308 is the largest power of ten, so a subnormal value is taken there in two steps.
  return Math.round(value * 10 ** Math.min(300, -place) * 10 ** Math.max(0, -place - 300));
}

function traceRow(iteration: number, from: State, to: State, step: Step): AlgorithmAIteration {
  const delta = WINSOR_MULTIPLE * from.scale;
  return {
    iteration,
    location: from.location,
    scale: from.scale,
    delta,
    lower: from.location - delta,
    upper: from.location + delta,
    countBelow: step.below,
    countAbove: step.above,
    newLocation: to.location,
    newScale: to.scale,
  };
}
