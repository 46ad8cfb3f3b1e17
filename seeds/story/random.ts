import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

/** Every figure of the demonstration follows from this number. Another number gives another basin. */
export const SEED = 20261201;

// Offset basis and prime of the 32-bit FNV-1a hash (Fowler, Noll and Vo), from memory.
const FNV_BASIS = 0x811c9dc5;
const FNV_PRIME = 0x01000193;

function hash32(text: string): number {
  let hash = FNV_BASIS;
  for (let index = 0; index < text.length; index += 1) {
    hash = Math.imul(hash ^ text.charCodeAt(index), FNV_PRIME);
  }
  return hash | 0;
}

/** A stream of random figures of its own. */
export class Stream {
  private readonly generator;

  constructor(seed: number) {
    this.generator = xoroshiro128plus(seed);
  }

  /** From 0 (may be) to 1 (is never). */
  uniform(): number {
    return uniformFloat64(this.generator);
  }

  between(from: number, to: number): number {
    return from + (to - from) * this.uniform();
  }

  /** A whole number from `from` to `to`, both included. */
  integer(from: number, to: number): number {
    return uniformInt(this.generator, from, to);
  }

  chance(share: number): boolean {
    return this.uniform() < share;
  }

  pick<T>(list: readonly [T, ...T[]]): T {
    return list[this.integer(0, list.length - 1)] ?? list[0];
  }

  /**
   * A deviate of the standard normal distribution by the cosine half of the transform of Box and Muller (1958, Ann.
   * Math. Stat. 29, 610-611; from memory). 1 - u lies in (0, 1], so that the logarithm is finite.
   */
  normal(): number {
    const radius = Math.sqrt(-2 * Math.log(1 - this.uniform()));
    return radius * Math.cos(2 * Math.PI * this.uniform());
  }

  /** Student's t with three degrees of freedom over the root of 2: narrower in the middle than the normal, with long tails. */
  heavy(): number {
    const chiSquared = this.normal() ** 2 + this.normal() ** 2 + this.normal() ** 2;
    return this.normal() / Math.sqrt(chiSquared / 3) / Math.SQRT2;
  }
}

/** The stream that belongs to a name: what is drawn elsewhere, or a laboratory more, does not change it. */
export function streamFor(...name: readonly (string | number)[]): Stream {
  return new Stream(hash32([SEED, ...name].join('/')));
}
