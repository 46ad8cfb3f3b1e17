import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { selectAbsoluteSlope } from '@/lib/stats/method-comparison/slopes/absolute-slope-ranks';
import { signOfProductDifference, toWholeUnits } from '@/lib/stats/method-comparison/slopes/exact-sign';
import { orderPoints } from '@/lib/stats/method-comparison/slopes/point-grid';
import { SlopeRanks } from '@/lib/stats/method-comparison/slopes/slope-ranks';
import { expectClose } from '../expect-close';
import { asDecimals, generatorOf, wholePairs } from './random';
import { allSlopes } from './slow';

const ranked = wholePairs(2).chain((pairs) =>
  fc.record({
    pairs: fc.constant(pairs),
    limit: fc.constantFrom(1, 3, 10, 10_000),
    share: fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }),
  }),
);

describe('ranks of slopes', () => {
  it('are exactly those of the list of all pairs, for decimals with many ties', () => {
    fc.assert(
      fc.property(ranked, ({ pairs, limit, share }) => {
        const { x, y, decimals } = pairs;
        const list = allSlopes(pairs);
        const points = orderPoints(asDecimals(x, decimals), asDecimals(y, decimals));
        expect(points.decimal).toBe(true);
        const ranks = new SlopeRanks(points, { listLimit: limit });
        expect(ranks.total).toBe(list.length);
        if (list.length === 0) return;
        const rank = Math.floor(share * list.length);
        expect(ranks.select(rank) + 0).toBe(list[rank]);
        expect(ranks.select(list.length - 1) + 0).toBe(list[list.length - 1]);
        expect(ranks.select(0) + 0).toBe(list[0]);
      }),
      { numRuns: 600 },
    );
  });

  it('are exactly those of the list of sizes for |slope|', () => {
    fc.assert(
      fc.property(ranked, ({ pairs, limit, share }) => {
        const sizes = allSlopes(pairs)
          .map(Math.abs)
          .sort((a, b) => a - b);
        if (sizes.length === 0) return;
        const { x, y, decimals } = pairs;
        const points = orderPoints(asDecimals(x, decimals), asDecimals(y, decimals));
        const rank = Math.floor(share * sizes.length);
        expect(selectAbsoluteSlope(new SlopeRanks(points, { listLimit: limit }), rank)).toBe(sizes[rank]);
      }),
      { numRuns: 400 },
    );
  });

  it('agree to rounding for any doubles, of any size', () => {
    const double = fc.double({ min: -1e9, max: 1e9, noNaN: true });
    const wild = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e120, max: 1e120 });
    const points = fc.oneof(
      fc.array(fc.tuple(double, double), { minLength: 2, maxLength: 40 }),
      fc.array(fc.tuple(wild, wild), { minLength: 2, maxLength: 25 }),
      fc
        .array(fc.tuple(fc.integer({ min: 0, max: 9 }), fc.integer({ min: 0, max: 9 })), {
          minLength: 2,
          maxLength: 30,
        })
        .map((list) => list.map(([a, b]) => [a / 3, b / 7] as [number, number])),
    );
    fc.assert(
      fc.property(points, fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }), (list, share) => {
        const x = list.map(([a]) => a);
        const y = list.map(([, b]) => b);
        const slopes = allSlopes({ x, y });
        if (slopes.length === 0) return;
        const rank = Math.floor(share * slopes.length);
        const found = new SlopeRanks(orderPoints(x, y), { listLimit: 2 }).select(rank);
        const expected = slopes[rank] as number;
        if (Number.isFinite(expected)) expectClose(found, expected, { rtol: 1e-15, atol: Number.MIN_VALUE });
      }),
      { numRuns: 400 },
    );
  });

  it('find the one slope that half of all pairs share', () => {
    const x = Array.from({ length: 3_000 }, (_, i) => Math.round(i / 4) / 100);
    const ranks = new SlopeRanks(orderPoints(x, x));
    expect(ranks.select(0)).toBe(1);
    expect(ranks.select(Math.floor(ranks.total / 2))).toBe(1);
    expect(ranks.select(ranks.total - 1)).toBe(1);
  });

  it('do not change their input', () => {
    const x = Object.freeze([3, 1, 2, 2]) as number[];
    const y = Object.freeze([1, 2, 2, 5]) as number[];
    expect(new SlopeRanks(orderPoints(x, y)).select(0)).toBe(-4);
  });

  it('take memory that grows with n and not with its square', () => {
    const next = generatorOf(1);
    const x = Array.from({ length: 100_000 }, () => next());
    const y = x.map((value) => value + next());
    const ranks = new SlopeRanks(orderPoints(x, y));
    // Five thousand million pairs: as a list they would need 40 GB.
    expectClose(ranks.select(Math.floor(ranks.total / 2)), 1, { atol: 0.01 });
  });
});

describe('exact signs', () => {
  it('of differences of products are those of whole numbers', () => {
    const whole = fc.integer({ min: -(2 ** 52), max: 2 ** 52 });
    fc.assert(
      fc.property(whole, whole, whole, whole, (a, b, c, d) => {
        const exact = BigInt(a) * BigInt(b) - BigInt(c) * BigInt(d);
        expect(signOfProductDifference(a, b, c, d)).toBe(exact > 0n ? 1 : exact < 0n ? -1 : 0);
      }),
    );
    expect(signOfProductDifference(3, 7, 21, 1)).toBe(0);
    expect(signOfProductDifference(2 ** 52 + 1, 2 ** 52 - 1, 2 ** 52, 2 ** 52)).toBe(-1);
  });

  it('of doubles as whole numbers of a binary place', () => {
    expect(toWholeUnits(Number.MIN_VALUE, 1)).toBe(1n);
    expect(toWholeUnits(-1.5, 1023)).toBe(-(3n << 51n));
  });
});
