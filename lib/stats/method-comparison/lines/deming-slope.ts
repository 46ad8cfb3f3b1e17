import { compensatedSum, scaledMean } from '../../internal/sums';
import { StatsError } from '../../stats-error';

/** Means and centred sums of squares and products; `weight` is the sum of the weights. */
export interface CentredSums {
  readonly weight: number;
  readonly meanX: number;
  readonly meanY: number;
  readonly sxx: number;
  readonly syy: number;
  readonly sxy: number;
}

export interface SlopeAndIntercept {
  readonly slope: number;
  readonly intercept: number;
}

/** Centred sums of the pairs, one of them left out if `without` is its place. */
export function centredSums(x: Float64Array, y: Float64Array, without = -1): CentredSums {
  const keep = (values: Float64Array) => (without < 0 ? values : values.filter((_, i) => i !== without));
  const [px, py] = [keep(x), keep(y)];
  const n = px.length;
  const meanX = scaledMean(px, 1);
  const meanY = scaledMean(py, 1);
  const dx = (i: number) => (px[i] as number) - meanX;
  const dy = (i: number) => (py[i] as number) - meanY;
  return {
    weight: n,
    meanX,
    meanY,
    sxx: compensatedSum(n, (i) => dx(i) ** 2),
    syy: compensatedSum(n, (i) => dy(i) ** 2),
    sxy: compensatedSum(n, (i) => dx(i) * dy(i)),
  };
}

/** Line with errors in both axes, `ratio` = variance of the error of y over that of x; null when it has no direction. */
export function demingLine(sums: CentredSums, ratio: number): SlopeAndIntercept | null {
  const { sxx, syy, sxy, meanX, meanY } = sums;
  const excess = syy - ratio * sxx;
  const root = Math.hypot(excess, 2 * Math.sqrt(ratio) * sxy);
  if (sxy === 0) return excess < 0 ? { slope: 0, intercept: meanY } : null;
  // Of the two forms of the solution the one without cancellation.
  const slope = excess >= 0 ? (excess + root) / (2 * sxy) : (2 * ratio * sxy) / (root - excess);
  return { slope, intercept: meanY - slope * meanX };
}

export function requireLine(caller: string, line: SlopeAndIntercept | null): SlopeAndIntercept {
  if (line === null || !Number.isFinite(line.slope)) {
    throw new StatsError(
      'no-spread',
      `${caller} finds no direction in the data: x and y do not vary together`,
    );
  }
  return line;
}
