import { normalLogCdf } from '../distributions/normal';
import { StatsError } from '../stats-error';

export interface CensoredData {
  readonly values: readonly number[];
  /** The true value is below. */
  readonly left: readonly number[];
  /** The true value is above. */
  readonly right: readonly number[];
}

interface Found {
  readonly location: number;
  readonly scale: number;
  readonly locationStandardError: number;
  readonly scaleStandardError: number;
  readonly logLikelihood: number;
  readonly iterations: number;
}

/** a = location / scale and h = 1 / scale, in which the log likelihood is concave. */
interface Point {
  readonly a: number;
  readonly h: number;
}

interface Slope {
  readonly value: number;
  readonly a: number;
  readonly h: number;
  /** Negative second derivatives. */
  readonly aa: number;
  readonly ah: number;
  readonly hh: number;
}

const HALF_LOG_TWO_PI = 0.9189385332046727;
const MOST_STEPS = 1000;
/** Twice the gain of likelihood that a step promised; its root is how far it went in standard errors. */
const SETTLED = 1e-22;
const NEAR = 1e-8;
/** So far out Mills' ratio is its first two terms to the last digit. */
const FAR = -1e5;

export function climb(data: CensoredData): Found {
  let at: Point = { a: 0, h: 1 };
  let slope = slopeAt(data, at);
  for (let step = 1; step <= MOST_STEPS; step += 1) {
    const { a: da, h: dh } = newtonStep(slope);
    const decrement = slope.a * da + slope.h * dh;
    if (!Number.isFinite(decrement)) break;
    let share = 1;
    let next = at;
    let nextSlope = slope;
    while (share > 0) {
      next = { a: at.a + share * da, h: at.h + share * dh };
      if (next.h > 0) {
        nextSlope = slopeAt(data, next);
        // So near the top the heights differ by rounding alone, and the full step is good.
        if (decrement < NEAR || nextSlope.value >= slope.value + 0.1 * share * decrement) break;
      }
      share /= 2;
    }
    at = next;
    slope = nextSlope;
    if (decrement <= SETTLED) return resultAt(at, slope, step);
  }
  throw new StatsError('no-convergence', `censoredLikelihood did not settle within ${MOST_STEPS} steps`);
}

function newtonStep({ a, h, aa, ah, hh }: Slope): Point {
  const determinant = aa * hh - ah * ah;
  return { a: (a * hh - h * ah) / determinant, h: (h * aa - a * ah) / determinant };
}

function slopeAt({ values, left, right }: CensoredData, { a, h }: Point): Slope {
  const sums = { value: 0, a: 0, h: 0, aa: 0, ah: 0, hh: 0 };
  const add = (x: number, value: number, pull: number, curve: number) => {
    sums.value += value;
    sums.a += pull;
    sums.h -= pull * x;
    sums.aa += curve;
    sums.ah -= curve * x;
    sums.hh += curve * x * x;
  };
  for (const x of values) {
    const u = h * x - a;
    add(x, Math.log(h) - (u * u) / 2 - HALF_LOG_TWO_PI, u, 1);
    sums.h += 1 / h;
    sums.hh += 1 / (h * h);
  }
  // A greater-than result is the mirror image of a less-than result.
  const addTail = (x: number, side: 1 | -1) => {
    const u = side * (h * x - a);
    const log = normalLogCdf(u);
    if (u < FAR) return add(x, log, side * (u + 1 / u), 1);
    const ratio = Math.exp(-(u * u) / 2 - HALF_LOG_TWO_PI - log);
    add(x, log, -side * ratio, Math.max(0, ratio * (u + ratio)));
  };
  for (const x of left) addTail(x, 1);
  for (const x of right) addTail(x, -1);
  return sums;
}

function resultAt({ a, h }: Point, { value, aa, ah, hh }: Slope, iterations: number): Found {
  const determinant = aa * hh - ah * ah;
  const [varianceA, covariance, varianceH] = [hh / determinant, -ah / determinant, aa / determinant];
  // location = a / h and scale = 1 / h to first order.
  const location = a / h;
  const variance = (varianceA - 2 * location * covariance + location * location * varianceH) / (h * h);
  return {
    location,
    scale: 1 / h,
    locationStandardError: Math.sqrt(variance),
    scaleStandardError: Math.sqrt(varianceH) / (h * h),
    logLikelihood: value,
    iterations,
  };
}
