import { StatsError } from '../stats-error';

/**
 * Where randomness comes from: a function that gives numbers from 0 up to, not including, 1, or a generator with 32 random
 * bits a call, as pure-rand has them. It is drawn from, and so altered. The caller seeds it.
 */
export type RandomSource = (() => number) | { next(): number };

/** Numbers from 0 up to, not including, 1, with 53 random bits from a generator of 32. */
export function uniformFrom(source: RandomSource): () => number {
  if (typeof source === 'function') {
    return () => {
      const u = source();
      if (!(u >= 0 && u < 1)) {
        throw new StatsError(
          'out-of-domain',
          `the random source must give numbers from 0 to below 1, found ${u}`,
        );
      }
      return u;
    };
  }
  return () => ((source.next() >>> 5) * 2 ** 26 + (source.next() >>> 6)) * 2 ** -53;
}

/** Throws unless the number of resamples is whole and at least `least`. */
export function checkResamples(caller: string, resamples: number, least: number): void {
  if (!(Number.isInteger(resamples) && resamples >= least)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a whole number of at least ${least} resamples, found ${resamples}`,
    );
  }
}

/** Fills `into` with draws from the values, with replacement. */
export function resample(values: readonly number[], random: () => number, into: number[]): void {
  const n = values.length;
  for (let i = 0; i < n; i += 1) into[i] = values[Math.floor(random() * n)] as number;
}
