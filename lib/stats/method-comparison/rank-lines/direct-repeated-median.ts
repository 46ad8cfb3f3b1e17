import { medianInPlace } from '../../internal/median-in-place';
import type { OrderedPoints } from '../slopes/point-grid';

/** Up to this many points it is quicker to take the slopes of each point as they are. */
export const DIRECT_POINTS = 400;

/** The repeated median by its definition, O(n^2) time and O(n) memory; null when all x are equal. */
export function directRepeatedMedian({ count, x, y }: OrderedPoints): number | null {
  const slopes = new Float64Array(count);
  const medians = new Float64Array(count);
  let points = 0;
  for (let i = 0; i < count; i += 1) {
    const xi = x[i] as number;
    const yi = y[i] as number;
    let partners = 0;
    for (let j = 0; j < count; j += 1) {
      const run = (x[j] as number) - xi;
      if (run === 0) continue;
      slopes[partners] = ((y[j] as number) - yi) / run;
      partners += 1;
    }
    if (partners === 0) continue;
    medians[points] = medianInPlace(slopes.subarray(0, partners));
    points += 1;
  }
  return points === 0 ? null : medianInPlace(medians.subarray(0, points));
}
