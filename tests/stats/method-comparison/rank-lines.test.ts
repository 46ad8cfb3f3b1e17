import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { repeatedMedian, theilSen } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { asDecimals, generatorOf, orderFrom, shuffled, wholePairs } from './random';
import { allSlopes, plainMedian, slowRepeatedMedian } from './slow';

describe('theilSen', () => {
  it('is the median of all slopes, exactly, for decimals with many ties', () => {
    fc.assert(
      fc.property(wholePairs(2), ({ x, y, decimals }) => {
        const slopes = allSlopes({ x, y });
        const run = () => theilSen(asDecimals(x, decimals), asDecimals(y, decimals));
        if (slopes.length === 0) {
          expect(codeOf(run)).toBe('no-spread');
          return;
        }
        const line = run();
        expect(line.slope + 0).toBe(plainMedian(slopes) + 0);
        expect(line.slopeInterval.lower + 0).toBe(slopes[line.lowerRank - 1]);
        expect(line.slopeInterval.upper + 0).toBe(slopes[line.upperRank - 1]);
        // Symmetric, but for halves when all y are equal.
        expect(Math.abs(line.lowerRank + line.upperRank - slopes.length - 1)).toBeLessThanOrEqual(1);
      }),
      { numRuns: 400 },
    );
  });

  it('bears a quarter of wild points and moves with the data', () => {
    const x = Array.from({ length: 40 }, (_, i) => i);
    const y = x.map((value, i) => (i % 4 === 0 ? -1e9 : 2 * value + 1));
    expectClose(theilSen(x, y).slope, 2, { atol: 0.2 });
    const line = theilSen(x, y, { interceptFrom: 'residuals' });
    const moved = theilSen(
      x.map((value) => 3 * value + 7),
      y.map((value) => value + 2 * value),
      { interceptFrom: 'residuals' },
    );
    expectClose(moved.slope, line.slope, { rtol: 1e-12 });
  });

  it('keeps its rank where the number of pairs passes 32 bits', () => {
    const next = generatorOf(11);
    const x = Array.from({ length: 70_000 }, () => next());
    const y = x.map((value) => 3 * value + next());
    expectClose(theilSen(x, y).slope, 3, { atol: 0.05 });
  });

  it.each([
    ['too-few-values', () => theilSen([1], [1])],
    ['unequal-lengths', () => theilSen([1, 2], [1])],
    ['not-finite', () => theilSen([1, Infinity], [1, 2])],
    ['no-spread', () => theilSen([2, 2, 2], [1, 2, 3])],
    ['out-of-domain', () => theilSen([1, 2], [1, 2], { confidence: 0 })],
    ['out-of-domain', () => theilSen([0, 1e-300], [0, 1e300])],
  ])('refuses with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });

  it('takes two points, equal values and the ends of the number range', () => {
    expect(theilSen([1, 2], [1, 3])).toMatchObject({ slope: 2, intercept: -1 });
    expect(theilSen([1, 2, 3], [5, 5, 5])).toMatchObject({ slope: 0, intercept: 5 });
    expect(theilSen([-1.7e308, 1.7e308], [-1.7e308, 1.7e308]).slope).toBe(1);
  });
});

describe('repeatedMedian', () => {
  it('is its definition for decimals with many ties', () => {
    fc.assert(
      fc.property(wholePairs(2), ({ x, y, decimals }) => {
        const slow = slowRepeatedMedian({ x, y });
        const run = () => repeatedMedian(asDecimals(x, decimals), asDecimals(y, decimals));
        if (slow === null) expect(codeOf(run)).toBe('no-spread');
        else expectClose(run().slope, slow, { rtol: 1e-15 });
      }),
      { numRuns: 400 },
    );
  });

  it('is its definition for any doubles', () => {
    const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(value, value), { minLength: 26, maxLength: 60 }), (points) => {
        const x = points.map(([a]) => a);
        const y = points.map(([, b]) => b);
        const slow = slowRepeatedMedian({ x, y });
        if (slow !== null && Number.isFinite(slow)) {
          expectClose(repeatedMedian(x, y).slope, slow, { rtol: 1e-14, atol: Number.MIN_VALUE });
        }
      }),
      { numRuns: 200 },
    );
  });

  it('bears nearly half of wild points, in any order', () => {
    const x = Array.from({ length: 41 }, (_, i) => i);
    const y = x.map((value, i) => (i % 2 === 1 ? 1e12 * ((i * 7919) % 13) : 5 - value));
    const line = repeatedMedian(x, y);
    expectClose(line.slope, -1, { atol: 1e-9 });
    const order = orderFrom(4, x.length);
    expect(repeatedMedian(shuffled(x, order), shuffled(y, order))).toEqual(line);
  });

  it('gives the same bootstrap interval for the same seed, and encloses the line', () => {
    const next = generatorOf(9);
    const x = Array.from({ length: 30 }, () => next());
    const y = x.map((value) => 2 * value + 0.1 * next());
    const run = () => repeatedMedian(x, y, { generator: generatorOf(1), resamples: 199 });
    const line = run();
    expect(run()).toEqual(line);
    expect(line.slopeInterval?.lower).toBeLessThan(line.slope);
    expect(line.slopeInterval?.upper).toBeGreaterThan(line.slope);
    expect(repeatedMedian(x, y).slopeInterval).toBeNull();
  });

  it.each([
    ['too-few-values', () => repeatedMedian([], [])],
    ['not-finite', () => repeatedMedian([1, NaN], [1, 2])],
    ['no-spread', () => repeatedMedian([1, 1], [1, 2])],
    ['out-of-domain', () => repeatedMedian([1, 2], [1, 2], { generator: () => 1 })],
    ['out-of-domain', () => repeatedMedian([1, 2], [1, 2], { generator: () => 0.5, resamples: 3 })],
    ['no-spread', () => repeatedMedian([1, 2], [1, 2], { generator: () => 0 })],
  ])('refuses with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });
});
