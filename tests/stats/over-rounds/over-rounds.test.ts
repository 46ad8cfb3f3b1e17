import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  laboratoryOverRounds,
  lagOneAutocorrelation,
  mean,
  median,
  relationToGroup,
  relationToNumber,
  runningMedian,
  shewhartChart,
  zetaAgainstZ,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import fromR from '../fixtures/interlaboratory-r.json';
import { codeOf } from '../hostile';

describe('laboratoryOverRounds', () => {
  it.each(fromR.one.map((entry) => ({ ...entry, n: entry.z.length })))(
    'computed with R t.test: $n rounds',
    (entry) => {
      const found = laboratoryOverRounds(entry.z, { working: true });
      expectClose(found.biasPValue ?? NaN, entry.pValue, { rtol: 1e-8 });
      expectClose(found.biasLower, entry.lower, { rtol: 1e-9 });
      expectClose(found.biasUpper, entry.upper, { rtol: 1e-9 });
      expectClose(found.sdLower, entry.sdLower, { rtol: 1e-9 });
      expectClose(found.sdUpper, entry.sdUpper, { rtol: 1e-9 });
      expect(expectRedone(found.working)).toBe(8);
    },
  );

  it('finds a bias that never gave a signal', () => {
    const z = [-0.8, -1.1, -0.6, -0.9, -1.2, -0.7, -1.0, -0.5];
    expect(shewhartChart(z).beyondWarning).toBe(0);
    const found = laboratoryOverRounds(z);
    expect(found.biasUpper).toBeLessThan(0);
    expect(found.sdPValue).toBeLessThan(0.01);
  });

  it('takes equal scores and refuses the rest', () => {
    expect(laboratoryOverRounds([1, 1, 1])).toMatchObject({ bias: 1, sd: 0, biasPValue: null, sdUpper: 0 });
    expect(codeOf(() => laboratoryOverRounds([1]))).toBe('too-few-values');
    expect(codeOf(() => laboratoryOverRounds([1, NaN]))).toBe('not-finite');
    expect(codeOf(() => laboratoryOverRounds([1e200, -1e200]))).toBe('out-of-domain');
    expect(codeOf(() => laboratoryOverRounds([1, 2], { confidence: 1 }))).toBe('out-of-domain');
  });
});

describe('runningMedian', () => {
  it('is the median of the window, for every window', () => {
    const scores = fc.array(fc.integer({ min: -30, max: 30 }), { minLength: 1, maxLength: 60 });
    fc.assert(
      fc.property(scores, fc.integer({ min: 1, max: 9 }), (z, window) => {
        runningMedian(z, { window }).forEach((value, i) => {
          expect(value).toBe(median(z.slice(Math.max(0, i - window + 1), i + 1)));
        });
      }),
    );
    expect(codeOf(() => runningMedian([1], { window: 0 }))).toBe('out-of-domain');
    expect(codeOf(() => runningMedian([]))).toBe('too-few-values');
  });
});

describe('zetaAgainstZ', () => {
  const rounds = (pairs: readonly (readonly [number, number])[]) => pairs.map(([z, zeta]) => ({ z, zeta }));

  it('tells understated, overstated and realistic uncertainties apart', () => {
    expect(
      zetaAgainstZ(
        rounds([
          [0.5, 3],
          [-0.8, -4],
          [1, 5],
          [0.2, 1],
          [0.7, 3],
        ]),
      ).verdict,
    ).toBe('understated');
    expect(zetaAgainstZ(rounds(Array(8).fill([1.5, 0.2]))).verdict).toBe('overstated');
    expect(
      zetaAgainstZ(
        rounds([
          [1, 0.8],
          [-1, -1.2],
          [0.5, 0.6],
          [1.4, 1.5],
          [-0.2, -0.4],
        ]),
      ).verdict,
    ).toBe('realistic');
    expect(
      zetaAgainstZ(
        rounds([
          [1, 9],
          [1, 9],
        ]),
      ).verdict,
    ).toBe('too-few-rounds');
  });

  it('sorts rounds by both scores; 2 is not beyond', () => {
    const found = zetaAgainstZ(
      rounds([
        [2, 2],
        [1, 2.1],
        [-2.5, 1],
        [3, -3],
      ]),
      { working: true },
    );
    expect(found.classes).toEqual([
      'fit-and-covered',
      'uncertainty-small',
      'uncertainty-large',
      'error-not-covered',
    ]);
    expect(found.counts['error-not-covered']).toBe(1);
    expect(expectRedone(found.working)).toBe(3);
  });

  it('covers the true factor as often as it says', () => {
    // The interval holds 1 exactly when the sum of squares lies between the chi-square limits.
    const found = zetaAgainstZ(
      rounds([
        [0, 1],
        [0, 1],
        [0, 1],
        [0, 1],
      ]),
    );
    expectClose(found.factor, 1, { rtol: 1e-15 });
    expect(found.factorLower).toBeLessThan(1);
    expect(found.factorUpper).toBeGreaterThan(1);
    expect(
      zetaAgainstZ(
        rounds([
          [0, 0],
          [0, 0],
          [0, 0],
          [0, 0],
        ]),
      ),
    ).toMatchObject({ factor: 0, verdict: 'overstated' });
    expect(codeOf(() => zetaAgainstZ([]))).toBe('too-few-values');
    expect(codeOf(() => zetaAgainstZ(rounds([[NaN, 1]])))).toBe('not-finite');
  });
});

describe('relations of z', () => {
  const manyRounds = fromR.anova
    .map((entry, i) => ({ ...entry, i }))
    .filter(({ groups }) => groups.flat().length >= 4);

  it.each(fromR.lines.map((entry) => ({ ...entry, n: entry.x.length })))(
    'computed with R: to a number, $n',
    (entry) => {
      const found = relationToNumber(entry.y, entry.x, { working: true });
      expect(expectRedone(found.working, { rtol: 1e-8 })).toBe(3);
      expectClose(found.trend.slope, entry.slope, { rtol: 1e-9 });
      expectClose(found.rankCorrelation, entry.rho, { rtol: 1e-12 });
    },
  );

  it.each(manyRounds)('computed with R: to a kind, data set $i', (entry) => {
    const z = entry.groups.flat();
    const labels = entry.groups.flatMap((own, i) => own.map(() => `kind ${i}`));
    const found = relationToGroup(z, labels, { working: true });
    expect(expectRedone(found.working, { rtol: 1e-8 })).toBe(entry.groups.length + 1);
    expectClose(found.rankStatistic, entry.rank, { rtol: 1e-9 });
    expectClose(found.rankPValue, entry.rankPValue, { rtol: 1e-8 });
    expectClose(found.anova?.fRatio ?? NaN, entry.fRatio, { rtol: 1e-9 });
    found.groups.forEach(({ mean: centre, lower, rounds }, i) => {
      expect(centre).toBe(mean(entry.groups[i] ?? []));
      expect(lower === null).toBe(rounds < 2);
    });
  });

  it('refuse what they cannot use', () => {
    expect(codeOf(() => relationToNumber([1, 2, 3], [1, 2, 3]))).toBe('too-few-values');
    expect(codeOf(() => relationToNumber([1, 2, 3, 4], [1, 2, 3]))).toBe('unequal-lengths');
    expect(codeOf(() => relationToNumber([1, 2, 3, 4], [1, 1, 1, 1]))).toBe('no-spread');
    expect(codeOf(() => relationToNumber([1, 1, 1, 1], [1, 2, 3, 4]))).toBe('no-spread');
    expect(codeOf(() => relationToNumber([1, 2, 3, 4], [1, 2, NaN, 4]))).toBe('not-finite');
    expect(relationToNumber([1, 2, 3, 4], [2, 4, 6, 8])).toMatchObject({
      rankCorrelation: 1,
      rankPValue: null,
    });
    expect(codeOf(() => relationToGroup([1, 2, 3, 4], ['A', 'A', 'A', 'A']))).toBe('too-few-values');
    expect(codeOf(() => relationToGroup([1, 2, 3, 4], ['A', 'B']))).toBe('unequal-lengths');
    expect(codeOf(() => relationToGroup([1, 1, 1, 1], ['A', 'B', 'A', 'B']))).toBe('no-spread');
    expect(relationToGroup([1, 2, 3, 4], ['A', 'B', 'C', 'D']).anova).toBeNull();
  });
});

describe('lagOneAutocorrelation', () => {
  it('follows its definition and does not change with origin and unit', () => {
    const scores = fc
      .array(fc.integer({ min: -30, max: 30 }), { minLength: 3, maxLength: 60 })
      .filter((z) => new Set(z).size > 1);
    fc.assert(
      fc.property(scores, (z) => {
        const m = z.reduce((sum, value) => sum + value, 0) / z.length;
        const d = z.map((value) => value - m);
        const top = d.slice(1).reduce((sum, value, i) => sum + value * (d[i] as number), 0);
        const found = lagOneAutocorrelation(z);
        expectClose(found, top / d.reduce((sum, value) => sum + value * value, 0), { atol: 1e-12 });
        expectClose(lagOneAutocorrelation(z.map((value) => (value + 7) * 2 ** -600)), found, { atol: 1e-12 });
      }),
    );
    expect(codeOf(() => lagOneAutocorrelation([1, 1, 1]))).toBe('no-spread');
    expect(codeOf(() => lagOneAutocorrelation([1, 2]))).toBe('too-few-values');
  });
});
