import { describe, expect, it } from 'vitest';
import {
  biasAtLevel,
  biasAtLevelByBootstrap,
  blandAltman,
  concordance,
  decisionAgreement,
  deming,
  detectionLimits,
  countingDetectionLimits,
  differenceOfLaboratoryPod,
  equivalence,
  kappa,
  kendall,
  laboratoryPod,
  limitsAtLevel,
  mcNemar,
  methodDetectionLimit,
  ordinaryLeastSquares,
  outlyingPairs,
  pairedT,
  pearson,
  proportionDifference,
  proportionInterval,
  readingRepeatability,
  regressionLimits,
  replicateAgreement,
  spearman,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { generatorOf, normalOf } from './random';

const next = generatorOf(21);
const noise = normalOf(next);
const x = Array.from({ length: 40 }, () => 5 + 20 * next());
const y = x.map((value) => value + 0.5 + noise());

describe('limits of agreement', () => {
  it('change sign when the methods are exchanged and move with the data', () => {
    const there = blandAltman(x, y);
    const back = blandAltman(y, x);
    expectClose(back.mean, -there.mean, { rtol: 1e-14 });
    expectClose(back.lowerLimit, -there.upperLimit, { rtol: 1e-14 });
    expectClose(back.upperLimitExact.upper, -there.lowerLimitExact.lower, { rtol: 1e-12 });
    const moved = blandAltman(
      x.map((v) => 4 * v),
      y.map((v) => 4 * v),
    );
    expectClose(moved.sd, 4 * there.sd, { rtol: 1e-14 });
  });

  it('have percent and ratios that do not depend on the unit', () => {
    for (const kind of ['percent', 'ratio'] as const) {
      const there = blandAltman(x, y, { kind });
      const scaled = blandAltman(
        x.map((v) => v * 1000),
        y.map((v) => v * 1000),
        { kind },
      );
      expectClose(scaled.mean, there.mean, { rtol: 1e-11 });
      expectClose(scaled.upperLimit, there.upperLimit, { rtol: 1e-11 });
    }
    const ratio = blandAltman([1, 2, 4], [2, 4, 8], { kind: 'ratio' }).asRatio;
    expectClose(ratio?.mean ?? NaN, 2, { rtol: 1e-14 });
  });

  it('give exact intervals that hold the limit with the stated confidence (seeded simulation)', () => {
    // The limits lie a fixed number of standard deviations from the mean; here those are 0 and 1.
    const unit = 1 / Math.sqrt(8 / 7);
    const { upperLimitExact: factors } = blandAltman(
      Array.from({ length: 8 }, () => 0),
      [1, 1, 1, 1, -1, -1, -1, -1].map((v) => v * unit),
    );
    const draw = normalOf(generatorOf(5));
    let held = 0;
    for (let run = 0; run < 2000; run += 1) {
      const b = Array.from({ length: 8 }, () => draw());
      const mean = b.reduce((sum, value) => sum + value, 0) / 8;
      const sd = Math.sqrt(b.reduce((sum, value) => sum + (value - mean) ** 2, 0) / 7);
      if (mean + factors.lower * sd <= 1.96 && mean + factors.upper * sd >= 1.96) held += 1;
    }
    expectClose(held / 2000, 0.95, { atol: 0.015 });
  });

  it('are the mean alone without spread', () => {
    const flat = blandAltman([1, 2, 3], [2, 3, 4]);
    expect(flat).toMatchObject({ mean: 1, sd: 0, lowerLimit: 1, upperLimit: 1 });
    expect(flat.upperLimitExact).toEqual({ lower: 1, upper: 1 });
  });

  it('for replicates are those of single readings when there is one of each', () => {
    const items = (values: number[]) => values.map((value) => [value]);
    const twice = (values: number[]) => values.map((value) => [value, value]);
    expect(codeOf(() => replicateAgreement(items(x), items(y)))).toBe('too-few-values');
    expectClose(replicateAgreement(twice(x), twice(y)).sd, blandAltman(x, y).sd, { rtol: 1e-12 });
    expect(readingRepeatability(twice(x))).toMatchObject({ withinSd: 0, meanDifference: 0 });
    expect(readingRepeatability([[1, 2, 3], [4]])).toMatchObject({
      meanDifference: null,
      degreesOfFreedom: 2,
    });
  });

  it('follow a bias and a spread that depend on the level', () => {
    const limits = regressionLimits(
      x,
      x.map((value, i) => 1.1 * value + 0.02 * value * (i % 2 === 0 ? 1 : -1)),
    );
    const low = limitsAtLevel(limits, 5, { spread: 'modelled' });
    const high = limitsAtLevel(limits, 25, { spread: 'modelled' });
    expect(high.sd).toBeGreaterThan(3 * low.sd);
    expectClose(high.bias, 0.1 * (25 / 1.05), { rtol: 0.05 });
    expect(codeOf(() => limitsAtLevel(limits, -50, { spread: 'modelled' }))).toBe('out-of-domain');
  });

  it.each([
    ['too-few-values', () => blandAltman([1], [2])],
    ['unequal-lengths', () => blandAltman([1, 2], [2])],
    ['not-finite', () => blandAltman([1, NaN], [2, 3])],
    ['out-of-domain', () => blandAltman([1, -1], [2, 1], { kind: 'percent' })],
    ['out-of-domain', () => blandAltman([1, 0], [2, 1], { kind: 'ratio' })],
    ['out-of-domain', () => blandAltman([-1.7e308, 1], [1.7e308, 1])],
    ['no-spread', () => blandAltman([1, 2], [2, 1], { multiplier: 0 })],
    ['no-spread', () => regressionLimits([1, 2, 3], [3, 2, 1])],
  ])('refuse with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });
});

describe('coefficients', () => {
  it('are 1 for perfect agreement and do not pass it', () => {
    expect(concordance(x, x)).toMatchObject({
      coefficient: 1,
      standardError: 0,
      interval: { lower: 1, upper: 1 },
    });
    expect(pearson([1, 2, 3], [10, 20, 30]).coefficient).toBe(1);
    expect(spearman([1, 2, 3], [1, 10, 100]).coefficient).toBe(1);
    expect(kendall([1, 2, 3], [3, 2, 1]).coefficient).toBe(-1);
  });

  it('of concordance are those of correlation times accuracy, the same both ways', () => {
    const there = concordance(x, y);
    expectClose(there.coefficient, there.correlation * there.accuracy, { rtol: 1e-15 });
    expectClose(concordance(y, x).coefficient, there.coefficient, { rtol: 1e-14 });
    expectClose(concordance(y, x).standardError, there.standardError, { rtol: 1e-12 });
    const scaled = concordance(
      x.map((v) => v * 2 ** 300),
      y.map((v) => v * 2 ** 300),
    );
    expectClose(scaled.coefficient, there.coefficient, { rtol: 1e-14 });
    // No relation: the formula must not divide by r.
    expect(concordance([1, 2, 3, 4], [1, -1, -1, 1])).toMatchObject({ correlation: 0, coefficient: 0 });
    expect(concordance([1, 2, 3, 4], [1, -1, -1, 1]).standardError).toBeGreaterThan(0);
  });

  it('refuse data without spread', () => {
    for (const run of [concordance, pearson, spearman, kendall]) {
      expect(codeOf(() => run([1, 1, 1], [1, 2, 3]))).toBe('no-spread');
      expect(codeOf(() => run([1, 2, 3], [1, 1, 1]))).toBe('no-spread');
      expect(codeOf(() => run([], []))).toBe('too-few-values');
    }
  });
});

describe('equivalence and bias', () => {
  it('is shown just when the interval lies inside the margins', () => {
    for (const margin of [0.3, 0.5, 0.8, 1.2, 3]) {
      const { interval, equivalent } = equivalence(x, y, { margin });
      expect(equivalent).toBe(interval.lower > -margin && interval.upper < margin);
    }
    expect(equivalence(x, y, { lowerMargin: -1, upperMargin: 2 }).probability).toBeLessThan(0.05);
    expect(equivalence([1, 2], [2, 3], { margin: 2 })).toMatchObject({ probability: 0, equivalent: true });
    expect(equivalence([1, 2], [2, 3], { margin: 1 })).toMatchObject({ probability: 1, equivalent: false });
    expect(pairedT([1, 2], [2, 3])).toMatchObject({ t: null, probability: null, mean: 1 });
  });

  it('refuses margins that make no sense', () => {
    expect(codeOf(() => equivalence(x, y, {}))).toBe('out-of-domain');
    expect(codeOf(() => equivalence(x, y, { margin: 0 }))).toBe('out-of-domain');
    expect(codeOf(() => equivalence(x, y, { lowerMargin: 1, upperMargin: 1 }))).toBe('out-of-domain');
    expect(codeOf(() => equivalence(x, y, { margin: 1, alpha: 0.5 }))).toBe('out-of-domain');
  });

  it('at a level is judged against what is allowed', () => {
    const line = { intercept: 0, slope: 1.1, interceptSe: 0.1, slopeSe: 0, covariance: 0, factor: 2 };
    const verdict = (absolute: number) => biasAtLevel(line, 10, { allowed: { absolute } }).verdict;
    expect([verdict(1.3), verdict(1.1), verdict(0.7)]).toEqual(['within', 'undecided', 'beyond']);
    expectClose(biasAtLevel(line, 10, { allowed: { percent: 13 } }).allowed ?? NaN, 1.3, { rtol: 1e-15 });
    expect(biasAtLevel(line, 0).percent).toBeNull();
    expect(codeOf(() => biasAtLevel(line, 10, { allowed: { percent: 0 } }))).toBe('out-of-domain');
    const fit = ordinaryLeastSquares(x, y);
    // At the mean of x the error is that of a mean.
    expectClose(biasAtLevel(fit, fit.meanX).standardError, fit.residualSd / Math.sqrt(40), { rtol: 1e-9 });
    expect(Number.isFinite(biasAtLevel(deming(x, y), 15).standardError)).toBe(true);
  });

  it('of lines by ranks comes from resampled pairs, the same for the same seed', () => {
    const run = () =>
      biasAtLevelByBootstrap(x, y, {
        line: 'passing-bablok',
        levels: [10, 20],
        allowed: { absolute: 3 },
        generator: generatorOf(3),
        resamples: 200,
      });
    const [low, high] = run();
    expect(run()).toEqual([low, high]);
    expect(low?.verdict).toBe('within');
    expect(low?.interval.lower).toBeLessThan(low?.bias ?? NaN);
    expect(high?.interval.upper).toBeGreaterThan(high?.bias ?? NaN);
  });
});

describe('outlying pairs', () => {
  it('are named and left in', () => {
    const wild = y.map((value, i) => (i === 7 ? value + 30 : i === 20 ? value - 25 : value));
    const found = outlyingPairs(x, wild, { line: { slope: 1, intercept: 0.5 } });
    expect(found.suspects).toEqual([7, 20]);
    expect(found.residuals).toHaveLength(40);
    expect(outlyingPairs(x, y).suspects).toEqual([]);
    expect(outlyingPairs(x, wild, { error: 'proportional' }).suspects).toContain(7);
    expect(codeOf(() => outlyingPairs([-1, -2, -3], [-1, -2, -4], { error: 'proportional' }))).toBe(
      'out-of-domain',
    );
  });
});

describe('counts', () => {
  it('have mirrored intervals', () => {
    for (const method of ['wilson', 'exact'] as const)
      for (let k = 0; k <= 12; k += 1) {
        const there = proportionInterval(k, 12, { method });
        const back = proportionInterval(12 - k, 12, { method });
        expectClose(there.lower, 1 - back.upper, { atol: 1e-14 });
        expect(there.lower).toBeLessThanOrEqual(k / 12);
        expect(there.upper).toBeGreaterThanOrEqual(k / 12);
      }
    const swapped = proportionDifference({ positives: 3, trials: 9 }, { positives: 5, trials: 7 });
    const plain = proportionDifference({ positives: 5, trials: 7 }, { positives: 3, trials: 9 });
    expectClose(swapped.interval.lower, -plain.interval.upper, { rtol: 1e-14 });
  });

  it('of laboratories give a Wilson interval at the ends and none of homogeneity without results that differ', () => {
    const all = laboratoryPod([
      { positives: 12, trials: 12 },
      { positives: 12, trials: 12 },
    ]);
    expect(all).toMatchObject({
      lpod: 1,
      intervalBy: 'wilson',
      homogeneity: null,
      laboratorySd: 0,
      repeatabilitySd: 0,
    });
    const half = laboratoryPod([
      { positives: 6, trials: 12 },
      { positives: 7, trials: 12 },
    ]);
    expect(half.intervalBy).toBe('t');
    expectClose(differenceOfLaboratoryPod(all, half).difference, 1 - 13 / 24, { rtol: 1e-14 });
    expect(codeOf(() => laboratoryPod([]))).toBe('too-few-values');
    expect(codeOf(() => laboratoryPod([{ positives: 1, trials: 1 }]))).toBe('too-few-values');
  });

  it('by decision add up, at the limit by the rule', () => {
    const table = decisionAgreement([1, 2, 3, 4, 5], [1, 3, 3, 2, 5], { limit: 3 });
    expect(table).toMatchObject({ bothAccept: 3, falseReject: 0, falseAccept: 1, bothReject: 1 });
    expectClose(table.falseAcceptRate.rate ?? NaN, 0.5, { rtol: 1e-15 });
    const other = decisionAgreement([1, 2, 3, 4, 5], [1, 3, 3, 2, 5], { limit: 3, accept: 'below' });
    expect(other).toMatchObject({ bothAccept: 1, falseReject: 1, falseAccept: 1, bothReject: 2 });
    const turned = decisionAgreement([1, 2, 3, 4, 5], [1, 3, 3, 2, 5], { limit: 3, accept: 'at-or-above' });
    expect(turned).toMatchObject({ bothAccept: 2, falseReject: 1, falseAccept: 1, bothReject: 1 });
    const oneSide = decisionAgreement([1, 2], [1, 2], { limit: 9 });
    expect(oneSide.falseAcceptRate).toMatchObject({ of: 0, rate: null, wilson: null });
    expect(oneSide.kappa.kappa).toBeNull();
    expect(oneSide.mcNemar).toMatchObject({ exactProbability: 1, chiSquare: null });
  });

  it.each([
    ['too-few-values', () => proportionInterval(0, 0)],
    ['out-of-domain', () => proportionInterval(3, 2)],
    ['out-of-domain', () => proportionInterval(0.5, 2)],
    ['out-of-domain', () => mcNemar(-1, 2)],
    ['too-few-values', () => kappa({ bothPositive: 0, onlyFirst: 0, onlySecond: 0, bothNegative: 0 })],
    ['not-finite', () => decisionAgreement([1], [1], { limit: NaN })],
    ['out-of-domain', () => decisionAgreement([1], [1], { limit: 1, accept: 'maybe' as 'below' })],
    ['no-spread', () => detectionLimits(0)],
    ['out-of-domain', () => detectionLimits(1, { alpha: 0.5 })],
    ['out-of-domain', () => countingDetectionLimits(-1)],
    ['too-few-values', () => methodDetectionLimit([])],
    ['out-of-domain', () => methodDetectionLimit([[1, 2]], { confidence: 0.4 })],
  ])('refuse with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });
});
