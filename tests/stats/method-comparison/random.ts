import fc from 'fast-check';
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

/** Uniform numbers from 0 to 1 from a seed. */
export function generatorOf(seed: number): () => number {
  const generator = xoroshiro128plus(seed);
  return () => uniformFloat64(generator);
}

/** Rounded normal numbers are not needed: the sum of twelve uniform ones is near enough for data. */
export function normalOf(next: () => number): () => number {
  return () => {
    let sum = -6;
    for (let i = 0; i < 12; i += 1) sum += next();
    return sum;
  };
}

/** Whole pairs with many ties (values below 7) or few (below 10,000), and a number of decimals to write them with. */
export const wholePairs = (least: number, most = 60) =>
  fc
    .record({ top: fc.constantFrom(1, 3, 6, 40, 10_000), decimals: fc.integer({ min: 0, max: 4 }) })
    .chain(({ top, decimals }) =>
      fc
        .array(fc.tuple(fc.integer({ min: 0, max: top }), fc.integer({ min: -top, max: top })), {
          minLength: least,
          maxLength: most,
        })
        .map((points) => ({ x: points.map(([x]) => x), y: points.map(([, y]) => y), decimals })),
    );

/** The values as decimal numbers with so many decimals. */
export function asDecimals(values: readonly number[], decimals: number): number[] {
  return values.map((value) => value / 10 ** decimals);
}

export function shuffled<T>(values: readonly T[], order: readonly number[]): T[] {
  return order.map((i) => values[i] as T);
}

/** An order of 0..n-1 from a seed. */
export function orderFrom(seed: number, n: number): number[] {
  const next = generatorOf(seed);
  const keys = Array.from({ length: n }, () => next());
  return keys.map((_, i) => i).sort((a, b) => (keys[a] as number) - (keys[b] as number));
}
