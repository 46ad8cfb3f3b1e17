import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  methodGroups,
  oneWayAnova,
  repeatabilityAgainstLocation,
  youdenPair,
  type GroupedResult,
} from '@/lib/stats';
import { rankSum } from '@/lib/stats/internal/rank-sum';
import { holm } from '@/lib/stats/pairs-and-groups/holm';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import fromR from '../fixtures/interlaboratory-r.json';
import { codeOf } from '../hostile';

const reading = fc.integer({ min: 0, max: 300 }).map((n) => n / 10);
const somePairs = fc
  .array(fc.record({ a: reading, b: reading }), { minLength: 5, maxLength: 40 })
  .filter((pairs) => new Set(pairs.map(({ a }) => a)).size > 2 && new Set(pairs.map(({ b }) => b)).size > 2);

describe('youdenPair', () => {
  it.each(fromR.pairs.map((entry) => ({ ...entry, n: entry.a.length })))(
    'computed with R: $n pairs',
    (entry) => {
      const pairs = entry.a.map((a, i) => ({ a, b: entry.b[i] as number }));
      const found = youdenPair(pairs, { working: true });
      found.laboratories.forEach(({ squaredDistance }, i) => {
        expectClose(squaredDistance ?? NaN, entry.squared[i] as number, { rtol: 1e-9, atol: 1e-12 });
      });
      expectClose(found.ellipses[1].semiMajor, entry.semiMajor99, { rtol: 1e-9 });
      expectClose(found.ellipses[1].semiMinor, entry.semiMinor99, { rtol: 1e-9 });
      expectClose(oneWayAnova(pairs.map(({ a, b }) => [a, b])).residualSd, residualAbout(found, pairs), {
        rtol: 1e-9,
      });
    },
  );

  /** Within-pair sd with the mean difference left in, from randomSd and meanDifference. */
  function residualAbout(
    found: { randomSd: number; meanDifference: number },
    pairs: readonly unknown[],
  ): number {
    const n = pairs.length;
    return Math.sqrt((2 * (n - 1) * found.randomSd ** 2 + n * found.meanDifference ** 2) / (2 * n));
  }

  it('can be redone from its working, and turns with the axes', () => {
    fc.assert(
      fc.property(somePairs, (pairs) => {
        const found = youdenPair(pairs, { working: true });
        const inWords = {
          'Random sd': (step: { inputs: Readonly<Record<string, unknown>> }) => differenceSd(step.inputs, -1),
          'Total sd': (step: { inputs: Readonly<Record<string, unknown>> }) => differenceSd(step.inputs, 1),
        };
        expectRedone(found.working, { atol: 1e-5, inWords });
        const turned = youdenPair(pairs.map(({ a, b }) => ({ a: b, b: a })));
        expectClose(turned.randomSd, found.randomSd, { rtol: 1e-10, atol: 1e-12 });
        expectClose(turned.ellipses[0].semiMajor, found.ellipses[0].semiMajor, { rtol: 1e-10 });
        turned.laboratories.forEach(({ own, squaredDistance }, i) => {
          expectClose(own, -(found.laboratories[i]?.own ?? NaN), { atol: 1e-10 });
          const other = found.laboratories[i]?.squaredDistance ?? null;
          if (squaredDistance !== null && other !== null)
            expectClose(squaredDistance, other, { rtol: 1e-8, atol: 1e-9 });
        });
      }),
    );
  });

  function differenceSd(inputs: Readonly<Record<string, unknown>>, sign: 1 | -1): number {
    const [a, b] = [inputs.a as readonly number[], inputs.b as readonly number[]];
    const d = a.map((value, i) => value + sign * (b[i] as number));
    const centre = d.reduce((sum, value) => sum + value, 0) / d.length;
    return Math.sqrt(d.reduce((sum, value) => sum + (value - centre) ** 2, 0) / (2 * (d.length - 1)));
  }

  it('robust: a wild laboratory does not blow the ellipse up and falls outside it', () => {
    const pairs = fromR.pairs[1]?.a.map((a, i) => ({ a, b: fromR.pairs[1]?.b[i] as number })) ?? [];
    const wild = [...pairs, { a: 1000, b: -1000 }];
    const robust = youdenPair(wild, { spread: 'robust' });
    expect(robust.ellipses[1].semiMajor).toBeLessThan(3 * youdenPair(pairs).ellipses[1].semiMajor);
    expect(robust.laboratories.at(-1)?.outside99).toBe(true);
    expect(youdenPair(wild).ellipses[1].semiMajor).toBeGreaterThan(100);
    expectClose(youdenPair(pairs, { spread: 'robust' }).correlation, youdenPair(pairs).correlation, {
      atol: 0.3,
    });
  });

  it('takes pairs on a line, and extreme numbers', () => {
    const line = youdenPair([1, 2, 3, 5].map((a) => ({ a, b: a + 2 })));
    expect(line).toMatchObject({ correlation: 1, randomSd: 0 });
    expect(line.laboratories.every((entry) => entry.squaredDistance === null && !entry.outside95)).toBe(true);
    expect(line.ellipses[0].semiMinor).toBe(0);
    expectClose(line.ellipses[0].angleDegrees, 45, { rtol: 1e-12 });
    expectClose(line.systematicSd, line.totalSd / Math.SQRT2, { rtol: 1e-12 });
    const base = youdenPair([
      { a: 1, b: 4 },
      { a: 2, b: 3 },
      { a: 4, b: 9 },
      { a: 3, b: 3 },
      { a: 7, b: 5 },
    ]);
    for (const unit of [1e-300, 1e300]) {
      const pairs = [
        [1, 4],
        [2, 3],
        [4, 9],
        [3, 3],
        [7, 5],
      ].map(([a = 0, b = 0]) => ({ a: a * unit, b: b * unit }));
      // The covariance of 1e300 is no number, and is refused; 1e-300 is taken.
      if (unit > 1) expect(codeOf(() => youdenPair(pairs))).toBe('out-of-domain');
      else
        expectClose(youdenPair(pairs).ellipses[0].semiMajor / unit, base.ellipses[0].semiMajor, {
          rtol: 1e-9,
        });
    }
  });

  it('counts quadrants: all in two of them is no chance', () => {
    const pairs = Array.from({ length: 10 }, (_, i) => ({ a: i, b: 10 + i + (i % 2) / 10 }));
    expect(youdenPair(pairs).quadrants).toEqual({ same: 10, counted: 10, pValue: 1 / 1024 });
  });

  it('refuses what it cannot use', () => {
    const pair = { a: 1, b: 2 };
    expect(codeOf(() => youdenPair([pair, pair, pair]))).toBe('too-few-values');
    expect(codeOf(() => youdenPair([pair, pair, pair, pair]))).toBe('no-spread');
    expect(codeOf(() => youdenPair([pair, pair, pair, { a: NaN, b: 2 }]))).toBe('not-finite');
  });
});

describe('repeatabilityAgainstLocation', () => {
  const groups = [
    [1, 1.2, 1.1],
    [1.1, 1.25, 1.2],
    [1.05, 1.1, 1.0],
    [1.2, 1.15, 1.1],
    [1.1, 1.3, 1.2],
    [1, 1.2, 1.0],
  ];

  it('puts its contour where the statistic is the chi-square limit', () => {
    const found = repeatabilityAgainstLocation(groups);
    for (const { level, points } of found.contours) {
      expect(points).toHaveLength(73);
      expect(points[0]).toEqual(points[72]);
      for (const point of points) {
        const aside = ((point.mean - found.location) / found.meansSd) ** 2;
        const up = 2 * (found.replicates - 1) * Math.log(point.sd / found.withinSd) ** 2;
        expectClose(aside + up, -2 * Math.log(1 - level), { rtol: 1e-9 });
      }
    }
  });

  it('shows bias to the side and poor repeatability upwards', () => {
    const found = repeatabilityAgainstLocation([...groups, [9, 9.1, 9.2], [0.1, 1.1, 2.2]], {
      working: true,
    });
    expect(expectRedone(found.working)).toBe(8);
    expect(found.laboratories[6]?.outside99).toBe(true);
    expect(found.laboratories[7]?.outside99).toBe(true);
    expect(found.laboratories[7]?.mean).toBeCloseTo(1.133, 3);
    const between = repeatabilityAgainstLocation(groups, { meansSd: 'between' });
    expect(between.meansSd).not.toBe(repeatabilityAgainstLocation(groups).meansSd);
  });

  it('takes an sd of 0 and refuses what it cannot use', () => {
    const found = repeatabilityAgainstLocation([...groups, [1.1, 1.1, 1.1]]);
    expect(found.laboratories[6]).toMatchObject({ statistic: null, pValue: null, outside95: false });
    expect(
      codeOf(() =>
        repeatabilityAgainstLocation([
          [1, 2],
          [1, 2],
        ]),
      ),
    ).toBe('too-few-values');
    expect(
      codeOf(() =>
        repeatabilityAgainstLocation([
          [1, 2],
          [1, 2],
          [1, 2, 3],
        ]),
      ),
    ).toBe('unequal-lengths');
    expect(
      codeOf(() =>
        repeatabilityAgainstLocation([
          [1, 1],
          [2, 2],
          [3, 3],
        ]),
      ),
    ).toBe('no-spread');
    expect(codeOf(() => repeatabilityAgainstLocation(groups, { contourPoints: 3 }))).toBe('out-of-domain');
  });
});

const asGroups = (lists: Readonly<Record<string, readonly number[]>>): GroupedResult[] =>
  Object.entries(lists).flatMap(([group, values]) => values.map((value) => ({ group, value })));

describe('methodGroups', () => {
  it.each(fromR.two.map((entry, i) => ({ ...entry, i, n: entry.x.length })))(
    'computed with R t.test and wilcox.test: $n results, set $i',
    (entry) => {
      const found = methodGroups(asGroups({ x: entry.x, y: entry.y }), { working: true });
      const [pair] = found.differences;
      expectClose(pair?.degreesOfFreedom ?? NaN, entry.degreesOfFreedom, { rtol: 1e-9 });
      expectClose(pair?.welchPValue ?? NaN, entry.pValue, { rtol: 1e-8 });
      expectClose(pair?.lower ?? NaN, entry.lower, { rtol: 1e-9, atol: 1e-11 });
      expectClose(pair?.upper ?? NaN, entry.upper, { rtol: 1e-9, atol: 1e-11 });
      expectClose(pair?.rankPValue ?? NaN, entry.rankPValue, { rtol: 1e-8 });
      expect(pair?.rankExact).toBe(entry.exact);
      expect(expectRedone(found.working, { atol: 1e-10 })).toBe(8);
    },
  );

  it('computed with R p.adjust: Holm', () => {
    holm(fromR.holm.p).forEach((value, i) =>
      expectClose(value, fromR.holm.adjusted[i] as number, { rtol: 1e-14 }),
    );
  });

  it('counts all pairs, says the chance of one small p, and compares robustly', () => {
    const found = methodGroups(asGroups({ A: [1, 2, 3, 2, 2.2], B: [5, 6, 7, 6, 600], C: [2, 3], D: [4] }));
    expect(found.comparisons).toBe(3);
    expectClose(found.chanceOfOne, 1 - 0.95 ** 3, { rtol: 1e-12 });
    expect(found.groups.map(({ group, tooFew }) => [group, tooFew])).toEqual([
      ['A', false],
      ['B', false],
      ['C', true],
      ['D', true],
    ]);
    expect(found.groups[3]).toMatchObject({ sd: null, robustMean: null, standardUncertainty: null });
    const [ab] = found.differences;
    expect(Math.abs(ab?.robustDifference ?? 0)).toBeLessThan(6);
    expect(Math.abs(ab?.meanDifference ?? 0)).toBeGreaterThan(100);
    expect(ab?.rankAdjusted).toBeGreaterThanOrEqual(ab?.rankPValue ?? 1);
    expect(found.overall?.degreesOfFreedom).toBe(3);
  });

  it('takes groups without spread, and a single group', () => {
    const found = methodGroups(asGroups({ A: [1, 1, 1], B: [2, 2] }));
    expect(found.differences[0]).toMatchObject({
      welchPValue: null,
      welchAdjusted: null,
      robustPValue: null,
      lower: -1,
      upper: -1,
    });
    expect(methodGroups(asGroups({ A: [1, 2] }))).toMatchObject({
      differences: [],
      overall: null,
      chanceOfOne: 0,
    });
    expect(methodGroups(asGroups({ A: [1, 1], B: [1, 1] })).overall).toBeNull();
    expect(codeOf(() => methodGroups([]))).toBe('too-few-values');
    expect(codeOf(() => methodGroups([{ group: 'A', value: Infinity }]))).toBe('not-finite');
  });

  it('the exact rank test counts every arrangement', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 0, max: 50 }), { minLength: 2, maxLength: 9 }),
        fc.nat(),
        (list, at) => {
          const m = 1 + (at % (list.length - 1));
          const { statistic, pValue } = rankSum(list.slice(0, m), list.slice(m));
          // Every subset of size m, by bits.
          let [atMost, all] = [0, 0];
          const low = Math.min(statistic, m * (list.length - m) - statistic);
          for (let bits = 0; bits < 2 ** list.length; bits += 1) {
            const chosen = list.map((_, i) => i).filter((i) => bits & (1 << i));
            if (chosen.length !== m) continue;
            all += 1;
            if (chosen.reduce((sum, i) => sum + i + 1, 0) - (m * (m + 1)) / 2 <= low) atMost += 1;
          }
          expectClose(pValue, Math.min(1, (2 * atMost) / all), { rtol: 1e-10 });
        },
      ),
    );
  });
});
