import { medianDeviationOfSorted, medianOfSorted } from '../internal/sorted';
import { safeFactor, compensatedSum } from '../internal/sums';
import { MAD_FACTOR } from './mad-e';
import { nIqrOfSorted } from './n-iqr';

export type StartScaleSource = 'made' | 'niqr' | 'mean-absolute-deviation' | 'all-equal';

export interface AlgorithmAStart {
  readonly location: number;
  readonly scale: number;
  readonly scaleFrom: StartScaleSource;
}

/** Mean absolute deviation to standard deviation, for normal data. */
const MEAN_DEVIATION_FACTOR = Math.sqrt(Math.PI / 2);

/** Median and the first scale above zero among MADe, nIQR and the mean absolute deviation. */
export function startOfAlgorithmA(sorted: Float64Array): AlgorithmAStart {
  const location = medianOfSorted(sorted);
  const made = MAD_FACTOR * medianDeviationOfSorted(sorted, location);
  if (made > 0) return { location, scale: made, scaleFrom: 'made' };
  if (sorted[0] === sorted[sorted.length - 1]) return { location, scale: 0, scaleFrom: 'all-equal' };
  const range = nIqrOfSorted(sorted, 7);
  if (range > 0) return { location, scale: range, scaleFrom: 'niqr' };
  return { location, scale: meanDeviation(sorted, location), scaleFrom: 'mean-absolute-deviation' };
}

function meanDeviation(sorted: Float64Array, centre: number): number {
  const n = sorted.length;
  const factor = safeFactor(sorted);
  const sum = compensatedSum(n, (i) => Math.abs((sorted[i] as number) * factor - centre * factor));
  // Below the smallest number the mean could round to zero although the values differ.
  return Math.max((MEAN_DEVIATION_FACTOR * sum) / n / factor, Number.MIN_VALUE);
}
