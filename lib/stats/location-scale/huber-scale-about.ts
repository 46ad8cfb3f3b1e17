import { lowerBound, upperBound } from '../internal/sorted';
import { StatsError } from '../stats-error';
import { centre, type WinsorShape } from './algorithm-a-step';

const MAX_ITERATIONS = 1_000_000;

/** Scale of proposal 2 about a known location: s^2 = factor^2 times the mean of min(|x - location|, k s)^2. */
export function huberScaleAbout(
  sorted: Float64Array,
  location: number,
  { multiple, factor }: WinsorShape,
): { scale: number; iterations: number } {
  const n = sorted.length;
  const widest = Math.max((sorted[n - 1] as number) - location, location - (sorted[0] as number));
  if (widest === 0) return { scale: 0, iterations: 0 };
  if (widest === Infinity)
    throw new StatsError('out-of-domain', 'huberProposal2 gives a scale too large to represent');
  const { z, squares, unit } = centre(sorted, location, widest);
  // From above: the map is increasing, so that the steps only fall, to the largest solution.
  let scale = widest * unit * factor;
  for (let iteration = 1; iteration <= MAX_ITERATIONS; iteration += 1) {
    const limit = multiple * scale;
    const low = lowerBound(z, -limit);
    const high = upperBound(z, limit);
    const outside = n - (high - low);
    const inside = (squares[high] as number) - (squares[low] as number);
    // With these values outside the step has its fixed point at once.
    const rest = n - outside * (factor * multiple) ** 2;
    const next =
      rest > 0
        ? factor * Math.sqrt(inside / rest)
        : factor * Math.sqrt((inside + outside * limit * limit) / n);
    if (!(next < scale * (1 - 2 * Number.EPSILON))) return { scale: scale / unit, iterations: iteration };
    if (next < 1e-12 * widest * unit && inside === 0) return { scale: 0, iterations: iteration };
    scale = next;
  }
  throw new StatsError('no-convergence', `huberProposal2 did not settle within ${MAX_ITERATIONS} steps`);
}
