import { lowerBound } from '../internal/sorted';
import type { AlgorithmAIteration } from './algorithm-a';
import type { AlgorithmAStart } from './algorithm-a-start';
import {
  ALGORITHM_A_SHAPE,
  centre,
  winsoriseCentred,
  type Centred,
  type State,
  type Step,
  type WinsorShape,
} from './algorithm-a-step';

export type AlgorithmATolerance = number | 'third-digit';

interface IterationSettings {
  readonly tolerance: AlgorithmATolerance;
  readonly maxIterations: number;
  readonly trace: boolean;
  /** Default that of Algorithm A. */
  readonly shape?: WinsorShape;
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

export function iterateAlgorithmA(
  sorted: Float64Array,
  start: AlgorithmAStart,
  settings: IterationSettings,
): IterationEnd {
  const { shape = ALGORITHM_A_SHAPE } = settings;
  let data = centre(sorted, start.location, start.scale);
  const collapsed = COLLAPSE * start.scale;
  const trace: AlgorithmAIteration[] | null = settings.trace ? [] : null;
  let state: State = { location: 0, scale: start.scale * data.unit };
  let lastChange = NaN;
  for (let iteration = 1; iteration <= settings.maxIterations; iteration += 1) {
    const from = toData(start, data, state);
    let next = winsoriseCentred(data, state, shape);
    if (!Number.isFinite(next.scale)) {
      // s* has grown so far above its start that squares left the number range: go on in units of the present s*.
      const finer = data.unit;
      data = centre(sorted, start.location, from.scale);
      const ratio = data.unit / finer;
      state = { location: state.location * ratio, scale: state.scale * ratio };
      lastChange *= ratio;
      next = winsoriseCentred(data, state, shape);
    }
    const to = toData(start, data, next);
    trace?.push(traceRow({ iteration, from, to, step: next, multiple: shape.multiple }));
    if (next.scale === 0 || (next.tied && to.scale < collapsed)) {
      const location = tiedValue(sorted, data, state, shape.multiple);
      return { location, scale: 0, iterations: iteration, converged: true, zeroScale: true, trace };
    }
    const change = Math.max(Math.abs(next.location - state.location), Math.abs(next.scale - state.scale));
    const settled =
      settings.tolerance === 'third-digit'
        ? sameThirdDigit(from, to)
        : closeEnough(change, lastChange, settings.tolerance * next.scale);
    if (settled) return { ...to, iterations: iteration, converged: true, zeroScale: false, trace };
    lastChange = change;
    state = next;
  }
  const reached = toData(start, data, state);
  return { ...reached, iterations: settings.maxIterations, converged: false, zeroScale: false, trace };
}

function toData(start: AlgorithmAStart, { unit }: Centred, { location, scale }: State): State {
  return { location: start.location + location / unit, scale: scale / unit };
}

function tiedValue(
  sorted: Float64Array,
  data: Centred,
  { location, scale }: State,
  multiple: number,
): number {
  return sorted[lowerBound(data.z, location - multiple * scale)] as number;
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

interface TraceRow {
  readonly iteration: number;
  readonly from: State;
  readonly to: State;
  readonly step: Step;
  readonly multiple: number;
}

function traceRow({ iteration, from, to, step, multiple }: TraceRow): AlgorithmAIteration {
  // Kept finite for JSON; a limit at the end of the number range moves no value.
  const bounded = (x: number) => Math.min(Number.MAX_VALUE, Math.max(-Number.MAX_VALUE, x));
  const delta = bounded(multiple * from.scale);
  return {
    iteration,
    location: from.location,
    scale: from.scale,
    delta,
    lower: bounded(from.location - delta),
    upper: bounded(from.location + delta),
    countBelow: step.below,
    countAbove: step.above,
    newLocation: to.location,
    newScale: bounded(to.scale),
  };
}
