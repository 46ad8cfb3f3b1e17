import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { qn, sn } from '@/lib/stats';
import { kthDifference } from '@/lib/stats/internal/locate-difference';
import { selectKth } from '@/lib/stats/internal/select-kth';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

const ascending = (values: readonly number[]) => [...values].sort((a, b) => a - b);

function allDifferences(values: readonly number[]): number[] {
  return ascending(values.flatMap((x, i) => values.slice(0, i).map((y) => Math.abs(x - y))));
}

function slowQn(values: readonly number[]): number {
  const h = Math.floor(values.length / 2) + 1;
  return 2.21914 * (allDifferences(values)[(h * (h - 1)) / 2 - 1] as number);
}

function slowSn(values: readonly number[]): number {
  const n = values.length;
  const inner = values.map((x) => ascending(values.map((y) => Math.abs(x - y)))[Math.floor(n / 2)] as number);
  return 1.1926 * (ascending(inner)[Math.floor((n + 1) / 2) - 1] as number);
}

/** Few distinct figures, so that most inputs are full of ties. */
const tied = fc.array(fc.integer({ min: -6, max: 6 }), { minLength: 2, maxLength: 60 });
const broken = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 2, maxLength: 60 });

describe.each([
  ['qn', qn, slowQn],
  ['sn', sn, slowSn],
] as const)('%s', (_, fast, slow) => {
  it('is the slow definition on any input up to 60 values, with many ties', () => {
    for (const inputs of [tied, broken]) {
      fc.assert(
        fc.property(inputs, (values) => {
          expectClose(fast(values, { finiteSample: false }), slow(values), { rtol: 1e-15 });
        }),
        { numRuns: 500 },
      );
    }
  });

  it('stays bounded when nearly half of the values go wild', () => {
    const good = Array.from({ length: 25 }, (_, i) => 10 + Math.sin(i * 2.4));
    for (const size of [1e3, 1e9, 1e300]) {
      const wild = Array.from({ length: 23 }, (_, i) => size * (1 + i / 7));
      // At most the constant times the range of the good ones, which is 2.
      expect(fast([...good, ...wild])).toBeLessThan(2 * 2.3);
    }
  });

  it('takes two values, and refuses one', () => {
    expect(fast([1, 2])).toBeGreaterThan(0);
    expect(codeOf(() => fast([1]))).toBe('too-few-values');
  });

  it('takes the ends of the number range', () => {
    expect(codeOf(() => fast([-1.7e308, 1.7e308, 1.6e308, -1.6e308]))).toBe('out-of-domain');
    expect(fast([1e308, 1.1e308, 1.2e308, 1.3e308])).toBeGreaterThan(1e306);
    expect(fast([5e-324, 1e-323, 1.5e-323, 2e-323])).toBeGreaterThan(0);
  });
});

describe('finite-sample factors', () => {
  it('published, from memory: of Qn as ISO 13528 prints them to four digits', () => {
    const printed = [0.3994, 0.9937, 0.5132, 0.844, 0.6122, 0.8588, 0.6699, 0.8734, 0.7201, 0.8891, 0.7574];
    printed.forEach((factor, i) => {
      const values = Array.from({ length: i + 2 }, (_, j) => j * j);
      expectClose(qn(values) / qn(values, { finiteSample: false }), factor, { atol: 0.00005001 });
    });
  });

  it('go to 1 for many values, and the printed constant of ISO is an option', () => {
    const values = Array.from({ length: 999 }, (_, i) => Math.tan(((i + 0.5) / 999 - 0.5) * 3));
    expectClose(qn(values) / qn(values, { finiteSample: false }), 1, { atol: 0.002 });
    expectClose(sn(values) / sn(values, { finiteSample: false }), 999 / 998.1, { rtol: 1e-14 });
    expectClose(qn(values, { constant: 'iso-13528' }) / qn(values), 2.2219 / 2.21914, { rtol: 1e-14 });
  });
});

describe('kthDifference', () => {
  it('is the k-th of the full list, for every k, also where the list is too long to be kept', () => {
    const values = Float64Array.from(
      { length: 260 },
      (_, i) => Math.round(1000 * Math.sin(i * 1.7)) / 8,
    ).sort();
    const all = allDifferences([...values]);
    for (let k = 1; k <= all.length; k += 97) expect(kthDifference(values, k)).toBe(all[k - 1]);
    expect(kthDifference(values, all.length)).toBe(all.at(-1));
  });

  it('stands two values that make up nearly all differences', () => {
    const values = Float64Array.from({ length: 2000 }, (_, i) => (i % 2 === 0 ? 0 : 1)).sort();
    const equal = 2 * ((1000 * 999) / 2);
    expect(kthDifference(values, equal)).toBe(0);
    expect(kthDifference(values, equal + 1)).toBe(1);
  });
});

describe('selectKth', () => {
  it('finds the k-th smallest, and never becomes quadratic', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 30 }), { minLength: 1, maxLength: 200 }), (values) => {
        const k = values.length >> 1;
        expect(selectKth(Float64Array.from(values), k)).toBe(ascending(values)[k]);
      }),
    );
    const organ = Float64Array.from({ length: 200_000 }, (_, i) => Math.min(i, 200_000 - i));
    expect(selectKth(organ, 100_000)).toBe(50_000);
  });
});
