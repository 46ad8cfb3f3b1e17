import { chiSquareUpperQuantile, fUpperQuantile } from '../distributions';

/** 'prediction': holds one new laboratory with the level stated. 'chi-square': as if the parameters were known. */
export type EllipseFactor = 'prediction' | 'chi-square';

export interface Ellipse {
  readonly level: 0.95 | 0.99;
  readonly semiMajor: number;
  readonly semiMinor: number;
  /** Of the major axis against the first axis, in degrees, -90 to 90. */
  readonly angleDegrees: number;
}

/** Standard deviations of both results and their correlation, in the unit of the data. */
export interface PairSpread {
  readonly sdA: number;
  readonly sdB: number;
  readonly correlation: number;
}

/** The squared distance at which the ellipse of a level lies. n >= 3 for 'prediction'. */
export function squaredRadius(factor: EllipseFactor, level: number, n: number): number {
  if (factor === 'chi-square') return chiSquareUpperQuantile(1 - level, 2);
  return ((2 * (n - 1) * (n + 1)) / (n * (n - 2))) * fUpperQuantile(1 - level, 2, n - 2);
}

/** The ellipse of a squared distance. Standard deviations are taken relative to the larger one. */
export function ellipseOf(
  { sdA, sdB, correlation }: PairSpread,
  level: 0.95 | 0.99,
  squared: number,
): Ellipse {
  const unit = Math.max(sdA, sdB);
  const [a, b] = [sdA / unit, sdB / unit];
  const half = (a * a - b * b) / 2;
  const cross = correlation * a * b;
  const reach = Math.hypot(half, cross);
  const largest = (a * a + b * b) / 2 + reach;
  // The smaller eigenvalue from the determinant: no difference of nearly equal numbers.
  const smallest = (a * a * b * b * (1 - correlation) * (1 + correlation)) / largest;
  return {
    level,
    semiMajor: unit * Math.sqrt(largest * squared),
    semiMinor: unit * Math.sqrt(Math.max(0, smallest) * squared),
    angleDegrees: (Math.atan2(cross, half) * 90) / Math.PI,
  };
}
