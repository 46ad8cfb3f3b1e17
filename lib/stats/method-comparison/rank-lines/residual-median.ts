import { medianOf } from '../internal/median-of';

/** Median of y - slope x. */
export function residualMedian(x: readonly number[], y: readonly number[], slope: number): number {
  const residuals = new Float64Array(x.length);
  for (let i = 0; i < x.length; i += 1) residuals[i] = (y[i] as number) - slope * (x[i] as number);
  return medianOf(residuals);
}
