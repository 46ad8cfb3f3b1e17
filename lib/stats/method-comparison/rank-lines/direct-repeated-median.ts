import { medianInPlace } from '../../internal/median-in-place';
import { seededGenerator } from '../slopes/seeded-generator';

/** Up to this many points it is quicker to take the slopes of each point as they are. */
export const DIRECT_POINTS = 600;
/** So few medians are all worked out. */
const FEW = 40;
const SEED = 19_820_242;

/** Which half of a double holds its sign. */
const HIGH_WORD = new Uint32Array(Float64Array.of(-0).buffer)[1] === 0 ? 0 : 1;

interface Workplace {
  readonly slopes: Float64Array;
  /** The same memory in words of 32 bits. */
  readonly words: Uint32Array;
}

interface Points {
  readonly x: Float64Array;
  readonly y: Float64Array;
}

/**
 * The repeated median by its definition, null when all x are equal: O(n^2) time, O(n) memory. The median of the medians is
 * found by halving: one median is worked out, and counting says on which side of it the others are.
 */
export function directRepeatedMedian(points: Points): number | null {
  const slopes = new Float64Array(points.x.length);
  const work = { slopes, words: new Uint32Array(slopes.buffer) };
  const left = withPartners(points.x);
  if (left.length === 0) return null;
  const lowRank = (left.length - 1) >> 1;
  const highRank = left.length >> 1;
  const high = select(points, left, highRank, work);
  const low = lowRank === highRank ? high : select(points, left, lowRank, work);
  return medianInPlace(Float64Array.of(low, high));
}

function withPartners(x: Float64Array): number[] {
  const places = Array.from(x.keys());
  return x.every((value) => value === x[0]) ? [] : places;
}

/** The median with the given rank among those of the candidates. */
function select(points: Points, candidates: readonly number[], rank: number, work: Workplace): number {
  const random = seededGenerator(SEED);
  let left = candidates;
  let at = rank;
  while (left.length > FEW) {
    const pivot = medianOf(points, left[random() % left.length] as number, work);
    const below: number[] = [];
    const above: number[] = [];
    for (const i of left) {
      const side = sideOf(points, i, pivot, work);
      if (side < 0) below.push(i);
      else if (side > 0) above.push(i);
    }
    const same = left.length - below.length - above.length;
    if (at < below.length) left = below;
    else if (at < below.length + same) return pivot;
    else {
      at -= below.length + same;
      left = above;
    }
  }
  return Float64Array.from(left, (i) => medianOf(points, i, work)).sort()[at] as number;
}

/** Slopes from one point to all others with different x, less `pivot`, into `slopes`; gives their number. */
function writeSlopes({ x, y }: Points, i: number, pivot: number, slopes: Float64Array): number {
  const xi = x[i] as number;
  const yi = y[i] as number;
  let partners = 0;
  for (let j = 0; j < x.length; j += 1) {
    const run = (x[j] as number) - xi;
    if (run === 0) continue;
    // 0 is added so that no slope is the negative zero.
    slopes[partners] = ((y[j] as number) - yi) / run - pivot + 0;
    partners += 1;
  }
  return partners;
}

function medianOf(points: Points, i: number, work: Workplace): number {
  const partners = writeSlopes(points, i, 0, work.slopes);
  return medianInPlace(partners === work.slopes.length ? work.slopes : work.slopes.subarray(0, partners));
}

/** Is the median of a point below, at or above the pivot? */
function sideOf(points: Points, i: number, pivot: number, work: Workplace): number {
  const partners = writeSlopes(points, i, pivot, work.slopes);
  // Signs are read from the bits: the processor could not guess the branches of a comparison.
  let below = 0;
  for (let j = 0; j < partners; j += 1) below += (work.words[2 * j + HIGH_WORD] as number) >>> 31;
  if (below > partners >> 1) return -1;
  if (below <= (partners - 1) >> 1) {
    let same = 0;
    for (let j = 0; j < partners; j += 1) if (work.slopes[j] === 0) same += 1;
    if (below + same <= (partners - 1) >> 1) return 1;
  }
  return Math.sign(medianOf(points, i, work) - pivot);
}
