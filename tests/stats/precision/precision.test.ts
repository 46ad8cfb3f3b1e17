import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  algorithmA,
  algorithmS,
  mean,
  oneWayAnova,
  pooledSd,
  precision,
  precisionAgainstLevel,
  precisionUncertaintyFactors,
  qMethodReplicates,
  robustPrecision,
  sd,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import fromR from '../fixtures/interlaboratory-r.json';
import { codeOf } from '../hostile';

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);

/** Laboratories with a few results each, as reported: few digits, ties happen. */
const trials = fc
  .array(
    fc.array(
      fc.integer({ min: 0, max: 400 }).map((n) => n / 10),
      { minLength: 1, maxLength: 5 },
    ),
    { minLength: 3, maxLength: 20 },
  )
  .filter((groups) => groups.some((group) => group.length > 1));

describe('oneWayAnova', () => {
  it.each(fromR.anova.map((entry, i) => ({ ...entry, i })))('computed with R: data set $i', (entry) => {
    const found = oneWayAnova(entry.groups);
    expectClose(found.betweenSquares, entry.betweenSquares, { rtol: 1e-9 });
    expectClose(found.withinSquares, entry.withinSquares, { rtol: 1e-9 });
    expectClose(found.fRatio ?? NaN, entry.fRatio, { rtol: 1e-9 });
    expectClose(found.pValue ?? NaN, entry.pValue, { rtol: 1e-8 });
  });

  it('keeps all digits of tight decimal data, where doubles have lost half of them', () => {
    // Made on the pattern of NIST SmLs09: thirteen leading digits in common.
    const pattern = [0.3, 0.5, 0.4, 0.2, 0.6];
    const groups = [0, 0.1, 0.3].map((step) =>
      pattern.map((x) => Number(`1000000000000.${Math.round((x + step) * 10)}`)),
    );
    const small = [0, 0.1, 0.3].map((step) => pattern.map((x) => Math.round((x + step) * 10) / 10));
    expectClose(oneWayAnova(groups).fRatio ?? NaN, oneWayAnova(small).fRatio ?? NaN, { rtol: 1e-12 });
    expectClose(oneWayAnova(groups).residualSd, oneWayAnova(small).residualSd, { rtol: 1e-12 });
  });

  it('has no F without spread within, and no share without any', () => {
    expect(
      oneWayAnova([
        [1, 1],
        [2, 2],
      ]),
    ).toMatchObject({ fRatio: null, pValue: null, rSquared: 1 });
    expect(
      oneWayAnova([
        [2, 2],
        [2, 2],
      ]),
    ).toMatchObject({ fRatio: null, rSquared: null, betweenSd: 0 });
  });
});

describe('precision', () => {
  it('follows ISO 5725-2 term by term, with unequal numbers', () => {
    fc.assert(
      fc.property(trials, (groups) => {
        const found = precision(groups, { working: true });
        const n = groups.map((group) => group.length);
        const [p, total] = [groups.length, sum(n)];
        const m = sum(groups.flat()) / total;
        const within =
          sum(groups.map((group) => (group.length > 1 ? (group.length - 1) * sd(group) ** 2 : 0))) /
          (total - p);
        const between = sum(groups.map((group) => group.length * (mean(group) - m) ** 2)) / (p - 1);
        const nMean = (total - sum(n.map((count) => count ** 2)) / total) / (p - 1);
        const variance = Math.max(0, (between - within) / nMean);
        expectClose(found.mean, m, { rtol: 1e-12, atol: 1e-12 });
        expectClose(found.repeatabilitySd, Math.sqrt(within), { rtol: 1e-9, atol: 1e-12 });
        expectClose(found.betweenSd ** 2, variance, { rtol: 1e-9, atol: 1e-9 });
        expectClose(found.reproducibilitySd ** 2, within + variance, { rtol: 1e-9, atol: 1e-9 });
        expect(found.reproducibilitySd).toBeGreaterThanOrEqual(found.repeatabilitySd);
        expectRedone(found.working, { rtol: 1e-8, atol: 1e-6 });
      }),
    );
  });

  it('moves with the data and scales with the unit', () => {
    fc.assert(
      fc.property(
        trials,
        fc.integer({ min: -1000, max: 1000 }),
        fc.constantFrom(1e-300, 0.25, 1e290),
        (groups, c, k) => {
          const plain = precision(groups);
          const moved = precision(groups.map((group) => group.map((value) => (value + c) * k)));
          expectClose(moved.repeatabilitySd / k, plain.repeatabilitySd, { rtol: 1e-9, atol: 1e-10 });
          expectClose(moved.reproducibilitySd / k, plain.reproducibilitySd, { rtol: 1e-9, atol: 1e-10 });
          expectClose(moved.mean / k, plain.mean + c, { rtol: 1e-12, atol: 1e-10 });
        },
      ),
    );
  });

  it('gives HorRat in the unit of the data', () => {
    const found = precision(
      [
        [10, 11],
        [14, 13],
        [9, 9.5],
      ],
      { massFractionPerUnit: 1e-9, working: true },
    );
    expect(found.horRat).toBeGreaterThan(0.3);
    expect(expectRedone(found.working)).toBe(9);
    expect(
      precision([
        [10, 11],
        [14, 13],
      ]).horRat,
    ).toBeNull();
  });

  it('takes another factor of the limits', () => {
    const groups = [
      [1, 2],
      [3, 4],
      [8, 9],
    ];
    const exact = precision(groups, { limitFactor: 1.96 * Math.SQRT2 });
    expectClose(exact.repeatabilityLimit / exact.repeatabilitySd, 2.7718585822512662, { rtol: 1e-14 });
    expect(codeOf(() => precision(groups, { limitFactor: 0 }))).toBe('out-of-domain');
  });

  it('refuses what it cannot use', () => {
    expect(codeOf(() => precision([[1, 2]]))).toBe('too-few-values');
    expect(codeOf(() => precision([[1], [2], [3]]))).toBe('too-few-values');
    expect(codeOf(() => precision([[1, 2], []]))).toBe('too-few-values');
    expect(codeOf(() => precision([[1, 2], [Infinity]]))).toBe('not-finite');
    const frozen = Object.freeze([Object.freeze([1, 2]), Object.freeze([2, 3])]);
    expect(precision(frozen).laboratories).toBe(2);
    expect(
      precision([
        [2, 2],
        [2, 2],
      ]),
    ).toMatchObject({ repeatabilitySd: 0, reproducibilitySd: 0, mean: 2 });
  });
});

describe('robustPrecision', () => {
  const groups = [
    [1, 1.2],
    [1.1, 1.2],
    [1, 1.1],
    [1.3, 1.2],
    [5, 9],
  ];

  it('puts algorithms A and S together', () => {
    const found = robustPrecision(groups, { working: true });
    const x = algorithmA(groups.map((group) => mean(group)));
    const w = algorithmS(
      groups.map((group) => sd(group)),
      { degreesOfFreedom: 1 },
    );
    expect(found.mean).toBe(x.location);
    expect(found.repeatabilitySd).toBe(w.pooled);
    expectClose(found.betweenSd, Math.sqrt(Math.max(0, x.scale ** 2 - w.pooled ** 2 / 2)), { rtol: 1e-12 });
    const replay = {
      'Robust mean and sd of the laboratory means': (step: {
        iterations?: readonly Record<string, number>[];
      }) => step.iterations?.at(-1)?.newScale ?? NaN,
      'Robust repeatability standard deviation s_r': (step: {
        iterations?: readonly Record<string, number>[];
      }) => step.iterations?.at(-1)?.newPooled ?? NaN,
    };
    expect(expectRedone(found.working, { inWords: replay })).toBe(4);
  });

  it('is moved little by a wild laboratory, where the classical figures are carried away', () => {
    const wild = robustPrecision([...groups.slice(0, 4), [5e6, 9e6]]);
    expectClose(wild.reproducibilitySd, robustPrecision(groups).reproducibilitySd, { rtol: 1e-6 });
    expect(precision([...groups.slice(0, 4), [5e6, 9e6]]).reproducibilitySd).toBeGreaterThan(1e6);
  });

  it('by Q and Hampel takes unequal numbers', () => {
    const unequal = [...groups, [1.2]];
    const found = robustPrecision(unequal, { method: 'q-and-hampel', working: true });
    const q = qMethodReplicates(unequal);
    expect(found.reproducibilitySd).toBe(q.reproducibilitySd);
    expect(found.repeatabilitySd).toBe(q.repeatabilitySd);
    expect(found.working?.length).toBeGreaterThan(2);
    expect(codeOf(() => robustPrecision(unequal))).toBe('too-few-values');
    expect(
      codeOf(() =>
        robustPrecision([
          [1, 2],
          [1, 2, 3],
        ]),
      ),
    ).toBe('unequal-lengths');
    expect(codeOf(() => robustPrecision([[1], [2], [3]], { method: 'q-and-hampel' }))).toBe('too-few-values');
  });
});

describe('pooledSd', () => {
  it('is the root of the weighted mean square', () => {
    expectClose(
      pooledSd([
        { sd: 3, degreesOfFreedom: 1 },
        { sd: 4, degreesOfFreedom: 3 },
      ]).sd,
      Math.sqrt(57 / 4),
      {
        rtol: 1e-15,
      },
    );
    expectClose(
      pooledSd([
        { sd: 3e300, degreesOfFreedom: 1 },
        { sd: 4e300, degreesOfFreedom: 1 },
      ]).sd,
      3.5355339059327378e300,
      {
        rtol: 1e-14,
      },
    );
    expect(pooledSd([{ sd: 0, degreesOfFreedom: 2 }])).toEqual({ sd: 0, degreesOfFreedom: 2 });
    expect(codeOf(() => pooledSd([]))).toBe('too-few-values');
    expect(codeOf(() => pooledSd([{ sd: -1, degreesOfFreedom: 2 }]))).toBe('out-of-domain');
    expect(codeOf(() => pooledSd([{ sd: NaN, degreesOfFreedom: 2 }]))).toBe('not-finite');
  });
});

describe('precisionUncertaintyFactors', () => {
  it('follow the printed equations', () => {
    const plain = (p: number, n: number, g: number) => ({
      bias: 1.96 * Math.sqrt((n * (g * g - 1) + 1) / (g * g * p * n)),
      repeatability: 1.96 * Math.sqrt(1 / (2 * p * (n - 1))),
      reproducibility:
        1.96 *
        Math.sqrt((p * (1 + n * (g * g - 1)) ** 2 + (n - 1) * (p - 1)) / (2 * g ** 4 * n * n * (p - 1) * p)),
    });
    for (const [p, n, g] of [
      [5, 2, 1],
      [10, 3, 2.5],
      [40, 4, 5],
    ] as const) {
      const found = precisionUncertaintyFactors({ laboratories: p, replicates: n, ratio: g });
      const expected = plain(p, n, g);
      expectClose(found.bias, expected.bias, { rtol: 1e-12 });
      expectClose(found.repeatability, expected.repeatability, { rtol: 1e-12 });
      expectClose(found.reproducibility, expected.reproducibility, { rtol: 1e-12 });
    }
    expect(codeOf(() => precisionUncertaintyFactors({ laboratories: 1, replicates: 2, ratio: 2 }))).toBe(
      'too-few-values',
    );
    expect(codeOf(() => precisionUncertaintyFactors({ laboratories: 5, replicates: 2.5, ratio: 2 }))).toBe(
      'out-of-domain',
    );
    expect(codeOf(() => precisionUncertaintyFactors({ laboratories: 5, replicates: 2, ratio: 0.5 }))).toBe(
      'out-of-domain',
    );
    expect(
      precisionUncertaintyFactors({ laboratories: 5, replicates: 2, ratio: 1e300 }).bias,
    ).toBeGreaterThan(0);
  });
});

describe('precisionAgainstLevel', () => {
  const at = (means: readonly number[], of: (m: number) => number) =>
    means.map((m) => ({ mean: m, sd: of(m) }));
  const MEANS = [0.5, 1, 2, 5, 20];

  it.each([
    ['constant', (m: number) => 0.3 + 0 * m],
    ['proportional', (m: number) => 0.07 * m],
    ['linear', (m: number) => 0.2 + 0.05 * m],
    ['log-log', (m: number) => 0.1 * m ** 0.85],
  ] as const)('finds a relation that holds exactly: %s', (relation, of) => {
    const found = precisionAgainstLevel(at(MEANS, of));
    expect(found.closest).toBe(relation);
    const own = {
      constant: found.constant,
      proportional: found.proportional,
      linear: found.linear,
      'log-log': found.logLog,
    };
    own[relation]?.fitted.forEach((value, i) => expectClose(value, of(MEANS[i] as number), { rtol: 1e-10 }));
  });

  it('weights by the fitted sd, so that the line stands still under its own weights', () => {
    const levels = [1.1, 0.9, 1.2, 0.8, 1.05].map((wobble, i) => {
      const m = MEANS[i] as number;
      return { mean: m, sd: (0.2 + 0.05 * m) * wobble };
    });
    const { linear, working } = precisionAgainstLevel(levels, { working: true });
    expect(expectRedone(working)).toBe(6);
    // Normal equations with weights 1 / fitted^2.
    const fitted = linear?.fitted ?? [];
    const residual = levels.map(({ sd: s }, i) => (s - (fitted[i] as number)) / (fitted[i] as number) ** 2);
    expectClose(sum(residual), 0, { atol: 1e-9 });
    expectClose(sum(residual.map((r, i) => r * (MEANS[i] as number))), 0, { atol: 1e-8 });
  });

  it('leaves out relations that cannot hold', () => {
    expect(precisionAgainstLevel(at([-1, 1, 2], () => 1))).toMatchObject({
      proportional: null,
      logLog: null,
    });
    expect(
      precisionAgainstLevel([
        { mean: 1, sd: 0 },
        { mean: 2, sd: 1 },
        { mean: 3, sd: 1 },
      ]).logLog,
    ).toBeNull();
    expect(codeOf(() => precisionAgainstLevel(at([1, 2], () => 1)))).toBe('too-few-values');
    expect(codeOf(() => precisionAgainstLevel(at([1, 1, 1], () => 1)))).toBe('no-spread');
    expect(codeOf(() => precisionAgainstLevel(at([1, 2, 3], () => 0)))).toBe('no-spread');
    expect(codeOf(() => precisionAgainstLevel(at([1, 2, 3], () => -1)))).toBe('out-of-domain');
    expect(codeOf(() => precisionAgainstLevel(at([1, NaN, 3], () => 1)))).toBe('not-finite');
  });

  it('never gives NaN', () => {
    const level = fc.record({
      mean: fc.double({ min: -1e300, max: 1e300, noNaN: true }),
      sd: fc.double({ min: 0, max: 1e300, noNaN: true }),
    });
    fc.assert(
      fc.property(fc.array(level, { minLength: 3, maxLength: 8 }), (levels) => {
        try {
          const text = JSON.stringify(precisionAgainstLevel(levels), (_, value: unknown) =>
            typeof value === 'number' && !Number.isFinite(value) ? 'BAD' : value,
          );
          expect(text).not.toContain('BAD');
        } catch (error) {
          expect(error).toHaveProperty('code');
        }
      }),
    );
  });
});
