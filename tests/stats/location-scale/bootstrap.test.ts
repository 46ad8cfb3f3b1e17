import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { describe, expect, it } from 'vitest';
import { bootstrap, mean, median, modeStandardError, sd } from '@/lib/stats';
import { expectClose } from '../expect-close';
import fixture from '../fixtures/bootstrap-r.json';
import { codeOf } from '../hostile';

/** Park and Miller's generator, which the R script has too. */
function parkMiller(seed: number): () => number {
  let state = seed;
  return () => {
    state = (16807 * state) % 2147483647;
    return state / 2147483647;
  };
}

const estimators: Record<string, (values: readonly number[]) => number> = { mean, median, sd };
const { values } = fixture;

describe('bootstrap', () => {
  it.each(fixture.bootstrap)(
    'computed with R: $estimator, percentile and BCa, with the same draws',
    (expected) => {
      const estimator = estimators[expected.estimator] ?? expect.fail('no estimator');
      const run = (interval: 'bca' | 'percentile') =>
        bootstrap(values, {
          estimator,
          random: parkMiller(fixture.seed),
          resamples: fixture.resamples,
          interval,
        });
      const [bca, percentile] = [run('bca'), run('percentile')];
      expect(bca.estimate).toBe(estimator(values));
      expectClose(bca.standardError, expected.standardError, { rtol: 1e-12 });
      expectClose(bca.biasCorrection ?? NaN, expected.biasCorrection, { rtol: 1e-9 });
      expectClose(bca.acceleration ?? NaN, expected.acceleration, { rtol: 1e-9, atol: 1e-14 });
      for (const [found, limits] of [
        [bca, expected.bca],
        [percentile, expected.percentile],
      ] as const) {
        expectClose(found.lower, limits[0] as number, { rtol: 1e-9 });
        expectClose(found.upper, limits[1] as number, { rtol: 1e-9 });
      }
      expect(percentile).toMatchObject({ biasCorrection: null, acceleration: null, level: 0.95 });
    },
  );

  it('gives the same figures for the same seed, from a generator or a function', () => {
    const run = (seed: number) =>
      bootstrap(values, { estimator: median, random: xoroshiro128plus(seed), resamples: 200 });
    expect(run(5)).toEqual(run(5));
    expect(run(5).standardError).not.toBe(run(6).standardError);
    const generator = xoroshiro128plus(5);
    const byFunction = bootstrap(values, {
      estimator: median,
      random: () => uniformFloat64(generator),
      resamples: 200,
    });
    expectClose(byFunction.standardError, run(5).standardError, { rtol: 0.5 });
  });

  it('comes near the formula for a mean', () => {
    const many = Array.from({ length: 200 }, (_, i) => Math.sin(i * 2.4));
    const { standardError } = bootstrap(many, {
      estimator: mean,
      random: xoroshiro128plus(1),
      resamples: 4000,
    });
    expectClose(standardError, sd(many) / Math.sqrt(200), { rtol: 0.05 });
  });

  it('gives one point when nothing varies, and leaves its input as it was', () => {
    const same = Object.freeze([2, 2, 2]);
    expect(bootstrap(same, { estimator: mean, random: xoroshiro128plus(1) })).toMatchObject({
      lower: 2,
      upper: 2,
      standardError: 0,
    });
  });

  it('says when BCa is not defined', () => {
    const estimator = (list: readonly number[]) =>
      new Set(list).size === 12 ? 9 : list.length - new Set(list).size / 100;
    expect(codeOf(() => bootstrap(values, { estimator, random: xoroshiro128plus(1) }))).toBe('no-spread');
  });

  it('refuses senseless options, estimates and random numbers', () => {
    const random = xoroshiro128plus(1);
    expect(codeOf(() => bootstrap([1], { estimator: mean, random }))).toBe('too-few-values');
    expect(codeOf(() => bootstrap(values, { estimator: mean, random, resamples: 10 }))).toBe('out-of-domain');
    expect(codeOf(() => bootstrap(values, { estimator: mean, random, level: 1 }))).toBe('out-of-domain');
    expect(codeOf(() => bootstrap(values, { estimator: () => NaN, random }))).toBe('not-finite');
    expect(codeOf(() => bootstrap(values, { estimator: mean, random: () => 1 }))).toBe('out-of-domain');
  });
});

describe('modeStandardError', () => {
  const results = [9.2, 9.8, 10, 10.1, 10.2, 10.3, 10.5, 11, 14];

  it('gives the mode and a standard error that repeats with its seed', () => {
    const run = (seed: number) =>
      modeStandardError(results, { bandwidth: 0.4, random: xoroshiro128plus(seed), resamples: 300 });
    const found = run(3);
    expect(found).toEqual(run(3));
    expectClose(found.mode, 10.15, { atol: 0.1 });
    expect(found.standardError).toBeGreaterThan(0.02);
    expect(found.standardError).toBeLessThan(1);
    expect(found.unimodalShare).toBeGreaterThan(0);
    expect(found.unimodalShare).toBeLessThan(1);
  });

  it('is larger where two modes are nearly as high', () => {
    const random = () => xoroshiro128plus(8);
    const two = [...results, ...results.map((x) => x + 6)];
    const single = modeStandardError(results, { bandwidth: 0.4, random: random(), resamples: 200 });
    const double = modeStandardError(two, { bandwidth: 0.4, random: random(), resamples: 200 });
    expect(double.standardError).toBeGreaterThan(3 * single.standardError);
  });

  it('is 0 for equal values, and refuses senseless options', () => {
    const random = xoroshiro128plus(1);
    expect(modeStandardError([2, 2, 2], { bandwidth: 1, random, resamples: 60 }).standardError).toBe(0);
    expect(codeOf(() => modeStandardError(results, { bandwidth: 0, random }))).toBe('no-spread');
    expect(codeOf(() => modeStandardError(results, { bandwidth: 1, random, resamples: 1.5 }))).toBe(
      'out-of-domain',
    );
  });
});
