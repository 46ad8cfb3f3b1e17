import { binomialCdf, studentTUpperQuantile } from '../distributions';
import { checkFinite, representable } from '../internal/check-values';
import { algorithmA } from '../location-scale/algorithm-a';
import { mean } from '../location-scale/mean';
import { median } from '../location-scale/median';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ellipseOf, squaredRadius, type Ellipse, type EllipseFactor, type PairSpread } from './ellipse';
import { youdenWorking } from './youden-working';

export interface YoudenPoint {
  readonly a: number;
  readonly b: number;
}

export interface YoudenOptions {
  readonly spread?: 'classical' | 'robust';
  readonly ellipse?: EllipseFactor;
  readonly working?: boolean;
}

export interface YoudenLaboratory {
  /** Squared distance from the centre in the metric of the ellipses; null when all pairs lie on a line. */
  readonly squaredDistance: number | null;
  readonly outside95: boolean;
  readonly outside99: boolean;
  /** Part along the diagonal, what both results share: ((a - centre A) + (b - centre B)) / 2. */
  readonly shared: number;
  /** Part across it: ((a - centre A) - (b - centre B)) / 2. */
  readonly own: number;
}

export interface YoudenPairResult {
  readonly count: number;
  readonly centreA: number;
  readonly centreB: number;
  readonly sdA: number;
  readonly sdB: number;
  readonly correlation: number;
  readonly covariance: number;
  /** Mean of a - b. */
  readonly meanDifference: number;
  /** sqrt of the sum of (d - mean d)^2 / (2 (n - 1)), d = a - b: the random part of one result. */
  readonly randomSd: number;
  /** The same of a + b: random and systematic part together. */
  readonly totalSd: number;
  /** sqrt((total^2 - random^2) / 2), 0 when that is negative. */
  readonly systematicSd: number;
  readonly systematicSetToZero: boolean;
  /** Radius of Youden's circle: t times the random sd. */
  readonly radius95: number;
  readonly radius99: number;
  readonly ellipses: readonly [Ellipse, Ellipse];
  readonly laboratories: readonly YoudenLaboratory[];
  /** Laboratories with both results on the same side of the medians, of those on neither median. */
  readonly quadrants: {
    readonly same: number;
    readonly counted: number;
    /** One-sided: so many or more by chance, if there were no systematic errors. Null when none is counted. */
    readonly pValue: number | null;
  };
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Youden pair plot: the results of each laboratory on two similar items, one against the other.
 *
 * Points along the diagonal show systematic errors, points across it random ones. Give z scores, or results of items of
 * similar level. Two ellipses, 95 and 99 percent, show which laboratories lie outside what the others do.
 *
 * @param pairs - both results of each laboratory. Shape: n pairs. Unit: unit of the data, the same for both. Domain:
 *   finite; at least 4.
 * @param options.spread - of the ellipses: 'classical' (means, sds, Pearson) or 'robust' (algorithm A of each and of the
 *   sum and difference of the standardised results). Default 'classical'. randomSd and the like stay classical.
 * @param options.ellipse - 'prediction' (default: right for a new laboratory at any n) or 'chi-square'.
 * @param options.working - keep the steps. Default false.
 * @returns see YoudenPairResult; lengths in the unit of the data
 * @throws StatsError too-few-values below 4; not-finite; no-spread when all a, or all b, are equal or have no robust
 *   scale; no-convergence; out-of-domain
 *
 * Ties and equal values: allowed. All pairs on a line: the ellipse has no width, squaredDistance is null and nobody is
 *   outside. Order of input: kept.
 * Numerics: O(n log n). Prediction: 2 (n - 1)(n + 1) / (n (n - 2)) F; chi-square with 2 degrees of freedom.
 * Source: Youden 1959; Mandel and Lashof 1974; ISO 13528:2022, 10.5; robust correlation: Gnanadesikan and Kettenring
 *   1972, Biometrics 28, 81, in the form that keeps it between -1 and 1 (Huber 1981, 8.2).
 * Checked by: tests/stats/pairs-and-groups/pairs-and-groups.test.ts, tests/reference/interlaboratory (youden_*).
 * @example youdenPair([{ a: 2, b: 6.3 }, { a: 3.6, b: 6.6 }, { a: 1.8, b: 6.8 }, { a: 1.1, b: 6.8 }]).randomSd
 *   // => 0.81445
 */
export function youdenPair(pairs: readonly YoudenPoint[], options: YoudenOptions = {}): YoudenPairResult {
  checkPairs(pairs);
  const n = pairs.length;
  const [a, b] = [pairs.map((pair) => pair.a), pairs.map((pair) => pair.b)];
  const centred = options.spread === 'robust' ? robustSpread(a, b) : classicalSpread(a, b);
  const finite = (value: number) => representable('youdenPair', value);
  // Halves first: a sum of two large results may leave the number range where its half does not.
  const randomSd = finite(sd(pairs.map((pair) => pair.a / 2 - pair.b / 2)) * Math.SQRT2);
  const totalSd = finite(sd(pairs.map((pair) => pair.a / 2 + pair.b / 2)) * Math.SQRT2);
  const more = totalSd >= randomSd;
  const t = (tail: number) => studentTUpperQuantile(tail, n - 1);
  const factor = options.ellipse ?? 'prediction';
  const [near, far] = [squaredRadius(factor, 0.95, n), squaredRadius(factor, 0.99, n)];
  const facts = {
    count: n,
    ...centred,
    covariance: finite(centred.correlation * centred.sdA * centred.sdB),
    meanDifference: finite(mean(a) - mean(b)),
    randomSd,
    totalSd,
    systematicSd: more ? Math.sqrt(totalSd - randomSd) * Math.sqrt(totalSd / 2 + randomSd / 2) : 0,
    systematicSetToZero: !more,
    radius95: finite(randomSd * t(0.025)),
    radius99: finite(randomSd * t(0.005)),
    ellipses: [ellipseOf(centred, 0.95, near), ellipseOf(centred, 0.99, far)] as const,
    laboratories: pairs.map((pair) => place(pair, centred, near, far)),
    quadrants: quadrants(a, b),
  };
  return { ...facts, working: options.working ? youdenWorking(pairs, facts, options) : null };
}

interface CentredSpread extends PairSpread {
  readonly centreA: number;
  readonly centreB: number;
}

function checkPairs(pairs: readonly YoudenPoint[]): void {
  if (pairs.length < 4) {
    throw new StatsError('too-few-values', `youdenPair requires at least 4 pairs, found ${pairs.length}`);
  }
  for (const { a, b } of pairs) {
    checkFinite('youdenPair', 'first result', a);
    checkFinite('youdenPair', 'second result', b);
  }
}

function requireSpread(sdA: number, sdB: number): void {
  if (sdA === 0 || sdB === 0) {
    const which = sdA === 0 ? 'first' : 'second';
    throw new StatsError(
      'no-spread',
      `youdenPair requires ${which} results that differ, found a spread of 0`,
    );
  }
}

function classicalSpread(a: readonly number[], b: readonly number[]): CentredSpread {
  const [centreA, centreB, sdA, sdB] = [mean(a), mean(b), sd(a), sd(b)];
  requireSpread(sdA, sdB);
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) {
    sum += (((a[i] as number) - centreA) / sdA) * (((b[i] as number) - centreB) / sdB);
  }
  return { centreA, centreB, sdA, sdB, correlation: bounded(sum / (a.length - 1)) };
}

function robustSpread(a: readonly number[], b: readonly number[]): CentredSpread {
  const [first, second] = [algorithmA(a), algorithmA(b)];
  requireSpread(first.scale, second.scale);
  const u = a.map((value) => (value - first.location) / first.scale / 2);
  const v = b.map((value) => (value - second.location) / second.scale / 2);
  const sum = algorithmA(u.map((value, i) => value + (v[i] as number))).scale;
  const difference = algorithmA(u.map((value, i) => value - (v[i] as number))).scale;
  const largest = Math.max(sum, difference);
  const [s, d] = largest > 0 ? [(sum / largest) ** 2, (difference / largest) ** 2] : [1, 1];
  const [centreA, centreB] = [first.location, second.location];
  return { centreA, centreB, sdA: first.scale, sdB: second.scale, correlation: bounded((s - d) / (s + d)) };
}

/** Within -1 and 1, and exactly there when rounding alone keeps it away. */
function bounded(correlation: number): number {
  if (1 - Math.abs(correlation) < 1e-14) return Math.sign(correlation);
  return correlation;
}

function place({ a, b }: YoudenPoint, spread: CentredSpread, near: number, far: number): YoudenLaboratory {
  const [da, db] = [a - spread.centreA, b - spread.centreB];
  const [u, v] = [da / spread.sdA, db / spread.sdB];
  const { correlation: r } = spread;
  const line = Math.abs(r) === 1;
  // (u^2 - 2 r u v + v^2) / (1 - r^2) as a sum of squares, which is never negative.
  const squared = line ? null : (u + v) ** 2 / (2 * (1 + r)) + (u - v) ** 2 / (2 * (1 - r));
  return {
    squaredDistance: squared === null ? null : representable('youdenPair', squared),
    outside95: squared !== null && squared > near,
    outside99: squared !== null && squared > far,
    shared: da / 2 + db / 2,
    own: da / 2 - db / 2,
  };
}

function quadrants(a: readonly number[], b: readonly number[]): YoudenPairResult['quadrants'] {
  const [middleA, middleB] = [median(a), median(b)];
  let [same, counted] = [0, 0];
  for (let i = 0; i < a.length; i += 1) {
    const side = Math.sign((a[i] as number) - middleA) * Math.sign((b[i] as number) - middleB);
    if (side !== 0) counted += 1;
    if (side > 0) same += 1;
  }
  // P(X >= same) = P(X <= counted - same) for a fair coin.
  return { same, counted, pValue: counted === 0 ? null : binomialCdf(counted - same, counted, 0.5) };
}
