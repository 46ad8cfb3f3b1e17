import { compensatedSum } from '../../internal/sums';
import type { SlopeAndIntercept } from './deming-slope';

export interface JackknifeErrors {
  readonly interceptSe: number;
  readonly slopeSe: number;
  readonly covariance: number;
}

/** Standard errors sqrt((n - 1) / n sum (theta_i - mean)^2) from the lines with each pair left out. */
export function jackknifeErrors(lines: readonly SlopeAndIntercept[]): JackknifeErrors {
  const n = lines.length;
  const slope = (i: number) => (lines[i] as SlopeAndIntercept).slope;
  const intercept = (i: number) => (lines[i] as SlopeAndIntercept).intercept;
  const meanSlope = compensatedSum(n, slope) / n;
  const meanIntercept = compensatedSum(n, intercept) / n;
  const share = (n - 1) / n;
  const da = (i: number) => intercept(i) - meanIntercept;
  const db = (i: number) => slope(i) - meanSlope;
  return {
    interceptSe: Math.sqrt(share * compensatedSum(n, (i) => da(i) ** 2)),
    slopeSe: Math.sqrt(share * compensatedSum(n, (i) => db(i) ** 2)),
    covariance: share * compensatedSum(n, (i) => da(i) * db(i)),
  };
}
