import { describe, expect, it } from 'vitest';
import {
  noncentralTCdf,
  noncentralTQuantile,
  noncentralTSurvival,
  studentTCdf,
  studentTSurvival,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import fixture from '../fixtures/noncentral-t-r.json';
import { codeOf } from '../hostile';

describe('noncentral t', () => {
  it(`computed with ${fixture.program}: both tails over a grid`, () => {
    expect(fixture.values.length).toBeGreaterThan(100);
    for (const [x, df, ncp, lower, upper] of fixture.values as [number, number, number, number, number][]) {
      expectClose(noncentralTCdf(x, df, ncp), lower, { rtol: 1e-10 });
      expectClose(noncentralTSurvival(x, df, ncp), upper, { rtol: 1e-10 });
    }
  });

  it('computed with R 4.2.2: the median of t(10, 2) and an upper quantile of t(19, 1.96 sqrt(20))', () => {
    expectClose(noncentralTQuantile(0.5, 10, 2), 2.053691151119523, { rtol: 1e-10 });
    expectClose(noncentralTQuantile(0.975, 19, 1.96 * Math.sqrt(20)), 13.47925680075322, { rtol: 1e-10 });
  });

  it('without noncentrality is Student t, down to tails of 1e-60', () => {
    for (const df of [1, 3.3, 30, 2000]) {
      for (const x of [-16, -2, 0, 0.5, 4, 16]) {
        expectClose(noncentralTCdf(x, df, 0), studentTCdf(x, df), { rtol: 1e-11 });
        expectClose(noncentralTSurvival(x, df, 0), studentTSurvival(x, df), { rtol: 1e-11 });
      }
    }
  });

  it('has quantiles that its distribution function takes back', () => {
    for (const df of [2, 11.5, 300]) {
      for (const ncp of [-4, 0, 1, 20]) {
        for (const p of [1e-12, 1e-4, 0.3, 0.9, 0.99999]) {
          expectClose(noncentralTCdf(noncentralTQuantile(p, df, ncp), df, ncp), p, { rtol: 1e-11 });
        }
      }
    }
  });

  it('mirrors when the signs of value and noncentrality change', () => {
    expectClose(noncentralTCdf(-2, 7, 1.5), noncentralTSurvival(2, 7, -1.5), { rtol: 1e-14 });
  });

  it('refuses senseless arguments', () => {
    expect(codeOf(() => noncentralTCdf(NaN, 5, 1))).toBe('not-finite');
    expect(codeOf(() => noncentralTCdf(1, 5, Infinity))).toBe('not-finite');
    expect(codeOf(() => noncentralTSurvival(1, 0, 1))).toBe('out-of-domain');
    expect(codeOf(() => noncentralTQuantile(1, 5, 1))).toBe('out-of-domain');
  });
});
