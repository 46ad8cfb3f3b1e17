import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  calibrationInverse,
  deming,
  errorRatioFromReplicates,
  ordinaryLeastSquares,
  polynomialLeastSquares,
  predictLine,
  weightedDeming,
  weightedLeastSquares,
  york,
  type DemingOptions,
  type ErrorsInVariablesLine,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { generatorOf, normalOf, orderFrom, shuffled } from './random';

function study(n: number, seed = 1): { x: number[]; y: number[] } {
  const next = generatorOf(seed);
  const noise = normalOf(next);
  const levels = Array.from({ length: n }, () => 10 + 90 * next());
  return {
    x: levels.map((level) => level * (1 + 0.03 * noise())),
    y: levels.map((level) => 1 + 1.02 * level * (1 + 0.03 * noise())),
  };
}

const { x, y } = study(30);
const ones = x.map(() => 1);
type Line = (x: readonly number[], y: readonly number[]) => { slope: number; intercept: number };
const LINES: [string, Line][] = [
  ['ordinaryLeastSquares', (a, b) => ordinaryLeastSquares(a, b)],
  ['weightedLeastSquares', (a, b) => weightedLeastSquares(a, b, { weights: a.map((_, i) => 1 + (i % 2)) })],
  ['deming', (a, b) => deming(a, b)],
  ['york', (a, b) => york({ x: a, y: b, uncertaintyX: a.map(() => 1), uncertaintyY: a.map(() => 1) })],
];

describe.each(LINES)('%s', (name, fit) => {
  it('moves with the data', () => {
    const line = fit(x, y);
    const moved = fit(
      x.map((value) => value + 8),
      y.map((value) => value - 3),
    );
    expectClose(moved.slope, line.slope, { rtol: 1e-11 });
    expectClose(moved.intercept, line.intercept - 3 - 8 * line.slope, { rtol: 1e-9 });
  });

  it('does not change its input, refuses bad input by a code and never gives NaN', () => {
    const [a, b] = [Object.freeze([...x]), Object.freeze([...y])];
    expect(Number.isFinite(fit(a, b).slope)).toBe(true);
    expect(codeOf(() => fit([1, 2], [1, 2]))).toBe('too-few-values');
    expect(codeOf(() => fit([1, 2, 3], [1, 2]))).toBe('unequal-lengths');
    expect(codeOf(() => fit([1, 2, NaN], [1, 2, 3]))).toBe('not-finite');
    expect(codeOf(() => fit([4, 4, 4], [1, 2, 3]))).toBe('no-spread');
    const wild = fc.double({ noNaN: true, noDefaultInfinity: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(wild, wild), { minLength: 3, maxLength: 8 }), (points) => {
        try {
          const { slope, intercept } = fit(
            points.map(([p]) => p),
            points.map(([, q]) => q),
          );
          expect(Number.isFinite(slope) && Number.isFinite(intercept)).toBe(true);
        } catch (error) {
          expect((error as Error).name, String(error)).toBe('StatsError');
        }
      }),
    );
  });

  it(`gives all y equal slope 0 (${name})`, () => {
    expectClose(fit([1, 2, 3, 4], [7, 7, 7, 7]).slope, 0, { atol: 1e-15 });
    expectClose(fit([1, 2, 3, 4], [7, 7, 7, 7]).intercept, 7, { rtol: 1e-15 });
  });
});

describe('least squares', () => {
  it('does not depend on the order of the pairs', () => {
    const order = orderFrom(2, x.length);
    const line = ordinaryLeastSquares(x, y);
    const again = ordinaryLeastSquares(shuffled(x, order), shuffled(y, order));
    expectClose(again.slope, line.slope, { rtol: 1e-15 });
    expectClose(again.interceptSe, line.interceptSe, { rtol: 1e-14 });
  });

  it('keeps all figures far from the origin and at any scale', () => {
    const far = x.map((value) => Math.round(value) + 1e9);
    const line = ordinaryLeastSquares(
      far,
      far.map((value) => 3 * (value - 1e9)),
    );
    expectClose(line.slope, 3, { rtol: 1e-14 });
    expectClose(line.residualSd, 0, { atol: 1e-9 });
    for (const scale of [2 ** -600, 2 ** 600]) {
      const scaled = ordinaryLeastSquares(
        x.map((value) => value * scale),
        y.map((value) => value * scale),
      );
      expect(scaled.slope).toBe(ordinaryLeastSquares(x, y).slope);
      expect(scaled.slopeSe).toBe(ordinaryLeastSquares(x, y).slopeSe);
    }
  });

  it('with equal uncertainties or weights is ordinary least squares', () => {
    const line = ordinaryLeastSquares(x, y);
    const weighted = weightedLeastSquares(x, y, { weights: ones.map(() => 0.3) });
    expectClose(weighted.slope, line.slope, { rtol: 1e-14 });
    expectClose(weighted.interceptSe, line.interceptSe, { rtol: 1e-13 });
    const known = weightedLeastSquares(x, y, { uncertainties: ones.map(() => line.residualSd) });
    expectClose(known.slopeSe, line.slopeSe, { rtol: 1e-12 });
    expectClose(known.chiSquare, line.degreesOfFreedom, { rtol: 1e-12 });
  });

  it('reads back from the line what it predicts', () => {
    const line = ordinaryLeastSquares(x, y);
    const { fitted, predictionInterval } = predictLine(line, 42);
    const back = calibrationInverse(line, fitted);
    expectClose(back.value, 42, { rtol: 1e-13 });
    // The upper prediction limit at the lower Fieller limit is the reading itself.
    expectClose(predictLine(line, back.interval?.lower ?? NaN).predictionInterval?.upper ?? NaN, fitted, {
      rtol: 1e-10,
    });
    expect(predictionInterval?.lower).toBeLessThan(fitted);
    const many = calibrationInverse(line, fitted, { replicates: 100 });
    expect((many.interval?.upper ?? NaN) - 42).toBeLessThan((back.interval?.upper ?? NaN) - 42);
    const flat = ordinaryLeastSquares([1, 2, 3, 4], [5, 1, 4, 2.1]);
    expect(calibrationInverse(flat, 3).interval).toBeNull();
    const origin = ordinaryLeastSquares([1, 2, 3], [2, 4.1, 5.9], { throughOrigin: true });
    expectClose(calibrationInverse(origin, predictLine(origin, 2).fitted).value, 2, { rtol: 1e-14 });
  });

  it.each([
    ['out-of-domain', () => ordinaryLeastSquares(x, y, { confidence: 2 })],
    ['no-spread', () => ordinaryLeastSquares([0, 0], [1, 2], { throughOrigin: true })],
    ['out-of-domain', () => weightedLeastSquares(x, y, {})],
    ['out-of-domain', () => weightedLeastSquares(x, y, { weights: ones, uncertainties: ones })],
    ['unequal-lengths', () => weightedLeastSquares(x, y, { weights: [1] })],
    ['no-spread', () => weightedLeastSquares(x, y, { weights: x.map(() => 0) })],
    ['out-of-domain', () => weightedLeastSquares(x, y, { uncertainties: x.map(() => -1) })],
    ['out-of-domain', () => polynomialLeastSquares(x, y, { degree: 11 })],
    ['too-few-values', () => polynomialLeastSquares([1, 2, 3], [1, 2, 3])],
    ['no-spread', () => polynomialLeastSquares([1, 1, 2, 2], [1, 2, 3, 4])],
    ['not-finite', () => predictLine(ordinaryLeastSquares(x, y), NaN)],
    ['no-spread', () => calibrationInverse(ordinaryLeastSquares([1, 2, 3], [4, 4, 4]), 4)],
    ['out-of-domain', () => calibrationInverse(weightedLeastSquares(x, y, { uncertainties: ones }), 4)],
    ['out-of-domain', () => calibrationInverse(ordinaryLeastSquares(x, y), 4, { replicates: 0 })],
  ])('refuses with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });
});

type Pairs = readonly number[];
const BOTH: [string, (x: Pairs, y: Pairs, options?: DemingOptions) => ErrorsInVariablesLine][] = [
  ['deming', deming],
  ['weightedDeming', weightedDeming],
];

describe.each(BOTH)('%s', (_, fit) => {
  it('turns round when the methods are exchanged', () => {
    const there = fit(x, y, { errorRatio: 2 });
    const back = fit(y, x, { errorRatio: 0.5 });
    expectClose(back.slope, 1 / there.slope, { rtol: 1e-11 });
    expectClose(back.intercept, -there.intercept / there.slope, { rtol: 1e-9 });
  });

  it('is the jackknife of its definition', () => {
    const without = x.map((__, i) =>
      fit(
        x.filter((___, j) => j !== i),
        y.filter((___, j) => j !== i),
      ),
    );
    const n = x.length;
    const se = (pick: (line: ErrorsInVariablesLine) => number) => {
      const values = without.map(pick);
      const mean = values.reduce((sum, value) => sum + value, 0) / n;
      return Math.sqrt(((n - 1) / n) * values.reduce((sum, value) => sum + (value - mean) ** 2, 0));
    };
    const line = fit(x, y);
    expectClose(
      line.slopeSe,
      se(({ slope }) => slope),
      { rtol: 1e-9 },
    );
    expectClose(
      line.interceptSe,
      se(({ intercept }) => intercept),
      { rtol: 1e-9 },
    );
    // The covariance gives the jackknife error of any bias.
    const biasSe = se(({ intercept, slope }) => intercept + (slope - 1) * 50);
    const variance = line.interceptSe ** 2 + 2500 * line.slopeSe ** 2 + 100 * line.covariance;
    expectClose(Math.sqrt(variance), biasSe, { rtol: 1e-9 });
  });

  it('has analytic errors near those of the jackknife for many normal pairs', () => {
    const many = study(400, 3);
    const jackknife = fit(many.x, many.y);
    const analytic = fit(many.x, many.y, { standardErrors: 'analytic' });
    expect(analytic.slope).toBe(jackknife.slope);
    expectClose(analytic.slopeSe, jackknife.slopeSe, { rtol: 0.35 });
  });

  it('keeps to the units of both methods', () => {
    const line = fit(x, y);
    const scaled = fit(
      x.map((value) => value * 1e-6),
      y.map((value) => value * 1e-6),
    );
    expectClose(scaled.slope, line.slope, { rtol: 1e-12 });
    expectClose(scaled.interceptSe, line.interceptSe * 1e-6, { rtol: 1e-9 });
  });

  it('refuses by a code', () => {
    expect(codeOf(() => fit(x, y, { errorRatio: 0 }))).toBe('no-spread');
    expect(codeOf(() => fit(x, y, { errorRatio: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => fit(x, y, { standardErrors: 'none' as 'analytic' }))).toBe('out-of-domain');
    expect(codeOf(() => fit([1, 1, 1], [1, 2, 3]))).toBe('no-spread');
  });
});

describe('deming', () => {
  it('tends to least squares as the errors of x vanish', () => {
    expectClose(deming(x, y, { errorRatio: 1e12 }).slope, ordinaryLeastSquares(x, y).slope, { rtol: 1e-9 });
  });

  it('leaves out a heavy pair as exactly as a light one', () => {
    const [px, py] = [
      [1, 2, 3, 4, 1e9],
      [1.1, 2.2, 2.8, 4.1, 1e9],
    ];
    const kept = deming(px.slice(0, 4), py.slice(0, 4)).slope;
    const all = px.map(
      (_, i) =>
        deming(
          px.filter((__, j) => j !== i),
          py.filter((__, j) => j !== i),
        ).slope,
    );
    expect(all[4]).toBe(kept);
    const mean = all.reduce((sum, value) => sum + value, 0) / 5;
    const se = Math.sqrt(0.8 * all.reduce((sum, value) => sum + (value - mean) ** 2, 0));
    expectClose(deming(px, py).slopeSe, se, { rtol: 1e-9 });
  });

  it('takes the error ratio from replicates', () => {
    const ratio = errorRatioFromReplicates([[1, 2], [3, 4], [5]], [[1, 3], [3, 5], [7]]);
    expect(ratio).toMatchObject({ errorRatio: 4, degreesOfFreedomX: 2 });
    expect(codeOf(() => errorRatioFromReplicates([[1]], [[1]]))).toBe('too-few-values');
    expect(codeOf(() => errorRatioFromReplicates([[1, 1]], [[1, 2]]))).toBe('no-spread');
  });
});

describe('weightedDeming', () => {
  it('with levels that hardly differ is deming', () => {
    const near = x.map((value) => 1e6 + value);
    const nearY = y.map((value) => 1e6 + value);
    expectClose(weightedDeming(near, nearY).slope, deming(near, nearY).slope, { rtol: 1e-3 });
  });

  it('refuses levels that are not above zero', () => {
    expect(codeOf(() => weightedDeming([-1, 2, 3], [1, 2, 3]))).toBe('out-of-domain');
  });
});

describe('york', () => {
  const input = { x, y, uncertaintyX: ones, uncertaintyY: ones };

  it('is deming with equal uncertainties and least squares without those of x', () => {
    expectClose(
      york({ ...input, uncertaintyY: ones.map(() => 2) }).slope,
      deming(x, y, { errorRatio: 4 }).slope,
      { rtol: 1e-11 },
    );
    const exact = york({ ...input, uncertaintyX: ones.map(() => 0) });
    const known = weightedLeastSquares(x, y, { uncertainties: ones });
    expectClose(exact.slope, known.slope, { rtol: 1e-12 });
    expectClose(exact.slopeSe, known.slopeSe, { rtol: 1e-12 });
    expectClose(exact.covariance, known.covariance, { rtol: 1e-12 });
  });

  it('turns round when the methods are exchanged, with correlated errors too', () => {
    const own = {
      x,
      y,
      uncertaintyX: x.map((value) => 0.02 * value),
      uncertaintyY: y.map((value) => 0.5 + 0.01 * value),
      correlation: x.map((_, i) => 0.6 * Math.sin(i)),
    };
    const there = york(own);
    const back = york({
      x: y,
      y: x,
      uncertaintyX: own.uncertaintyY,
      uncertaintyY: own.uncertaintyX,
      correlation: own.correlation,
    });
    expectClose(back.slope, 1 / there.slope, { rtol: 1e-11 });
    expectClose(back.chiSquare, there.chiSquare, { rtol: 1e-9 });
    expectClose(back.slopeSe, there.slopeSe / there.slope ** 2, { rtol: 0.02 });
  });

  it('widens by the scatter found', () => {
    const fit = york({ ...input, uncertaintyX: ones.map(() => 0.1), uncertaintyY: ones.map(() => 0.1) });
    expect(fit.mswd).toBeGreaterThan(10);
    expect(fit.chiSquareProbability).toBeLessThan(1e-6);
    expectClose(fit.slopeSeScaled, fit.slopeSe * Math.sqrt(fit.mswd), { rtol: 1e-14 });
  });

  it.each([
    ['no-spread', () => york({ ...input, uncertaintyX: ones.map(() => 0), uncertaintyY: ones.map(() => 0) })],
    ['out-of-domain', () => york({ ...input, uncertaintyX: ones.map(() => -1) })],
    ['out-of-domain', () => york({ ...input, correlation: ones })],
    ['unequal-lengths', () => york({ ...input, uncertaintyX: [1] })],
    ['not-finite', () => york({ ...input, uncertaintyX: ones.map(() => NaN) })],
  ])('refuses with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });
});
