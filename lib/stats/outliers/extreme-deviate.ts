import { studentTSurvival, studentTUpperQuantile } from '../distributions';

/*
 * Null distribution of the largest studentised deviate of a normal sample, by recursion over the sample size.
 *
 * With the largest value at r = (max - mean) / S sqrt(n / (n - 1)), S^2 the sum of squares, r of any given value has
 * density proportional to (1 - r^2)^((n - 4) / 2); given r, the other n - 1 values are a normal sample of their own,
 * and the given value is the largest if theirs has r' <= sqrt(n) t / (n - 2), t = r sqrt(n - 2) / sqrt(1 - r^2).
 * So F_n(r) = n times the integral of that density times F_(n-1)(r'(r)) (Pearson and Chandra Sekar 1936; Grubbs 1950).
 * Angles theta = asin(r) are used: the density there is proportional to cos(theta)^(n - 3), smooth for any n.
 */

/** F_n as a table over angles, with the upper end by the exact tail of Student's t. */
export interface ExtremeDeviate {
  readonly n: number;
  /** Below this angle F_n is 0, or so small that it does not matter. */
  readonly lowest: number;
  /** From here on 1 - F_n = n P(t_(n-2) > t): no second value can be as large. */
  readonly upper: number;
  /** F_n at upper - (upper - lowest) (i / CELLS)^2, and its derivative by i / CELLS. */
  readonly cdf: Float64Array;
  readonly slope: Float64Array;
}

const CELLS = 240;
/** Where n P is this small, two values beyond have a probability below its square: 1 - F_n = n P is exact. */
const FAR = 1e-7;
/** F_n is below exp(-NEAR) where n P is above NEAR, since deviates of one sample are negatively associated. */
const NEAR = 20;
/** Gauss-Legendre nodes and weights on (0, 1), three points. */
const NODES = [0.5 - Math.sqrt(0.15), 0.5, 0.5 + Math.sqrt(0.15)] as const;
const WEIGHTS = [5 / 18, 8 / 18, 5 / 18] as const;

/** So many steps of the recursion are enough: each lessens an error at nP by one more factor nP / k. */
const STEPS = 30;

/** The distribution for n values, n >= 3. */
export function extremeDeviate(n: number): ExtremeDeviate {
  const first = Math.max(3, n - STEPS);
  let found = first === 3 ? extremeOfThree() : asIfIndependent(first);
  for (let size = first + 1; size <= n; size += 1) found = nextSize(found);
  return found;
}

/** Three values: r is uniform in its angle between 30 and 90 degrees. */
function extremeOfThree(): ExtremeDeviate {
  const [lowest, upper] = [Math.PI / 6, Math.PI / 2];
  const cdf = new Float64Array(CELLS + 1);
  const slope = new Float64Array(CELLS + 1);
  for (let i = 0; i <= CELLS; i += 1) {
    const s = i / CELLS;
    cdf[i] = 1 - s * s;
    slope[i] = -2 * s;
  }
  return { n: 3, lowest, upper, cdf, slope };
}

/** Density of the angle of one given value among n: cos^(n - 3) over its integral from -pi/2 to pi/2. */
export function angleDensity(n: number): (theta: number) => number {
  let integral = n % 2 === 1 ? Math.PI : 2;
  for (let k = n % 2 === 1 ? 2 : 3; k <= n - 3; k += 2) integral *= (k - 1) / k;
  return (theta) => Math.cos(theta) ** (n - 3) / integral;
}

/** Angle of the largest of the other n - 1 values below which a value at theta is the largest of all n. */
export function nextAngle(n: number, theta: number): number {
  const r = Math.tan(theta) * Math.sqrt(n / (n - 2));
  return r >= 1 ? Math.PI / 2 : Math.asin(r);
}

/** The range of angles that matters: F_n is 0 below, and known exactly above. */
function rangeOf(n: number): { lowest: number; upper: number } {
  const angleOf = (share: number) => Math.atan(studentTUpperQuantile(share / n, n - 2) / Math.sqrt(n - 2));
  const possible = Math.asin(1 / (n - 1));
  return {
    lowest: n > 2 * NEAR ? Math.max(possible, angleOf(NEAR)) : possible,
    upper: Math.min(Math.atan(Math.sqrt((n - 2) / n)), angleOf(FAR)),
  };
}

/** Where the recursion starts for large n: the deviates taken as independent, which is nearly true there. */
function asIfIndependent(n: number): ExtremeDeviate {
  const { lowest, upper } = rangeOf(n);
  const density = angleDensity(n);
  const cdf = new Float64Array(CELLS + 1);
  const slope = new Float64Array(CELLS + 1);
  for (let i = 0; i <= CELLS; i += 1) {
    const s = i / CELLS;
    const theta = upper - (upper - lowest) * s * s;
    const below = 1 - tailAt(n, theta);
    cdf[i] = below ** n;
    slope[i] = -2 * (upper - lowest) * s * n * density(theta) * below ** (n - 1);
  }
  return { n, lowest, upper, cdf, slope };
}

/** From the upper end downwards, so that what is inexact at small angles never reaches the tail. */
function nextSize(previous: ExtremeDeviate): ExtremeDeviate {
  const n = previous.n + 1;
  const { lowest, upper } = rangeOf(n);
  const density = angleDensity(n);
  const span = upper - lowest;
  const rate = (s: number) => {
    const theta = upper - span * s * s;
    return -2 * span * s * n * density(theta) * cdfAt(previous, nextAngle(n, theta));
  };
  const cdf = new Float64Array(CELLS + 1);
  const slope = new Float64Array(CELLS + 1);
  let value = 1 - n * tailAt(n, upper);
  for (let i = 0; i <= CELLS; i += 1) {
    cdf[i] = Math.max(0, value);
    slope[i] = value > 0 ? rate(i / CELLS) : 0;
    if (value <= 0) continue;
    let step = 0;
    for (let k = 0; k < 3; k += 1) step += (WEIGHTS[k] as number) * rate((i + (NODES[k] as number)) / CELLS);
    value += step / CELLS;
  }
  return { n, lowest, upper, cdf, slope };
}

/** Probability that one given value has an angle above theta. */
function tailAt(n: number, theta: number): number {
  return theta >= Math.PI / 2 ? 0 : studentTSurvival(Math.tan(theta) * Math.sqrt(n - 2), n - 2);
}

/** Probability that the largest value has an angle of at most theta. */
export function cdfAt(table: ExtremeDeviate, theta: number): number {
  const { n, lowest, upper } = table;
  if (theta <= lowest) return 0;
  if (theta >= upper) return 1 - n * tailAt(n, theta);
  const place = Math.sqrt((upper - theta) / (upper - lowest)) * CELLS;
  const i = Math.min(CELLS - 1, Math.floor(place));
  return hermite(table, i, place - i);
}

/** Cubic through the values and slopes at both ends of cell i. */
function hermite({ cdf, slope }: ExtremeDeviate, i: number, u: number): number {
  const [y0, y1] = [cdf[i] as number, cdf[i + 1] as number];
  const [d0, d1] = [(slope[i] as number) / CELLS, (slope[i + 1] as number) / CELLS];
  const v = 1 - u;
  return y0 * v * v * (1 + 2 * u) + y1 * u * u * (1 + 2 * v) + u * v * (d0 * v - d1 * u);
}
