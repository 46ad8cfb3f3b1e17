import { describe, expect, test } from 'vitest';
import { streamFor } from '@/seeds/story/random';

const COUNT = 20_000;

function moments(values: readonly number[]): { mean: number; sd: number } {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return { mean, sd: Math.sqrt(squares / (values.length - 1)) };
}

describe('streams', () => {
  test('a name always gives the same figures, another name others', () => {
    const draw = (name: string) => {
      const stream = streamFor(name);
      return [stream.uniform(), stream.normal(), stream.integer(1, 6)];
    };
    expect(draw('a')).toEqual(draw('a'));
    expect(draw('b')).not.toEqual(draw('a'));
    expect(streamFor('a', 1).uniform()).not.toBe(streamFor('a', 2).uniform());
  });

  test('normal deviates have mean 0, sd 1 and the tails of the normal distribution', () => {
    const stream = streamFor('normal');
    const values = Array.from({ length: COUNT }, () => stream.normal());
    const { mean, sd } = moments(values);
    // Five standard errors: 5/sqrt(n) for the mean, 5/sqrt(2n) for the sd.
    expect(Math.abs(mean)).toBeLessThan(5 / Math.sqrt(COUNT));
    expect(Math.abs(sd - 1)).toBeLessThan(5 / Math.sqrt(2 * COUNT));
    const beyondTwo = values.filter((value) => Math.abs(value) > 2).length / COUNT;
    // 4.55 % lie beyond 2 (table of the normal distribution, from memory).
    expect(Math.abs(beyondTwo - 0.0455)).toBeLessThan(0.008);
    expect(values.every(Number.isFinite)).toBe(true);
  });

  test('the first figures of neighbouring names are not alike', () => {
    const firsts = Array.from({ length: 2_000 }, (_, index) => streamFor('laboratory', index).normal());
    const { mean, sd } = moments(firsts);
    expect(Math.abs(mean)).toBeLessThan(0.12);
    expect(Math.abs(sd - 1)).toBeLessThan(0.08);
    const products = firsts.slice(1).map((value, index) => value * (firsts[index] ?? 0));
    expect(Math.abs(moments(products).mean)).toBeLessThan(0.12);
  });
});
