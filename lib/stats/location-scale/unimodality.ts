import { checkValues } from '../internal/check-values';
import { evaluateGaussianSum, gaussianSum } from '../internal/gaussian-sum';
import { kernelUnits } from '../internal/kernel-units';
import { modes, type ModesOptions } from './modes';

/** One mode and the results that lie around it, up to the lowest density on either side. */
export interface ModeShare {
  readonly location: number;
  readonly relativeHeight: number;
  readonly count: number;
  readonly share: number;
  /** Whether so many results stand there that it is more than a few wild ones. */
  readonly major: boolean;
}

export interface UnimodalityResult {
  readonly verdict: 'one-mode' | 'one-main-mode' | 'several-modes';
  readonly modes: readonly ModeShare[];
  /** The verdict in a sentence. */
  readonly statement: string;
}

/** A mode with fewer of the results than this, or with one only, is taken for a few wild results. */
export const MAJOR_SHARE = 0.1;

/**
 * Do the results form one group? A plain statement from the modes of their kernel density.
 *
 * 'one-mode': a consensus can be taken. 'one-main-mode': the others hold less than a tenth of the results each, or one, wild
 * results that a robust estimate bears. 'several-modes': two groups or more, for instance by method; one consensus value
 * may describe none of them, so look for the cause before scoring. Depends on the bandwidth.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param options.bandwidth - standard deviation of the kernel. Unit: unit of the data. Domain: finite; > 0.
 * @returns { verdict, modes: { location, relativeHeight, count, share, major }[], statement }
 * @throws StatsError too-few-values; not-finite; no-spread for a bandwidth of 0; out-of-domain for a negative one
 *
 * Ties and equal values: allowed. Order of input: does not matter.
 * Numerics: modes, then the lowest density between two of them on a grid of 200 steps. O(n log n).
 * Source: ISO 13528:2022, 5.3 and 10.3 ask for the check; the share of a tenth is common practice, no source.
 * Checked by: tests/stats/location-scale/unimodality.test.ts.
 * @example unimodality([1, 1.1, 1.2, 9, 9.2], { bandwidth: 0.5 }).verdict // => 'several-modes'
 */
export function unimodality(values: readonly number[], { bandwidth }: ModesOptions): UnimodalityResult {
  checkValues('unimodality', values, 1);
  const found = modes(values, { bandwidth }).modes;
  const edges = found
    .slice(1)
    .map((mode, i) => valley(values, bandwidth, found[i]?.location ?? NaN, mode.location));
  const shares = found.map(({ location, relativeHeight }, i) => {
    const [low, high] = [edges[i - 1] ?? -Infinity, edges[i] ?? Infinity];
    const count = values.filter((x) => x > low && x <= high).length;
    const share = count / values.length;
    return { location, relativeHeight, count, share, major: count > 1 && share >= MAJOR_SHARE };
  });
  const major = shares.filter((mode) => mode.major).length;
  const severalModes = major > 1 || major === 0;
  const verdict = found.length === 1 ? 'one-mode' : severalModes ? 'several-modes' : 'one-main-mode';
  return { verdict, modes: shares, statement: statementOf(verdict, shares) };
}

const GRID = 200;

/** Where the density is lowest between two modes. */
function valley(values: readonly number[], bandwidth: number, from: number, to: number): number {
  const { sorted, origin, unit } = kernelUnits('unimodality', values, bandwidth);
  const sum = gaussianSum(sorted);
  let lowest = { place: from, height: Infinity };
  for (let i = 0; i <= GRID; i += 1) {
    const place = from + (i / GRID) * (to - from);
    const height = evaluateGaussianSum(sum, (place - origin) / unit).value;
    if (height < lowest.height) lowest = { place, height };
  }
  return lowest.place;
}

function statementOf(verdict: UnimodalityResult['verdict'], shares: readonly ModeShare[]): string {
  if (verdict === 'one-mode') return 'The results form one group.';
  if (verdict === 'one-main-mode') {
    const apart = shares.filter(({ major }) => !major).reduce((sum, { count }) => sum + count, 0);
    return `The results form one main group; ${apart} ${apart === 1 ? 'result stands' : 'results stand'} apart.`;
  }
  const groups = shares.filter(({ major }) => major).length;
  if (groups === 0) return 'The results form no group: they are scattered in many small ones.';
  return `The results form ${groups} groups. One consensus value may describe none of them; look for the cause.`;
}
