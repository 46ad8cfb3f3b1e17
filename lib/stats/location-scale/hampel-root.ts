import { lowerBound, upperBound } from '../internal/sorted';
import { StatsError } from '../stats-error';
import type { Centred } from './algorithm-a-step';

/** A place m, the sum f of psi((z - m) / s) in units of s, and whether any value has weight there. */
interface Corner {
  readonly m: number;
  readonly f: number;
  readonly supported: boolean;
}

interface Root {
  readonly root: number;
  readonly low: Corner;
  readonly high: Corner;
}

const BENDS = [-4.5, -3, -1.5, 1.5, 3, 4.5] as const;
/** Two solutions this near to equally far from the median, in units of s, count as equally far. */
const EQUALLY_FAR = 1e-12;

/** The solution of sum psi((z - m) / s) = 0 nearest to 0, where the median of z is. */
export function nearestHampelRoot(data: Centred, s: number): Root & { tied: boolean } {
  const here = cornerAt(data, s, 0);
  if (isRoot(here, data)) return { root: 0, low: here, high: { ...here, f: here.f + 1 }, tied: false };
  // Where f is above 0 more weight lies to the right, and a solution is there; the other side is searched no further.
  const towards = here.f >= 0 ? 1 : -1;
  const first = searchFrom(data, s, here, { direction: towards, within: Infinity });
  const within = first ? Math.abs(first.root) + EQUALLY_FAR * s : Infinity;
  const second = searchFrom(data, s, here, { direction: towards === 1 ? -1 : 1, within });
  const nearest = first && (!second || Math.abs(first.root) <= Math.abs(second.root)) ? first : second;
  if (!nearest) throw new StatsError('no-convergence', 'hampel found no solution');
  const tied = first !== null && second !== null && Math.abs(first.root + second.root) <= EQUALLY_FAR * s;
  return tied ? { ...nearest, root: 0, tied } : { ...nearest, tied };
}

/** A zero of f but for rounding, with values that have weight; where none has, f is 0 without saying anything. */
function isRoot({ f, supported }: Corner, { z }: Centred): boolean {
  return supported && Math.abs(f) <= 4 * Number.EPSILON * z.length;
}

interface Search {
  readonly direction: 1 | -1;
  /** How far from 0 a solution still matters. */
  readonly within: number;
}

/** Visits the corners of f in one direction until it changes sign or is 0. */
function searchFrom(data: Centred, s: number, start: Corner, { direction, within }: Search): Root | null {
  const { z } = data;
  // For each bend the next value whose corner z + bend s lies beyond m.
  const next = BENDS.map((bend) =>
    direction === 1 ? upperBound(z, start.m - bend * s) : lowerBound(z, start.m - bend * s) - 1,
  );
  let last = start;
  for (;;) {
    let m = direction * Infinity;
    BENDS.forEach((bend, b) => {
      const value = z[next[b] as number];
      if (value !== undefined)
        m = direction === 1 ? Math.min(m, value + bend * s) : Math.max(m, value + bend * s);
    });
    if (!Number.isFinite(m)) return null;
    BENDS.forEach((bend, b) => {
      const beyond = (value: number | undefined) =>
        value === undefined || (direction === 1 ? value + bend * s > m : value + bend * s < m);
      while (!beyond(z[next[b] as number])) (next[b] as number) += direction;
    });
    const corner = cornerAt(data, s, m);
    if (isRoot(corner, data)) return { root: m, low: corner, high: { ...corner, f: corner.f + 1 } };
    if (last.f * corner.f < 0) {
      const root = last.m - (last.f * (corner.m - last.m)) / (corner.f - last.f);
      return { root, low: last, high: corner };
    }
    if (Math.abs(m) > within) return null;
    last = corner;
  }
}

/** f from the running sums of z: each value counts by the part of psi it lies on. */
function cornerAt({ z, sum }: Centred, s: number, m: number): Corner {
  const at = (bend: number) => lowerBound(z, m + bend * s);
  const [a, b, c, d, e, g] = BENDS.map(at) as [number, number, number, number, number, number];
  const total = (from: number, to: number) =>
    ((sum[to] as number) - (sum[from] as number) - (to - from) * m) / s;
  const falling = -4.5 * (b - a) - total(a, b) + 4.5 * (g - e) - total(e, g);
  const f = falling + 1.5 * (e - d - (c - b)) + total(c, d);
  return { m, f, supported: upperBound(z, m - 4.5 * s) < g };
}
