import { studentTSurvival, studentTUpperQuantile } from '../distributions';
import { representable } from './check-values';
import { compensatedSum, sampleSd, scaledMean } from './sums';

/** A straight line of y on x with its test against zero slope. */
export interface SimpleTrend {
  readonly slope: number;
  readonly intercept: number;
  /** Standard error of the slope. */
  readonly standardError: number;
  readonly degreesOfFreedom: number;
  /** slope / standardError; null when the points lie exactly on a line. */
  readonly t: number | null;
  /** Two-sided; null with `t`. */
  readonly pValue: number | null;
  /** 95 percent interval of the slope. */
  readonly lower: number;
  readonly upper: number;
}

/**
 * Least squares of checked values, x not all equal, at least 3 points. Values are brought to units near 1 first, so
 * that no square overflows. A sum of squares below the rounding of the data counts as zero.
 */
export function simpleTrend(caller: string, x: readonly number[], y: readonly number[]): SimpleTrend {
  const n = x.length;
  const [xs, ys] = [standardised(x), standardised(y)];
  const xx = compensatedSum(n, (i) => (xs.values[i] as number) ** 2);
  const xy = compensatedSum(n, (i) => (xs.values[i] as number) * (ys.values[i] as number));
  const b = xy / xx;
  const rest = compensatedSum(n, (i) => ((ys.values[i] as number) - b * (xs.values[i] as number)) ** 2);
  const exact = rest <= n * (8 * ys.rounding) ** 2;
  const error = exact ? 0 : Math.sqrt(rest / (n - 2) / xx);
  const perUnit = (value: number) => representable(caller, (value * ys.unit) / xs.unit);
  const t = error > 0 ? b / error : null;
  const reach = error * studentTUpperQuantile(0.025, n - 2);
  const slope = perUnit(b);
  return {
    slope,
    intercept: representable(caller, ys.centre - slope * xs.centre),
    standardError: perUnit(error),
    degreesOfFreedom: n - 2,
    t,
    pValue: t === null ? null : Math.min(1, 2 * studentTSurvival(Math.abs(t), n - 2)),
    lower: perUnit(b - reach),
    upper: perUnit(b + reach),
  };
}

interface Standardised {
  readonly values: Float64Array;
  readonly centre: number;
  readonly unit: number;
  /** Rounding of the data in this unit. */
  readonly rounding: number;
}

function standardised(values: readonly number[]): Standardised {
  const sd = sampleSd(values);
  const unit = sd > 0 && Number.isFinite(sd) ? sd : 1;
  const scaled = Float64Array.from(values, (value) => value / unit);
  const centre = scaledMean(scaled, 1);
  const largest = scaled.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  return {
    values: scaled.map((value) => value - centre),
    centre: centre * unit,
    unit,
    rounding: largest * Number.EPSILON,
  };
}
