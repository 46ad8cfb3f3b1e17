import { describe, expect, it } from 'vitest';
import {
  blandAltman,
  deming,
  differencePower,
  equivalencePower,
  kappa,
  kendall,
  mcNemar,
  ordinaryLeastSquares,
  pairedT,
  pearson,
  polynomialLeastSquares,
  predictLine,
  proportionInterval,
  repeatedMedian,
  spearman,
  theilSen,
  weightedLeastSquares,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import base from '../fixtures/method-comparison-r.json';
import scipy from '../fixtures/method-comparison-scipy.json';

type Expected = readonly (number | null)[];

/** Every figure within 1e-9 of its size; where a figure is what cancellation left, of the size it came from. */
function expectAll(found: readonly (number | null | undefined)[], expected: Expected, atol = 0): void {
  expect(found).toHaveLength(expected.length);
  expected.forEach((value, i) => {
    if (value === null) expect(found[i] ?? null).toBeNull();
    else expectClose(found[i] ?? NaN, value, { rtol: 1e-9, atol });
  });
}

const largest = (values: readonly number[]) => Math.max(...values.map(Math.abs));

describe('computed with scipy, see the fixture', () => {
  it.each(scipy.cases.map((entry) => ({ n: entry.x.length, ...entry })))(
    'lines by ranks and correlations of $n pairs, $kind',
    ({ x, y, expected }) => {
      const small = 1e-13 * largest(y);
      const plain = theilSen(x, y);
      const { lower, upper } = plain.slopeInterval;
      expectAll([plain.slope], [expected.theilSen[0] as number]);
      expectAll([plain.intercept], [expected.theilSen[1] as number], small);
      expectAll([lower, upper], expected.theilSen.slice(2));
      const joint = theilSen(x, y, { confidence: 0.9, interceptFrom: 'residuals' });
      expectAll(
        [joint.slope, joint.slopeInterval.lower, joint.slopeInterval.upper],
        [0, 2, 3].map((k) => expected.theilSenJoint[k] as number),
      );
      expectAll([joint.intercept], [expected.theilSenJoint[1] as number], small);
      const line = repeatedMedian(x, y);
      expectAll([line.slope], [expected.repeatedMedian[0] as number]);
      expectAll([line.intercept], [expected.repeatedMedian[1] as number], small);
      expectAll([kendall(x, y).coefficient], [expected.kendall], 1e-15);
      const rho = spearman(x, y);
      const r = pearson(x, y);
      expectAll([rho.coefficient, rho.probability], expected.spearman, 1e-15);
      expectAll([r.coefficient, r.probability], expected.pearson, 1e-15);
      const fit = ordinaryLeastSquares(x, y);
      const [slope, intercept, slopeSe, interceptSe] = expected.leastSquares as [
        number,
        number,
        number,
        number,
      ];
      expectAll([fit.slope, fit.slopeSe, fit.interceptSe], [slope, slopeSe, interceptSe], small * 1e-6);
      expectAll([fit.intercept], [intercept], small);
    },
  );
});

describe('computed with base R, see the fixture', () => {
  it.each(base.lines.map((entry) => ({ n: entry.x.length, ...entry })))(
    'a line through $n pairs',
    (entry) => {
      const { x, y, w } = entry;
      const small = 1e-12 * largest(y);
      const fit = ordinaryLeastSquares(x, y);
      const covariance = entry.ols[6] as number;
      expectAll(
        [fit.intercept, fit.slope, fit.interceptSe, fit.slopeSe, fit.residualSd, fit.rSquared],
        entry.ols.slice(0, 6),
        small,
      );
      expectAll([fit.covariance], [covariance]);
      const { interceptInterval: a, slopeInterval: b } = fit;
      expectAll([a.lower, b.lower, a.upper, b.upper], entry.interval, small);
      const at = predictLine(
        fit,
        ((20 * largest(y)) / largest(y)) * (largest(x) > 1e6 ? 1e8 : largest(x) < 1 ? 1e-6 : 1),
      );
      const band = at.predictionInterval;
      expectAll([at.fitted, at.interval.lower, at.interval.upper, band?.lower, band?.upper], entry.predict);
      const weighted = weightedLeastSquares(x, y, { weights: w });
      expectAll(
        [
          weighted.intercept,
          weighted.slope,
          weighted.interceptSe,
          weighted.slopeSe,
          weighted.residualSd,
          weighted.rSquared,
        ],
        entry.wls,
        small,
      );
      const origin = ordinaryLeastSquares(x, y, { throughOrigin: true });
      expectAll([origin.slope, origin.slopeSe, origin.residualSd, origin.rSquared], entry.origin);
      const bent = polynomialLeastSquares(x, y);
      expect(bent.coefficients).toHaveLength(3);
      bent.coefficients.forEach((value, k) =>
        expectClose(value, entry.quadratic[k] as number, { rtol: 1e-7 }),
      );
      bent.standardErrors.forEach((value, k) =>
        expectClose(value, entry.quadratic[k + 3] as number, { rtol: 1e-9 }),
      );
      const axis = deming(x, y);
      expectAll([axis.slope], [entry.orthogonal[0] as number]);
      expectAll([axis.intercept], [entry.orthogonal[1] as number], small);
      const t = pairedT(x, y);
      expectAll([t.mean, t.t, t.probability, t.interval.lower, t.interval.upper], entry.paired);
      const r = pearson(x, y);
      expectAll([r.coefficient, r.probability, r.interval?.lower, r.interval?.upper], entry.pearson);
      const { lowerLimitExact: low, upperLimitExact: high } = blandAltman(x, y);
      // R's noncentral t keeps about 9 figures.
      [low.lower, low.upper, high.lower, high.upper].forEach((value, k) =>
        expectClose(value, entry.exactLimits[k] as number, { rtol: 1e-6 }),
      );
    },
  );

  it.each(base.kendallExact.concat(base.kendallTies))(
    'tau and its probability of $x.length pairs',
    ({ x, y, value }) => {
      const found = kendall(x, y);
      expectAll([found.coefficient, found.probability], value, 1e-15);
    },
  );

  it.each(base.mcNemar)('McNemar $b against $c', ({ b, c, value }) => {
    const found = mcNemar(b, c);
    const { chiSquare, chiSquareCorrected, probability, probabilityCorrected, exactProbability } = found;
    expectAll([chiSquare, chiSquareCorrected, probability, probabilityCorrected, exactProbability], value);
  });

  it.each(base.kappa)('kappa of $table', ({ table, value }) => {
    const [bothPositive, onlyFirst, onlySecond, bothNegative] = table as [number, number, number, number];
    const found = kappa({ bothPositive, onlyFirst, onlySecond, bothNegative });
    expectAll([found.kappa, found.standardError], value);
  });

  it.each(base.proportions)('$x of $n at $confidence', ({ x, n, confidence, value }) => {
    const wilson = proportionInterval(x, n, { confidence });
    const exact = proportionInterval(x, n, { confidence, method: 'exact' });
    expectAll([wilson.lower, wilson.upper, exact.lower, exact.upper], value, 1e-15);
  });

  it.each(base.tPower)('power of $count pairs', ({ value, ...input }) => {
    expectAll([differencePower(input)], [value]);
  });

  it.each(base.tostPower)('power of equivalence of $count pairs', ({ value, ...input }) => {
    expectAll([equivalencePower(input)], [value]);
  });
});
