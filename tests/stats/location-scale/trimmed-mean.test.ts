import { describe, expect, it } from 'vitest';
import { fences, hinges, mean, nIqr, sd, trimmedMean } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

describe('trimmedMean', () => {
  it('cuts the same number from either end', () => {
    expect(trimmedMean([1, 2, 3, 4, 100], { share: 0.2 })).toMatchObject({
      mean: 3,
      trimmedEachSide: 1,
      kept: 3,
    });
    expect(trimmedMean(Array.from({ length: 30 }, (_, i) => i)).trimmedEachSide).toBe(3);
    expect(
      trimmedMean(
        Array.from({ length: 10 }, (_, i) => i),
        { share: 0.3 },
      ).trimmedEachSide,
    ).toBe(3);
  });

  it('without a cut is the mean with its standard error', () => {
    const values = [3, 1, 4, 1, 5];
    const found = trimmedMean(values, { share: 0 });
    expect(found.mean).toBe(mean(values));
    expectClose(found.standardError ?? NaN, sd(values) / Math.sqrt(5), { rtol: 1e-14 });
  });

  it('has a standard error from the winsorised values', () => {
    expectClose(
      trimmedMean([1, 2, 3, 4, 100], { share: 0.2 }).standardError ?? NaN,
      sd([2, 2, 3, 4, 4]) / (0.6 * Math.sqrt(5)),
      {
        rtol: 1e-14,
      },
    );
    expect(trimmedMean([7], { share: 0.4 })).toMatchObject({ mean: 7, standardError: null });
    expect(trimmedMean([1, 2, 9], { share: 0.4 }).standardError).toBeNull();
  });

  it('refuses a share of half and more, and no values', () => {
    for (const share of [0.5, -0.1, NaN])
      expect(codeOf(() => trimmedMean([1, 2, 3], { share }))).toBe('out-of-domain');
    expect(codeOf(() => trimmedMean([]))).toBe('too-few-values');
  });
});

describe('hinges and fences', () => {
  it('share the median between the halves when n is odd', () => {
    expect(hinges([1, 2, 3, 4, 100])).toEqual({ lower: 2, upper: 4 });
    expect(hinges([4, 1, 3, 2])).toEqual({ lower: 1.5, upper: 3.5 });
    expect(hinges([5])).toEqual({ lower: 5, upper: 5 });
  });

  it('give a normalised range of their own', () => {
    expectClose(nIqr([1, 2, 3, 4], { quantileType: 'hinges' }), 0.7413 * 2, { rtol: 1e-15 });
  });

  it('count what lies outside', () => {
    expect(fences([1, 2, 3, 4, 100])).toMatchObject({
      innerLow: -1,
      innerHigh: 7,
      outerLow: -4,
      outerHigh: 10,
      unusual: 0,
      extreme: 1,
    });
    expect(fences([1, 2, 3, 4, 8])).toMatchObject({ unusual: 1, extreme: 0 });
    expect(fences([1, 2, 3, 4, 7]).unusual).toBe(0);
  });

  it('refuse no values and fences outside the number range', () => {
    expect(codeOf(() => hinges([]))).toBe('too-few-values');
    expect(codeOf(() => fences([NaN]))).toBe('not-finite');
    expect(codeOf(() => fences([-1.7e308, -1.7e308, 1.7e308, 1.7e308]))).toBe('out-of-domain');
  });
});
