import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  algorithmA,
  hampel,
  huberLocation,
  huberProposal2,
  madE,
  mean,
  median,
  nIqr,
  qMethod,
  qn,
  quantile,
  sd,
  sn,
  trimmedMean,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

const locations = {
  median,
  mean,
  'quantile 0.3': (values: readonly number[]) => quantile(values, 0.3),
  'x* of Algorithm A': (values: readonly number[]) => algorithmA(values).location,
  'location of proposal 2': (values: readonly number[]) => huberProposal2(values).location,
  huberLocation: (values: readonly number[]) => huberLocation(values).location,
  'Q/Hampel': (values: readonly number[]) => hampel(values).location,
  'trimmed mean': (values: readonly number[]) => trimmedMean(values).mean,
};
const scales = {
  madE,
  nIqr,
  sd,
  's* of Algorithm A': (values: readonly number[]) => algorithmA(values).scale,
  'scale of proposal 2': (values: readonly number[]) => huberProposal2(values).scale,
  's* of the Q method': (values: readonly number[]) => qMethod(values).scale,
  qn: (values: readonly number[]) => qn(values),
  sn: (values: readonly number[]) => sn(values),
};

/** Figures as laboratories report them: a few digits, ties happen. */
const reported = fc.array(
  fc.integer({ min: -5000, max: 5000 }).map((n) => n / 100),
  { minLength: 5, maxLength: 60 },
);
/** Multiples of a quarter: sums and shifts of them are exact, so a law holds to the last bits. */
const quarters = fc.array(
  fc.integer({ min: -400, max: 400 }).map((n) => n / 4),
  { minLength: 5, maxLength: 60 },
);
const spread = (values: readonly number[]) => Math.max(...values.map(Math.abs), 1);

describe.each(Object.entries({ ...locations, ...scales }))('%s', (_, estimate) => {
  it('does not depend on the order of the values', () => {
    fc.assert(
      fc.property(reported, fc.infiniteStream(fc.nat()), (values, keys) => {
        const shuffled = values
          .map((value) => ({ value, key: keys.next().value as number }))
          .sort((a, b) => a.key - b.key)
          .map(({ value }) => value);
        expectClose(estimate(shuffled), estimate(values), { atol: 1e-12 * spread(values) });
      }),
    );
  });

  it('is multiplied when the values are multiplied', () => {
    fc.assert(
      fc.property(reported, fc.constantFrom(2 ** -40, 0.5, 4, 2 ** 40), (values, factor) => {
        const scaled = values.map((value) => value * factor);
        expectClose(estimate(scaled), estimate(values) * factor, { rtol: 1e-12 });
      }),
    );
  });

  it('leaves its input as it was', () => {
    const values = Object.freeze([5, 1, 4, 2, 3]);
    expect(Number.isFinite(estimate(values))).toBe(true);
    expect(values).toEqual([5, 1, 4, 2, 3]);
  });

  it('refuses no values, NaN and infinite values', () => {
    expect(codeOf(() => estimate([]))).toBe('too-few-values');
    for (const wrong of [NaN, Infinity, -Infinity]) {
      expect(codeOf(() => estimate([1, 2, wrong, 4]))).toBe('not-finite');
    }
  });

  it('is never negative zero', () => {
    expect(Object.is(estimate([-0, -0, -0]), 0)).toBe(true);
  });
});

describe.each(Object.entries(locations))('%s as a location', (_, estimate) => {
  it('moves with the values', () => {
    fc.assert(
      fc.property(quarters, fc.integer({ min: -1000, max: 1000 }), (values, shift) => {
        const moved = values.map((value) => value + shift);
        expectClose(estimate(moved), estimate(values) + shift, { atol: 1e-9 * spread(moved) });
      }),
    );
  });

  it('lies between the smallest and the largest value', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e307, max: 1e307, noNaN: true }), { minLength: 2 }),
        (values) => {
          const found = estimate(values);
          const slack = 1e-12 * spread(values);
          expect(found).toBeGreaterThanOrEqual(Math.min(...values) - slack);
          expect(found).toBeLessThanOrEqual(Math.max(...values) + slack);
        },
      ),
    );
  });

  it('is the value itself when all are equal', () => {
    for (const value of [0.1, 1e300, 5e-324, -7.3]) expect(estimate(Array(7).fill(value))).toBe(value);
  });

  it('takes 1e300 and subnormal values', () => {
    const found = estimate([1e300, 1e300, 2e300, 1.7e308, 3e300, 1e300]);
    expect(found).toBeGreaterThanOrEqual(1e300);
    expect(found).toBeLessThanOrEqual(1.7e308);
    expect(estimate([5e-324, 5e-324, 1e-323, 1e-323])).toBeGreaterThan(0);
  });
});

describe.each(Object.entries(scales))('%s as a scale', (_, estimate) => {
  it('does not move with the values', () => {
    fc.assert(
      fc.property(quarters, fc.integer({ min: -1000, max: 1000 }), (values, shift) => {
        const moved = values.map((value) => value + shift);
        expectClose(estimate(moved), estimate(values), { atol: 1e-9 * spread(values) });
      }),
    );
  });

  it('is exactly zero when all values are equal', () => {
    for (const value of [0.1, 1e300, 5e-324, -7.3]) expect(estimate(Array(7).fill(value))).toBe(0);
  });

  it('gives the same figure at 1e300, times 1e300', () => {
    const small = [1, 1.5, 2, 2.25, 3, 7];
    expectClose(estimate(small.map((value) => value * 1e300)) / 1e300, estimate(small), { rtol: 1e-9 });
  });

  it('keeps its digits at 1e-300', () => {
    const small = [1, 1.5, 2, 2.25, 3, 7];
    expectClose(estimate(small.map((value) => value * 1e-300)) / 1e-300, estimate(small), { rtol: 1e-9 });
  });
});
