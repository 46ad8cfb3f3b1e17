import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

export const SEED = 20261201;
export const SIZES = [3, 4, 5, 8, 13, 30, 60, 200, 999, 2000] as const;

const generator = xoroshiro128plus(SEED);
export const uniform = () => uniformFloat64(generator);
export const between = (low: number, high: number) => low + (high - low) * uniform();
export const logBetween = (low: number, high: number) => Math.exp(between(Math.log(low), Math.log(high)));
export const whole = (low: number, high: number) => Math.floor(between(low, high + 1));

export function normal(): number {
  const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
  return radius * Math.cos(2 * Math.PI * uniform());
}

/** A value as it is reported: so many decimals, then a power of ten, read back from its text. */
export function reported(value: number, decimals: number, exponent = 0): number {
  return Number(`${value.toFixed(decimals)}e${exponent}`);
}

export const VALUE_KINDS: Readonly<Record<string, () => number>> = {
  plain: () => 50 + 3 * normal(),
  ties: () => Math.round(20 + 4 * normal()) / 10,
  outliers: () => (uniform() < 0.2 ? 1000 * normal() : 10 + normal()),
  huge: () => 1e140 * (3 + normal()),
  tiny: () => 1e-140 * (3 + normal()),
  skew: () => Math.exp(normal()),
};

export interface Pairs {
  readonly x: number[];
  readonly y: number[];
}

/** Pairs of two methods near a line, reported to some decimals, at several scales. */
export const PAIR_KINDS: Readonly<Record<string, (n: number) => Pairs>> = {
  plain: (n) => pairs(n, 3, 3),
  ties: (n) => pairs(n, 0, 3),
  outliers: (n) => pairs(n, 3, 3, (y) => (uniform() < 0.15 ? y + 1e4 : y)),
  scattered: (n) => pairs(n, 2, 60),
  huge: (n) => pairs(n, 3, 3, (y) => y, 12),
  tiny: (n) => pairs(n, 3, 3, (y) => y, -15),
};

function pairs(n: number, decimals: number, scatter: number, spoil = (y: number) => y, exponent = 0): Pairs {
  const truth = Array.from({ length: n }, () => between(1, 100));
  return {
    x: truth.map((level) => reported(level + normal(), decimals, exponent)),
    y: truth.map((level) => reported(spoil(2 + 1.05 * level + scatter * normal()), decimals, exponent)),
  };
}

/** Results of several laboratories, one to four each, two at least in the first. */
export function laboratories(kind: string, n: number): number[][] {
  const exponent = kind === 'huge' ? 12 : kind === 'tiny' ? -15 : 0;
  const groups: number[][] = [];
  for (let left = n; left > 0; left -= groups.at(-1)?.length ?? 0) {
    const size = Math.min(left, groups.length === 0 ? 2 : whole(1, 4));
    const shift = kind === 'outliers' && uniform() < 0.1 ? 500 : normal();
    groups.push(
      Array.from({ length: size }, () => reported(10 + shift + normal(), kind === 'ties' ? 0 : 3, exponent)),
    );
  }
  return groups;
}
