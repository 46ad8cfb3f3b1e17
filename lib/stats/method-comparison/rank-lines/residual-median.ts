import { medianOfSorted } from '../../internal/sorted';

/** Median of y - slope x. */
export function residualMedian(x: readonly number[], y: readonly number[], slope: number): number {
  const residuals = Float64Array.from(x, (value, i) => (y[i] as number) - slope * value);
  return medianOfSorted(residuals.sort());
}
