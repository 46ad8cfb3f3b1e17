import fc from 'fast-check';
import { expect, it } from 'vitest';
import { medianDeviationInPlace, medianInPlace } from '@/lib/stats/internal/median-in-place';
import { selectKth } from '@/lib/stats/internal/select-kth';
import { medianDeviationOfSorted, medianOfSorted, sortedCopy } from '@/lib/stats/internal/sorted';
import { spreadOrder, spreadSort } from '@/lib/stats/internal/spread-order';

const value = fc.oneof(
  fc.double({ noNaN: true }),
  fc.integer({ min: -3, max: 3 }),
  fc.constantFrom(5e-324, -5e-324, 1e308, -1e308, 0),
);
const data = fc.array(value, { minLength: 1, maxLength: 300 });
const finite = fc.array(
  value.filter((x) => Number.isFinite(x)),
  { minLength: 1, maxLength: 300 },
);

function byComparison(values: readonly number[]): number[] {
  return [...values.keys()].sort((a, b) => {
    const [p, q] = [values[a] as number, values[b] as number];
    return p < q ? -1 : p > q ? 1 : a - b;
  });
}

it('orders as a stable comparison does, over the whole number range', () => {
  fc.assert(
    fc.property(data, (values) => {
      expect([...spreadOrder(Float64Array.from(values))]).toEqual(byComparison(values));
    }),
  );
});

it('spreads stretches anew that a far value squeezed together', () => {
  const many = Array.from({ length: 7_000 }, (_, i) => 1 + ((i * 7919) % 7_000) * 1e-12);
  for (const far of [1e300, -1e300, 1e10]) {
    const values = [...many, far];
    const expected = Float64Array.from(values).sort();
    expect(spreadSort(Float64Array.from(values))).toEqual(expected);
    expect(sortedCopy(values)).toEqual(expected);
  }
  const powers = Array.from({ length: 6_500 }, (_, i) => 2 ** (((i * 997) % 2000) - 1000));
  expect(spreadSort(Float64Array.from(powers))).toEqual(Float64Array.from(powers).sort());
});

it('selects and takes medians as the sorted list has them', () => {
  fc.assert(
    fc.property(finite, fc.nat(), (values, seed) => {
      const sorted = Float64Array.from(values).sort();
      const k = seed % values.length;
      expect(selectKth(Float64Array.from(values), k) === sorted[k]).toBe(true);
      const median = medianOfSorted(sorted);
      expect(medianInPlace(Float64Array.from(values))).toBe(median);
      expect(medianDeviationInPlace(Float64Array.from(values), median)).toBe(
        medianDeviationOfSorted(sorted, median),
      );
    }),
  );
});

it('selects from long lists, whatever their order', () => {
  const n = 20_000;
  const shapes = {
    rising: (i: number) => i,
    falling: (i: number) => -i,
    equal: () => 4,
    organ: (i: number) => Math.min(i, n - i),
    mixed: (i: number) => Math.sin(i * i),
    few: (i: number) => (i * 7919) % 3,
  };
  for (const shape of Object.values(shapes)) {
    const values = Float64Array.from({ length: n }, (_, i) => shape(i));
    const sorted = values.slice().sort();
    for (const k of [0, 1, 9_999, 10_000, n - 1]) expect(selectKth(values.slice(), k)).toBe(sorted[k]);
  }
});
