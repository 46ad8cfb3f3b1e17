import { normalCdf, normalDensity } from '../distributions';
import { gaussLegendre } from './gauss-legendre';

/*
 * Null distribution of Dixon's ratios (x_n - x_(n-i)) / (x_n - x_j): i = 1 or 2 values at the suspect end, j = 1, 2
 * or 3 at the other. For a normal sample with x_n = u and x_j = v, j - 1 values lie below v and the other m = n - 1 - j
 * above it. The ratio is above c when all of those (i = 1), or all but at most one (i = 2), lie below u - c (u - v). So
 * the probability is a double integral over v and w = u - v (Dixon 1951; McBane 2006, J. Statistical Software 16, 3).
 */

export interface DixonRatio {
  readonly near: 1 | 2;
  readonly far: 1 | 2 | 3;
}

interface Point {
  readonly u: number;
  readonly w: number;
  readonly belowV: number;
  readonly belowU: number;
  readonly weight: number;
}

/** Points along each axis: the integrand is the narrower the larger the sample. */
const pointsFor = (n: number) => (n <= 10 ? 64 : 130);
/** v is followed from -9 to 6 and w to 15 standard deviations; what lies beyond is below 1e-17. */
const V_MIDDLE = -1.5;
const HALF = 7.5;

/** P(ratio > c) at one given end of a sample of n, as a function of c; good to about 1e-9 for n up to 100. */
export function dixonTail(n: number, { near, far }: DixonRatio): (c: number) => number {
  const free = n - 1 - far;
  const points = pointsOf(n, far);
  return (c) => {
    if (c <= 0) return 1;
    if (c >= 1) return 0;
    let sum = 0;
    for (const { u, w, belowV, belowU, weight } of points) {
      const cut = normalCdf(u - c * w);
      const inside = Math.max(0, cut - belowV);
      const others = inside ** (free - 1);
      sum += weight * others * (near === 1 ? inside : inside + free * Math.max(0, belowU - cut));
    }
    return Math.min(1, sum);
  };
}

function pointsOf(n: number, far: 1 | 2 | 3): readonly Point[] {
  const size = pointsFor(n);
  const { nodes, weights } = gaussLegendre(size);
  const below = far === 1 ? 1 : far === 2 ? n - 2 : ((n - 2) * (n - 3)) / 2;
  const points: Point[] = [];
  for (let i = 0; i < size; i += 1) {
    const v = V_MIDDLE + HALF * (nodes[i] as number);
    const belowV = normalCdf(v);
    const outer =
      n * (n - 1) * below * normalDensity(v) * belowV ** (far - 1) * (weights[i] as number) * HALF;
    for (let k = 0; k < size; k += 1) {
      const w = HALF * ((nodes[k] as number) + 1);
      const weight = outer * normalDensity(v + w) * (weights[k] as number) * HALF;
      if (weight > 1e-15) points.push({ u: v + w, w, belowV, belowU: normalCdf(v + w), weight });
    }
  }
  return points;
}
