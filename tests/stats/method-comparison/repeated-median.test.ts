import fc from 'fast-check';
import { expect, it } from 'vitest';
import { orderPoints } from '@/lib/stats/method-comparison/slopes/point-grid';
import { directRepeatedMedian } from '@/lib/stats/method-comparison/rank-lines/direct-repeated-median';
import { searchedRepeatedMedian } from '@/lib/stats/method-comparison/rank-lines/repeated-median-slope';
import { expectClose } from '../expect-close';
import { asDecimals, wholePairs } from './random';
import { slowRepeatedMedian } from './slow';

it('searches out what the definition gives, for decimals with many ties', () => {
  fc.assert(
    fc.property(wholePairs(2), ({ x, y, decimals }) => {
      const slow = slowRepeatedMedian({ x, y });
      const points = orderPoints(asDecimals(x, decimals), asDecimals(y, decimals));
      for (const found of [searchedRepeatedMedian(points), directRepeatedMedian(points)]) {
        if (slow === null || found === null) expect(found).toBe(slow);
        else expectClose(found, slow, { rtol: 1e-15 });
      }
    }),
    { numRuns: 400 },
  );
});

it('searches out what the definition gives, for any doubles', () => {
  const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
  fc.assert(
    fc.property(fc.array(fc.tuple(value, value), { minLength: 26, maxLength: 60 }), (pairs) => {
      const x = pairs.map(([a]) => a);
      const y = pairs.map(([, b]) => b);
      const slow = slowRepeatedMedian({ x, y });
      if (slow === null || !Number.isFinite(slow)) return;
      const found = searchedRepeatedMedian(orderPoints(x, y));
      expectClose(found ?? NaN, slow, { rtol: 1e-14, atol: Number.MIN_VALUE });
    }),
    { numRuns: 200 },
  );
});

it('gives the same either way on both sides of the number of points where the way changes', () => {
  for (const n of [149, 400, 401]) {
    const x = Array.from({ length: n }, (_, i) => Math.round(1000 * Math.sin(i * i)) / 100);
    const y = x.map((value, i) => Math.round(100 * (value + Math.cos(3 * i * i))) / 100);
    const points = orderPoints(x, y);
    expectClose(searchedRepeatedMedian(points) ?? NaN, directRepeatedMedian(points) ?? NaN, { rtol: 1e-15 });
  }
});
