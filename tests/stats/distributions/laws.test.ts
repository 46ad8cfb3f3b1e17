import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  betaCdf,
  betaQuantile,
  betaSurvival,
  betaUpperQuantile,
  binomialCdf,
  binomialMass,
  binomialQuantile,
  binomialSurvival,
  chiSquareCdf,
  chiSquareDensity,
  chiSquareQuantile,
  chiSquareSurvival,
  chiSquareUpperQuantile,
  betaDensity,
  fCdf,
  fDensity,
  fQuantile,
  fSurvival,
  fUpperQuantile,
  normalCdf,
  normalLogCdf,
  normalQuantile,
  normalSurvival,
  normalUpperQuantile,
  studentTCdf,
  studentTDensity,
  studentTLogSurvival,
  studentTQuantile,
  studentTSurvival,
  studentTUpperQuantile,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

type Family = Readonly<{
  cdf: (x: number, ...parameters: number[]) => number;
  survival: (x: number, ...parameters: number[]) => number;
  quantile: (p: number, ...parameters: number[]) => number;
  upperQuantile: (p: number, ...parameters: number[]) => number;
  parameters: number;
}>;

const asFamily = (family: object) => family as Family;
const families: Record<string, Family> = {
  normal: asFamily({
    cdf: normalCdf,
    survival: normalSurvival,
    quantile: normalQuantile,
    upperQuantile: normalUpperQuantile,
    parameters: 0,
  }),
  t: asFamily({
    cdf: studentTCdf,
    survival: studentTSurvival,
    quantile: studentTQuantile,
    upperQuantile: studentTUpperQuantile,
    parameters: 1,
  }),
  'chi-square': asFamily({
    cdf: chiSquareCdf,
    survival: chiSquareSurvival,
    quantile: chiSquareQuantile,
    upperQuantile: chiSquareUpperQuantile,
    parameters: 1,
  }),
  F: asFamily({
    cdf: fCdf,
    survival: fSurvival,
    quantile: fQuantile,
    upperQuantile: fUpperQuantile,
    parameters: 2,
  }),
  beta: asFamily({
    cdf: betaCdf,
    survival: betaSurvival,
    quantile: betaQuantile,
    upperQuantile: betaUpperQuantile,
    parameters: 2,
  }),
};
const exponent = (low: number, high: number) =>
  fc.double({ min: low, max: high, noNaN: true }).map((e) => 10 ** e);

describe.each(Object.entries(families))('%s', (_, { cdf, survival, quantile, upperQuantile, parameters }) => {
  const shapes = fc.array(exponent(-0.3, 5.5), { minLength: parameters, maxLength: parameters });

  it('has quantiles that the distribution function takes back, in either tail', () => {
    fc.assert(
      fc.property(exponent(-30, -0.31), shapes, (p, parameter) => {
        const [low, high] = [quantile(p, ...parameter), upperQuantile(p, ...parameter)];
        // x is a double: what its last digit is worth in probability grows with the shape near an end of the range.
        if (low > -1e300 && Math.abs(low) > 1e-290 && (low < 0.9 || low > 1))
          expectClose(cdf(low, ...parameter), p, { rtol: 2e-8 });
        if (high < 1e300 && Math.abs(high) > 1e-290 && (high < 0.9 || high > 1))
          expectClose(survival(high, ...parameter), p, { rtol: 2e-8 });
        expect(low).toBeLessThanOrEqual(high);
      }),
      { numRuns: 300 },
    );
  });

  it('has tails that add up to 1 and no NaN', () => {
    fc.assert(
      fc.property(exponent(-12, 12), fc.boolean(), shapes, (size, negative, parameter) => {
        const x = negative ? -size : size;
        const [lower, upper] = [cdf(x, ...parameter), survival(x, ...parameter)];
        expectClose(lower + upper, 1, { atol: 1e-12 });
        expect(lower >= 0 && lower <= 1 && upper >= 0 && upper <= 1).toBe(true);
      }),
    );
    const parameter = Array<number>(parameters).fill(3);
    expect([cdf(Infinity, ...parameter), survival(Infinity, ...parameter)]).toEqual([1, 0]);
    expect([cdf(-Infinity, ...parameter), survival(-Infinity, ...parameter)]).toEqual([0, 1]);
  });

  it('refuses what is no number, no probability and no degrees of freedom', () => {
    const parameter = Array<number>(parameters).fill(3);
    expect(codeOf(() => cdf(NaN, ...parameter))).toBe('not-finite');
    for (const p of [0, 1, -0.1, 1.1]) {
      expect(codeOf(() => quantile(p, ...parameter))).toBe('out-of-domain');
      expect(codeOf(() => upperQuantile(p, ...parameter))).toBe('out-of-domain');
    }
    expect(codeOf(() => quantile(NaN, ...parameter))).toBe('not-finite');
    for (let i = 0; i < parameters; i += 1) {
      for (const [wrong, code] of [
        [0, 'out-of-domain'],
        [-1, 'out-of-domain'],
        [NaN, 'not-finite'],
      ] as const) {
        const bad = parameter.map((value, j) => (i === j ? wrong : value));
        expect(codeOf(() => cdf(1, ...bad))).toBe(code);
        expect(codeOf(() => quantile(0.1, ...bad))).toBe(code);
      }
    }
  });
});

describe('known values', () => {
  it('t with 1 degree of freedom is Cauchy, with 2 has a closed form, with infinitely many is normal', () => {
    for (const p of [1e-12, 0.01, 0.4, 0.499999]) {
      expectClose(studentTQuantile(p, 1), -1 / Math.tan(Math.PI * p), { rtol: 1e-10 });
      expectClose(studentTQuantile(p, 2), (2 * p - 1) / Math.sqrt(2 * p * (1 - p)), { rtol: 1e-10 });
      expectClose(studentTQuantile(p, Infinity), normalQuantile(p), { rtol: 1e-14 });
      expectClose(studentTQuantile(p, 1e15), normalQuantile(p), { rtol: 1e-11 });
    }
    expect(studentTQuantile(0.5, 4)).toBe(0);
    expectClose(studentTDensity(0, 1), 1 / Math.PI, { rtol: 1e-14 });
    expect(studentTDensity(Infinity, 3)).toBe(0);
    expectClose(studentTDensity(0.3, Infinity), 0.38138781546052414, { rtol: 1e-14 });
    expectClose(studentTLogSurvival(-1, 1), Math.log(0.75), { rtol: 1e-13 });
    expect(studentTLogSurvival(Infinity, 1)).toBe(-Infinity);
    expectClose(studentTLogSurvival(1, Infinity), Math.log(0.15865525393145707), { rtol: 1e-13 });
  });

  it('chi-square with 2 degrees of freedom is exponential', () => {
    for (const x of [1e-9, 0.1, 3, 200]) {
      expectClose(chiSquareSurvival(x, 2), Math.exp(-x / 2), { rtol: 1e-13 });
      expectClose(chiSquareCdf(x, 2), -Math.expm1(-x / 2), { rtol: 1e-13 });
    }
    expect([chiSquareDensity(0, 3), chiSquareDensity(0, 2), chiSquareDensity(0, 1)]).toEqual([
      0,
      0.5,
      Number.MAX_VALUE,
    ]);
    expect(chiSquareDensity(-1, 2)).toBe(0);
    expect(chiSquareQuantile(1e-12, 0.01)).toBe(0);
  });

  it('densities are 0 outside, and end as their shapes say', () => {
    expect([fDensity(-1, 2, 2), fDensity(0, 3, 2), fDensity(0, 2, 2), fDensity(0, 1, 2)]).toEqual([
      0,
      0,
      1,
      Number.MAX_VALUE,
    ]);
    expect([betaDensity(-1, 2, 2), betaDensity(0, 1, 3), betaDensity(1, 3, 1), betaDensity(1, 3, 2)]).toEqual(
      [0, 3, 3, 0],
    );
    expect(betaDensity(0, 0.5, 3)).toBe(Number.MAX_VALUE);
  });

  it('the log of a normal tail goes where the tail itself is 0', () => {
    expect(normalCdf(-40)).toBeGreaterThan(0 - 1e-300);
    expectClose(normalLogCdf(-40), -804.6084420137538, { rtol: 1e-13 });
    expectClose(normalLogCdf(-1e100), -5e199, { rtol: 1e-14 });
    expect(normalLogCdf(-1e200)).toBe(-Infinity);
    expect(normalLogCdf(Infinity)).toBe(0);
    expect(normalLogCdf(-Infinity)).toBe(-Infinity);
  });
});

describe('binomial', () => {
  it('sums its masses', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 60 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (n, success) => {
          let sum = 0;
          for (let k = 0; k <= n; k += 1) {
            sum += binomialMass(k, n, success);
            expectClose(binomialCdf(k, n, success), sum, { atol: 1e-12 });
            expectClose(binomialSurvival(k, n, success), 1 - sum, { atol: 1e-12 });
          }
          expect(binomialQuantile(1, n, success)).toBeLessThanOrEqual(n);
          expect(binomialQuantile(0, n, success)).toBe(0);
        },
      ),
    );
  });

  it('ends sensibly', () => {
    expect([binomialCdf(-1, 4, 0.5), binomialCdf(4, 4, 0.5), binomialSurvival(9, 4, 0.5)]).toEqual([0, 1, 0]);
    expect([
      binomialMass(1.5, 4, 0.5),
      binomialMass(5, 4, 0.5),
      binomialMass(4, 4, 1),
      binomialMass(0, 4, 0),
    ]).toEqual([0, 0, 1, 1]);
    expect([binomialCdf(3, 4, 1), binomialCdf(0, 4, 0), binomialSurvival(3, 4, 1)]).toEqual([0, 1, 1]);
    expect(binomialQuantile(0.0625, 4, 0.5)).toBe(0);
  });

  it('refuses parts of trials and shares outside 0 to 1', () => {
    expect(codeOf(() => binomialCdf(1, 2.5, 0.5))).toBe('out-of-domain');
    expect(codeOf(() => binomialMass(1, 2, 1.5))).toBe('out-of-domain');
    expect(codeOf(() => binomialMass(NaN, 2, 0.5))).toBe('not-finite');
    expect(codeOf(() => binomialQuantile(-0.1, 2, 0.5))).toBe('out-of-domain');
  });
});
