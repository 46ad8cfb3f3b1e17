import { angleDensity, cdfAt, extremeDeviate, nextAngle } from './extreme-deviate';

/** Cells of the integral over the angle of the largest value, with three Gauss points each. */
const CELLS = 400;
const NODES = [0.5 - Math.sqrt(0.15), 0.5, 0.5 + Math.sqrt(0.15)] as const;
const WEIGHTS = [5 / 18, 8 / 18, 5 / 18] as const;
/** Beyond so many standard deviations nothing is left to integrate. */
const FAR = 12;

/**
 * Null distribution of the ratio of Grubbs' test for two outliers on one given side: the probability that taking away
 * the two largest of n normal values leaves at most a share `ratio` of the sum of squares. n >= 4.
 *
 * Taking away the largest leaves cos^2 of its angle, the second again cos^2 of its own among the n - 1 others; both
 * angles have known distributions (extreme-deviate), so one integral is left. Good to about 1e-7.
 */
export function twoLargestDistribution(n: number): (ratio: number) => number {
  const others = extremeDeviate(n - 1);
  const density = angleDensity(n);
  const lowest = Math.asin(1 / (n - 1));
  const step = (Math.asin(Math.min(1, FAR / Math.sqrt(n))) - lowest) / CELLS;
  const points: { weight: number; most: number; left: number }[] = [];
  for (let i = 0; i < CELLS; i += 1) {
    NODES.forEach((node, k) => {
      const theta = lowest + (i + node) * step;
      // Probability that the largest stays the largest, and what it leaves of the squares.
      const most = cdfAt(others, nextAngle(n, theta));
      const weight = n * step * (WEIGHTS[k] as number) * density(theta);
      if (most > 0 && weight > 0) points.push({ weight, most, left: Math.cos(theta) ** 2 });
    });
  }
  return (ratio) => {
    if (ratio <= 0) return 0;
    if (ratio >= 1) return 1;
    let sum = 0;
    for (const { weight, most, left } of points) {
      const share = ratio / left;
      sum += weight * (share >= 1 ? most : Math.max(0, most - cdfAt(others, Math.acos(Math.sqrt(share)))));
    }
    return Math.min(1, sum);
  };
}
