import { compensatedSum } from '../../internal/sums';
import { StatsError } from '../../stats-error';

export interface YorkData {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly ux: readonly number[];
  readonly uy: readonly number[];
  readonly correlation: readonly number[];
}

export interface YorkState {
  readonly slope: number;
  readonly intercept: number;
  readonly slopeSe: number;
  readonly interceptSe: number;
  readonly covariance: number;
  readonly chiSquare: number;
}

const NOTHING = { intercept: 0, slopeSe: 0, interceptSe: 0, covariance: 0, chiSquare: 0 };

/** Start from the least squares slope; any slope near the answer would do. */
export function startOfYork({ x, y }: YorkData): YorkState {
  const n = x.length;
  const meanX = compensatedSum(n, (i) => (x[i] as number) / n);
  const meanY = compensatedSum(n, (i) => (y[i] as number) / n);
  const sxx = compensatedSum(n, (i) => ((x[i] as number) - meanX) ** 2);
  const sxy = compensatedSum(n, (i) => ((x[i] as number) - meanX) * ((y[i] as number) - meanY));
  const slope = sxy / sxx;
  if (!Number.isFinite(slope)) {
    throw new StatsError(
      'no-spread',
      'york finds no direction in the data: x does not vary, or out of the number range',
    );
  }
  return { ...NOTHING, slope };
}

/** One step of the iteration: the slope from weights at the last slope, and what belongs to it. */
export function yorkStep({ x, y, ux, uy, correlation }: YorkData, b: number): YorkState {
  const n = x.length;
  const at = (values: ArrayLike<number>, i: number) => values[i] as number;
  const weights = Float64Array.from(x, (_, i) => {
    const across = b * at(ux, i);
    return 1 / (at(uy, i) ** 2 + across ** 2 - 2 * across * at(correlation, i) * at(uy, i));
  });
  const total = compensatedSum(n, (i) => at(weights, i));
  const meanOf = (values: ArrayLike<number>) =>
    compensatedSum(n, (i) => at(weights, i) * at(values, i)) / total;
  const [meanX, meanY] = [meanOf(x), meanOf(y)];
  const beta = Float64Array.from(x, (value, i) => {
    const u = value - meanX;
    const v = at(y, i) - meanY;
    const shared = at(correlation, i) * at(ux, i) * at(uy, i);
    return at(weights, i) * (u * at(uy, i) ** 2 + b * v * at(ux, i) ** 2 - (b * u + v) * shared);
  });
  const product = (values: readonly number[], mean: number) =>
    compensatedSum(n, (i) => at(weights, i) * at(beta, i) * (at(values, i) - mean));
  const slope = product(y, meanY) / product(x, meanX);
  if (Number.isNaN(slope)) throw new StatsError('no-spread', 'york finds no direction in the data');
  const intercept = meanY - slope * meanX;
  const meanBeta = meanOf(beta);
  const adjusted = compensatedSum(n, (i) => at(weights, i) * (at(beta, i) - meanBeta) ** 2);
  const slopeVariance = 1 / adjusted;
  const adjustedMean = meanX + meanBeta;
  return {
    slope,
    intercept,
    slopeSe: Math.sqrt(slopeVariance),
    interceptSe: Math.sqrt(1 / total + adjustedMean ** 2 * slopeVariance),
    covariance: -adjustedMean * slopeVariance,
    chiSquare: compensatedSum(n, (i) => at(weights, i) * (at(y, i) - slope * at(x, i) - intercept) ** 2),
  };
}
