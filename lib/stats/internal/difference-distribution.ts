import { justBelow } from './neighbours';

/** Differences of pairs with weights, seen through what can be asked of them. */
export interface PairSet {
  /** The weight of all pairs with a difference of at most t. */
  readonly measure: (t: number) => number;
  readonly total: number;
  /** The smallest difference up to which the weight reaches the target, 0 < target <= total. */
  readonly locate: (target: number) => number;
  /** The largest difference below t; 0 when there is none. */
  readonly largestBelow: (t: number) => number;
  /** The smallest difference above t; Infinity when there is none. */
  readonly smallestAbove: (t: number) => number;
  /** Differences up to this far apart are equal. */
  readonly tolerance: number;
}

/** Where G reaches the level: between the jumps x0 and x1 of H, where it is g0 and g1. */
export interface Crossing {
  readonly x0: number;
  readonly x1: number;
  readonly g0: number;
  readonly g1: number;
  readonly x: number;
}

/** H(0): the share of pairs that are equal. */
export function shareOfEqual({ measure, total, tolerance }: PairSet): number {
  return measure(tolerance) / total;
}

/**
 * The inverse of G at a level above H(0). H is the share of pairs with a difference of at most x, a step function; G is
 * 0 at 0, at each jump half-way up the step (from H(0) on for the first), and straight in between.
 */
export function crossingOfG(pairs: PairSet, level: number, equalShare: number): Crossing {
  const { total, tolerance } = pairs;
  const jump = pairs.locate(level * total * (1 - 8 * Number.EPSILON));
  const gAt = (x: number) => (upTo(pairs, x) + Math.max(equalShare, below(pairs, x))) / 2;
  const g = gAt(jump);
  if (g < level) {
    const next = pairs.smallestAbove(jump + tolerance);
    return interpolate({ x0: jump, x1: next, g0: g, g1: gAt(next) }, level);
  }
  const previous = pairs.largestBelow(jump - tolerance);
  if (previous <= tolerance) return interpolate({ x0: 0, x1: jump, g0: 0, g1: g }, level);
  return interpolate({ x0: previous, x1: jump, g0: gAt(previous), g1: g }, level);
}

function interpolate(ends: Omit<Crossing, 'x'>, level: number): Crossing {
  const { x0, x1, g0, g1 } = ends;
  return { ...ends, x: x0 + ((level - g0) / (g1 - g0)) * (x1 - x0) };
}

function upTo({ measure, total, tolerance }: PairSet, x: number): number {
  return measure(tolerance > 0 ? x + tolerance : x) / total;
}

function below({ measure, total, tolerance }: PairSet, x: number): number {
  return measure(justBelow(Math.max(0, x - tolerance))) / total;
}
