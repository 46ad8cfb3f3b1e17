import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  homogeneity,
  homogeneityFactors,
  mean,
  oneWayAnova,
  sd,
  stability,
  stabilityTrend,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import fromR from '../fixtures/interlaboratory-r.json';
import { codeOf } from '../hostile';

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const reading = fc.integer({ min: 900, max: 1100 }).map((n) => n / 10);
const checks = fc
  .tuple(fc.integer({ min: 3, max: 12 }), fc.integer({ min: 2, max: 4 }))
  .chain(([g, m]) =>
    fc.array(fc.array(reading, { minLength: m, maxLength: m }), { minLength: g, maxLength: g }),
  );

const ITEMS = [
  [10.1, 10.2],
  [9.8, 9.9],
  [10.0, 10.1],
  [10.3, 10.1],
  [9.9, 10.0],
  [10.0, 10.2],
  [10.1, 10.0],
];

describe('homogeneity', () => {
  it('follows the definitions for any number of items and replicates', () => {
    fc.assert(
      fc.property(checks, (items) => {
        const found = homogeneity({ items, sigmaPt: 5 }, { working: true });
        const [g, m] = [items.length, (items[0] as number[]).length];
        const sw2 = sum(items.map((item) => sd(item) ** 2)) / g;
        const sx = sd(items.map((item) => mean(item)));
        expectClose(found.withinSd, Math.sqrt(sw2), { rtol: 1e-9, atol: 1e-12 });
        expectClose(found.meansSd, sx, { rtol: 1e-9, atol: 1e-12 });
        expectClose(found.betweenSd ** 2, Math.max(0, sx * sx - sw2 / m), { atol: 1e-9 });
        expect(found.criterion.met).toBe(found.betweenSd <= 1.5);
        if (found.criterion.met) expect(found.verdict).toBe('homogeneous');
        expect(found.remedies.length > 0).toBe(found.verdict === 'not-homogeneous');
        expectRedone(found.working, { atol: 1e-7 });
      }),
    );
  });

  it('agrees with the analysis of variance', () => {
    const found = homogeneity({ items: ITEMS, sigmaPt: 1 });
    const anova = oneWayAnova(ITEMS);
    expectClose(found.betweenSd, anova.betweenSd, { rtol: 1e-12 });
    expectClose(found.withinSd, anova.residualSd, { rtol: 1e-12 });
    expectClose(found.pValue ?? NaN, anova.pValue ?? NaN, { rtol: 1e-12 });
  });

  it('accepts by the expanded criterion what could be chance', () => {
    const items = [
      [10, 10.6],
      [10.7, 10.3],
      [9.3, 9.9],
      [10.2, 9.6],
      [9.5, 10.1],
      [10.8, 10.2],
      [9.4, 9.2],
    ];
    const strict = homogeneity({ items, sigmaPt: 1.2 });
    expect(strict.criterion.met).toBe(false);
    expect(strict.verdict).toBe('homogeneous-by-expanded');
    const apart = items.map(([first = 0], i) => [first + i, first + i + 0.02]);
    const failed = homogeneity({ items: apart, sigmaPt: 0.3 }, { working: true });
    expect(failed.verdict).toBe('not-homogeneous');
    expect(failed.method.goodEnough).toBe(true);
    expect(homogeneity({ items, sigmaPt: 0.3 }).method.goodEnough).toBe(false);
    expectClose(failed.remedies[0]?.value ?? NaN, Math.hypot(0.3, failed.betweenSd), { rtol: 1e-14 });
    expect(failed.remedies.map(({ kind }) => kind)).toContain('do-not-use');
  });

  it('is at the limit, and passes, where the decimals say so', () => {
    // Means 0 and sqrt(2) 0.03 apart would be needed; here s_x is 0.3 exactly by decimals, s_w is 0.
    const items = [
      [1, 1],
      [1.3, 1.3],
      [1.6, 1.6],
    ];
    expectClose(homogeneity({ items, sigmaPt: 1 }).betweenSd, 0.3, { rtol: 1e-15 });
    expect(homogeneity({ items, sigmaPt: 1 }).criterion.met).toBe(true);
    expect(homogeneity({ items, sigmaPt: 0.999 }).criterion.met).toBe(false);
  });

  it('sees a trend along the filling order, and a drift along the order of measurement', () => {
    const drifting = Array.from({ length: 10 }, (_, i) => [10 + 0.1 * i, 10.02 + 0.1 * i, 9.98 + 0.1 * i]);
    const found = homogeneity({ items: drifting, sigmaPt: 2 });
    expectClose(found.fillingTrend?.slope ?? NaN, 0.1, { rtol: 1e-9 });
    const shuffled = homogeneity({
      items: drifting,
      sigmaPt: 2,
      fillingOrder: [3, 9, 1, 10, 2, 8, 4, 7, 5, 6],
      measurementOrder: drifting.map((_, i) => [3 * i, 3 * i + 1, 3 * i + 2]),
    });
    expect(shuffled.fillingTrend?.pValue).toBeGreaterThan(0.05);
    expect(shuffled.measurementTrend?.pValue).toBeLessThan(1e-6);
    expect(shuffled.replicatesTogether).toBe(true);
    const random = drifting.map((_, i) => [i, 20 - i, 25 + i]);
    expect(homogeneity({ items: drifting, sigmaPt: 2, measurementOrder: random }).replicatesTogether).toBe(
      false,
    );
  });

  it('flags an item whose replicates differ too much', () => {
    const items = ITEMS.map((item, i) => (i === 3 ? [9.2, 11.4] : item));
    expect(homogeneity({ items, sigmaPt: 1 }).cochran).toMatchObject({ suspect: 3, verdict: 'outlier' });
  });

  it('refuses what it cannot use, and takes what has no spread', () => {
    const run = (items: number[][], more = {}) => codeOf(() => homogeneity({ items, sigmaPt: 1, ...more }));
    expect(run([[1, 2]])).toBe('too-few-values');
    expect(run([[1], [2]])).toBe('too-few-values');
    expect(
      run([
        [1, 2],
        [1, 2, 3],
      ]),
    ).toBe('unequal-lengths');
    expect(
      run([
        [1, NaN],
        [1, 2],
      ]),
    ).toBe('not-finite');
    expect(run(ITEMS, { sigmaPt: 0 })).toBe('no-spread');
    expect(run(ITEMS, { sigmaPt: -1 })).toBe('out-of-domain');
    expect(run(ITEMS, { fillingOrder: [1, 2] })).toBe('unequal-lengths');
    expect(run(ITEMS, { fillingOrder: [1, 1, 1, 1, 1, 1, 1] })).toBe('no-spread');
    expect(run(ITEMS, { fillingOrder: [1, 2, 3, 4, 5, 6, NaN] })).toBe('not-finite');
    expect(run(ITEMS, { measurementOrder: [[1, 2]] })).toBe('unequal-lengths');
    const equal = homogeneity({
      items: [
        [2, 2],
        [2, 2],
        [2, 2],
      ],
      sigmaPt: 1,
    });
    expect(equal).toMatchObject({
      verdict: 'homogeneous',
      cochran: null,
      pValue: null,
      betweenSd: 0,
      withinSd: 0,
    });
    const scaled = homogeneity({ items: ITEMS.map((item) => item.map((x) => x * 1e-300)), sigmaPt: 1e-300 });
    expectClose(scaled.betweenSd / 1e-300, homogeneity({ items: ITEMS, sigmaPt: 1 }).betweenSd, {
      rtol: 1e-9,
    });
  });
});

describe('homogeneityFactors', () => {
  it('refuse what is no number of items', () => {
    expect(codeOf(() => homogeneityFactors({ items: 1 }))).toBe('too-few-values');
    expect(codeOf(() => homogeneityFactors({ items: 10, replicates: 1 }))).toBe('too-few-values');
    expect(codeOf(() => homogeneityFactors({ items: 2.5 }))).toBe('out-of-domain');
  });

  it('need less allowance with more replicates', () => {
    const f2 = [2, 3, 4, 6].map((replicates) => homogeneityFactors({ items: 10, replicates }).f2);
    expect(f2).toEqual([...f2].sort((a, b) => b - a));
  });
});

describe('stability', () => {
  it.each([
    [10, 10.3, 1, 'stable'],
    [10.3, 10, 1, 'stable'],
    [10, 10.31, 1, 'not-stable'],
    [1.1, 1.07, 0.1, 'stable'],
  ] as const)('%d and %d against sigma_pt %d: %s', (before, after, sigmaPt, verdict) => {
    expect(stability({ before, after, sigmaPt }).verdict).toBe(verdict);
  });

  it('widens the limit by the uncertainty of both means', () => {
    const input = { before: 10, after: 10.6, sigmaPt: 1, beforeUncertainty: 0.15, afterUncertainty: 0.2 };
    const found = stability(input, { working: true });
    expectClose(found.expanded?.limit ?? NaN, 0.3 + 2 * 0.25, { rtol: 1e-14 });
    expect(found.verdict).toBe('stable-by-expanded');
    expect(expectRedone(found.working)).toBe(3);
    const failed = stability({ before: 10, after: 11, sigmaPt: 1 });
    expectClose(failed.addedUncertainty ?? NaN, 1 / Math.sqrt(3), { rtol: 1e-14 });
    expect(failed.expanded).toBeNull();
  });

  it('refuses what it cannot use', () => {
    expect(codeOf(() => stability({ before: NaN, after: 1, sigmaPt: 1 }))).toBe('not-finite');
    expect(codeOf(() => stability({ before: 1, after: 1, sigmaPt: 0 }))).toBe('no-spread');
    expect(codeOf(() => stability({ before: 1, after: 1, sigmaPt: 1, afterUncertainty: -1 }))).toBe(
      'out-of-domain',
    );
    expect(codeOf(() => stability({ before: 1e308, after: -1.7e308, sigmaPt: 1 }))).toBe('out-of-domain');
  });
});

describe('stabilityTrend', () => {
  it.each(fromR.lines.map((entry) => ({ ...entry, n: entry.x.length })))(
    'computed with R lm: $n points',
    (entry) => {
      const found = stabilityTrend({ times: entry.x, values: entry.y, sigmaPt: 1 }, { working: true });
      expectClose(found.trend.slope, entry.slope, { rtol: 1e-9 });
      expectClose(found.trend.standardError, entry.se, { rtol: 1e-9 });
      expectClose(found.trend.pValue ?? NaN, entry.pValue, { rtol: 1e-8 });
      expectClose(found.trend.lower, entry.lower, { rtol: 1e-8 });
      expectClose(found.trend.upper, entry.upper, { rtol: 1e-8 });
      expect(expectRedone(found.working)).toBe(4);
    },
  );

  it('tells shown stable, not seen, negligible, undecided and not stable apart', () => {
    const verdict = (values: readonly number[], sigmaPt: number) =>
      stabilityTrend({ times: values.map((_, i) => i), values, sigmaPt }).verdict;
    expect(verdict([10, 10.01, 9.99, 10, 10.01], 1)).toBe('shown-stable');
    expect(verdict([10, 10.2, 9.8, 10.1, 9.9], 1)).toBe('no-trend-seen');
    expect(verdict([10, 10.11, 10.19, 10.31, 10.39], 1.35)).toBe('trend-negligible');
    expect(verdict([10, 10.8, 9.9, 11, 10.7], 1)).toBe('undecided');
    expect(verdict([10, 9.5, 9.1, 8.4, 8], 1)).toBe('not-stable');
  });

  it('takes points on a line, equal values and a period of its own', () => {
    const exact = stabilityTrend({ times: [0, 1, 2], values: [10, 9, 8], sigmaPt: 1, period: 10 });
    expect(exact.trend).toMatchObject({ t: null, pValue: null, standardError: 0 });
    expect(exact).toMatchObject({ change: -10, verdict: 'not-stable', significant: true });
    expect(stabilityTrend({ times: [0, 1, 2], values: [5, 5, 5], sigmaPt: 1 })).toMatchObject({
      change: 0,
      verdict: 'shown-stable',
    });
  });

  it('refuses what it cannot use', () => {
    const run = (times: number[], values: number[], more = {}) =>
      codeOf(() => stabilityTrend({ times, values, sigmaPt: 1, ...more }));
    expect(run([0, 1], [1, 2])).toBe('too-few-values');
    expect(run([0, 1], [1, 2, 3])).toBe('unequal-lengths');
    expect(run([1, 1, 1], [1, 2, 3])).toBe('no-spread');
    expect(run([1, 2, NaN], [1, 2, 3])).toBe('not-finite');
    expect(run([1, 2, 3], [1, 2, 3], { period: -1 })).toBe('out-of-domain');
    expect(run([1, 2, 3], [1e308, -1e308, 1.7e308], { period: 1e300 })).toBe('out-of-domain');
  });
});
