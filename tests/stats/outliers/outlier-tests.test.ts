import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  cochranTest,
  dixonTest,
  generalisedEsd,
  grubbsOne,
  grubbsTwoOpposite,
  grubbsTwoSame,
  mandelStatistics,
  outlierScreen,
  tietjenMoore,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import { codeOf } from '../hostile';

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const average = (values: readonly number[]) => sum(values) / values.length;
const squares = (values: readonly number[]) => sum(values.map((value) => (value - average(values)) ** 2));
const spread = (values: readonly number[]) => Math.sqrt(squares(values) / (values.length - 1));

// Published, read in the NIST/SEMATECH e-Handbook 1.3.5.17.1 (uranium isotope, Tietjen and Moore 1972).
const URANIUM = [199.31, 199.53, 200.19, 200.82, 201.92, 201.95, 202.18, 245.57];
// Published, from memory: Rosner 1983, vitamin E, as in the NIST/SEMATECH e-Handbook 1.3.5.17.3.
const ROSNER = [
  -0.25, 0.68, 0.94, 1.15, 1.2, 1.26, 1.26, 1.34, 1.38, 1.43, 1.49, 1.49, 1.55, 1.56, 1.58, 1.65, 1.69, 1.7,
  1.76, 1.77, 1.81, 1.91, 1.94, 1.96, 1.99, 2.06, 2.09, 2.1, 2.14, 2.15, 2.23, 2.24, 2.26, 2.35, 2.37, 2.4,
  2.47, 2.54, 2.62, 2.64, 2.9, 2.92, 2.92, 2.93, 3.21, 3.26, 3.3, 3.59, 3.68, 4.3, 4.64, 5.34, 5.42, 6.01,
];

describe('outlier tests on known data', () => {
  it('Grubbs flags the one wild uranium result', () => {
    const found = grubbsOne(URANIUM, { working: true });
    expect(found).toMatchObject({ verdict: 'outlier', suspects: [7] });
    expect(expectRedone(found.working)).toBe(3);
  });

  it('published, from memory: generalised ESD finds three outliers in the Rosner data, masked ones too', () => {
    const found = generalisedEsd(ROSNER, { maxOutliers: 10, working: true });
    expect(found.outliers).toBe(3);
    expect(found.suspects.map((i) => ROSNER[i])).toEqual([6.01, 5.42, 5.34]);
    const printed = [3.118, 2.942, 3.179, 2.81, 2.815, 2.848, 2.279, 2.31, 2.101, 2.067];
    found.steps.forEach(({ statistic }, i) => expectClose(statistic, printed[i] as number, { atol: 0.0011 }));
    expect(expectRedone(found.working)).toBe(10);
  });

  it('the pair test sees two that hide each other', () => {
    const values = [10, 11, 12, 13, 14, 30, 31];
    expect(grubbsOne(values).verdict).toBe('none');
    const pair = grubbsTwoSame(values, { working: true });
    expect(pair).toMatchObject({ verdict: 'outlier', suspects: [5, 6] });
    expectClose(pair.statistic, squares(values.slice(0, 5)) / squares(values), { rtol: 1e-14 });
    expectRedone(pair.working, {
      inWords: {
        "Grubbs' ratio for two outliers": ({ inputs }) =>
          squares(inputs.kept as number[]) / squares(inputs.x as number[]),
      },
    });
  });

  it('published, from memory: the Tietjen-Moore statistic of the lunar data is 0.292', () => {
    // NIST/SEMATECH e-Handbook 1.3.5.17.2: Venus semi-diameters, Grubbs 1950, k = 2.
    const venus = [
      -1.4, -0.44, -0.3, -0.24, -0.22, -0.13, -0.05, 0.06, 0.1, 0.18, 0.2, 0.39, 0.48, 0.63, 1.01,
    ];
    const found = tietjenMoore(venus, 2);
    expectClose(found.statistic, 0.292, { atol: 0.00051 });
    expect(found.suspects).toEqual([0, 14]);
  });

  it('show their working', () => {
    expectRedone(dixonTest([10.1, 10.2, 10.3, 10.2, 12], { working: true }).working);
    expectRedone(grubbsTwoOpposite([1, 10, 11, 12, 13, 22], { working: true }).working);
    const groups = [[1, 1.2], [2, 2.1, 2.3], [3, 4], [2.5]];
    expectRedone(cochranTest(groups, { working: true }).working);
    expect(expectRedone(mandelStatistics(groups, { working: true }).working)).toBe(7);
  });

  it('take the suspect from the right end', () => {
    expect(dixonTest([0, 10, 10.1, 10.3, 10.2]).suspects).toEqual([0]);
    expect(grubbsOne([0, 10, 10.1, 10.3, 10.2]).suspects).toEqual([0]);
    expect(grubbsTwoSame([0, 0.1, 10.1, 10.3, 10.2, 10]).suspects).toEqual([0, 1]);
    expect(grubbsOne([0, 10, 10.1, 10.3, 10.2], { side: 'highest' }).suspects).toEqual([3]);
    expect(dixonTest([10, 10, 10, 12]).statistic).toBe(1);
    expect(dixonTest([10, 10, 10, 12], { side: 'lowest' }).statistic).toBe(0);
  });
});

const values = fc.array(
  fc.integer({ min: -300, max: 300 }).map((n) => n / 10),
  { minLength: 4, maxLength: 60 },
);
const differing = values.filter((list) => new Set(list).size > 1);

describe('outlier tests against their plain definitions', () => {
  it('Grubbs, one and two', () => {
    fc.assert(
      fc.property(differing, (list) => {
        const sorted = [...list].sort((a, b) => a - b);
        const s = spread(list);
        const [low, high] = [
          average(list) - (sorted[0] as number),
          (sorted.at(-1) as number) - average(list),
        ];
        expectClose(grubbsOne(list).statistic, Math.max(low, high) / s, { rtol: 1e-10 });
        expectClose(grubbsTwoOpposite(list).statistic, (low + high) / s, { rtol: 1e-10 });
        const two = Math.min(squares(sorted.slice(2)), squares(sorted.slice(0, -2))) / squares(list);
        expectClose(grubbsTwoSame(list).statistic, two, { rtol: 1e-9, atol: 1e-13 });
      }),
      { numRuns: 25 },
    );
  });

  it('generalised ESD, step by step', () => {
    fc.assert(
      fc.property(differing, (list) => {
        const maxOutliers = Math.min(4, list.length - 2);
        const { steps } = generalisedEsd(list, { maxOutliers });
        const taken = new Set<number>();
        for (const { index, statistic } of steps) {
          const kept = list.filter((_, i) => !taken.has(i));
          const largest = Math.max(...kept.map((value) => Math.abs(value - average(kept)))) / spread(kept);
          expectClose(statistic, largest, { rtol: 1e-9 });
          taken.add(index);
        }
      }),
    );
  });

  it('Tietjen-Moore takes the furthest away', () => {
    fc.assert(
      fc.property(differing, (list) => {
        const k = Math.min(3, list.length - 2);
        const far = list.map((value) => Math.abs(value - average(list))).sort((a, b) => b - a);
        const { suspects, statistic } = tietjenMoore(list, k);
        const own = suspects.map((i) => Math.abs((list[i] as number) - average(list))).sort((a, b) => b - a);
        own.forEach((distance, i) => expectClose(distance, far[i] as number, { atol: 1e-9 }));
        const kept = list.filter((_, i) => !suspects.includes(i));
        expectClose(statistic, squares(kept) / squares(list), { rtol: 1e-9, atol: 1e-13 });
      }),
    );
  });

  it('statistics do not change with unit and origin, and decide alike', () => {
    fc.assert(
      fc.property(differing, fc.constantFrom(2 ** -500, 1e-300, 3, 1e250), (list, unit) => {
        const moved = list.map((value) => value * unit);
        for (const run of [grubbsOne, grubbsTwoOpposite]) {
          expectClose(run(moved).statistic, run(list).statistic, { rtol: 1e-9 });
        }
        const plain = generalisedEsd(list, { maxOutliers: 1 }).steps[0];
        expectClose(
          generalisedEsd(moved, { maxOutliers: 1 }).steps[0]?.statistic ?? NaN,
          plain?.statistic ?? NaN,
          {
            rtol: 1e-9,
          },
        );
      }),
    );
  });
});

describe('Cochran and Mandel', () => {
  const groups = [[1.1, 1.2, 1.0], [2.3, 2.1], [1.9, 1.8, 2.4], [1.4]];

  it('follow their definitions with unequal numbers', () => {
    const variances = groups.slice(0, 3).map((own) => spread(own) ** 2);
    const found = cochranTest(groups);
    expectClose(found.statistic, Math.max(...variances) / sum(variances), { rtol: 1e-12 });
    expect(found).toMatchObject({ suspect: 2, groups: 3, replicates: 3 });
    const means = groups.map(average);
    const mandel = mandelStatistics(groups);
    mandel.laboratories.forEach(({ h, k }, i) => {
      expectClose(h, ((means[i] as number) - average(means)) / spread(means), { rtol: 1e-12 });
      if (i < 3)
        expectClose(k ?? NaN, Math.sqrt((variances[i] as number) / average(variances)), { rtol: 1e-12 });
      else expect(k).toBeNull();
    });
  });

  it('h sums to zero and k to the number of laboratories in squares', () => {
    const { laboratories } = mandelStatistics(groups.slice(0, 3));
    expectClose(sum(laboratories.map(({ h }) => h)), 0, { atol: 1e-12 });
    expectClose(sum(laboratories.map(({ k }) => (k ?? 0) ** 2)), 3, { rtol: 1e-12 });
  });

  it('have no k where nothing spreads within', () => {
    const { laboratories } = mandelStatistics([
      [1, 1],
      [2, 2],
      [4, 4],
    ]);
    expect(laboratories.map(({ k }) => k)).toEqual([null, null, null]);
  });
});

describe('outlierScreen', () => {
  it('flags the spread and the mean apart, and nobody is left out', () => {
    const found = outlierScreen([
      [1, 1.1],
      [1.2, 1.1],
      [1, 1.2],
      [1.1, 1.15],
      [1.0, 1.05],
      [1.1, 1.2],
      [0.2, 2.1],
      [4, 4.05],
    ]);
    expect(found.flags).toContainEqual({ laboratory: 6, test: 'cochran', verdict: 'outlier' });
    expect(found.flags).toContainEqual({ laboratory: 7, test: 'grubbs-one', verdict: 'outlier' });
    expect(found.grubbsTwo).toBeNull();
    expect(found.mandel?.laboratories).toHaveLength(8);
  });

  it('says why a test is missing', () => {
    const found = outlierScreen([[1], [2], [3.5]]);
    expect(found.cochran).toBeNull();
    expect(found.reasons.join(' ')).toContain('cochranTest requires at least 2 groups with replicates');
    expect(
      outlierScreen([
        [2, 2],
        [2, 2],
        [2, 2],
      ]).reasons,
    ).toHaveLength(3);
  });
});

describe('hostile input of outlier tests', () => {
  const tests: readonly [string, (list: readonly number[]) => unknown, number][] = [
    ['grubbsOne', (list) => grubbsOne(list), 3],
    ['grubbsTwoSame', (list) => grubbsTwoSame(list), 4],
    ['grubbsTwoOpposite', (list) => grubbsTwoOpposite(list), 3],
    ['dixonTest', (list) => dixonTest(list), 3],
    ['generalisedEsd', (list) => generalisedEsd(list, { maxOutliers: 1 }), 3],
    ['tietjenMoore', (list) => tietjenMoore(list, 1), 3],
  ];

  it.each(tests)('%s', (_, run, least) => {
    const list = Object.freeze([1, 3, 2, 5, 4].slice(0, least));
    expect(codeOf(() => run(list.slice(1)))).toBe('too-few-values');
    expect(codeOf(() => run([]))).toBe('too-few-values');
    expect(codeOf(() => run([1, 2, NaN, 4]))).toBe('not-finite');
    expect(codeOf(() => run([1, 2, Infinity, 4]))).toBe('not-finite');
    expect(codeOf(() => run([7, 7, 7, 7]))).toBe('no-spread');
    expect(codeOf(() => run([0, -0, 0, -0]))).toBe('no-spread');
    const text = JSON.stringify([run(list), run([1e300, -1e300, 1.7e308, 5]), run([5e-324, 0, 1e-323, 0])]);
    expect(text).not.toMatch(/NaN|null,"critical/);
  });

  it('the tests of groups', () => {
    expect(codeOf(() => cochranTest([]))).toBe('too-few-values');
    expect(codeOf(() => cochranTest([[1, 2], []]))).toBe('too-few-values');
    expect(
      codeOf(() =>
        cochranTest([
          [1, NaN],
          [1, 2],
        ]),
      ),
    ).toBe('not-finite');
    expect(
      codeOf(() =>
        cochranTest([
          [1, 1],
          [2, 2],
        ]),
      ),
    ).toBe('no-spread');
    expect(
      codeOf(() =>
        mandelStatistics([
          [1, 2],
          [1, 2],
        ]),
      ),
    ).toBe('too-few-values');
    expect(
      codeOf(() =>
        mandelStatistics([
          [1, 2],
          [1, 2],
          [2, 1],
        ]),
      ),
    ).toBe('no-spread');
    expect(codeOf(() => generalisedEsd([1, 2, 3, 4], { maxOutliers: 3 }))).toBe('out-of-domain');
    expect(codeOf(() => generalisedEsd([1, 2, 3, 4], { maxOutliers: 0 }))).toBe('too-few-values');
    expect(codeOf(() => dixonTest(Array.from({ length: 101 }, (_, i) => i)))).toBe('out-of-domain');
  });
});
