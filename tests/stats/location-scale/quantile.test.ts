import { describe, expect, it } from 'vitest';
import { median, nIqr, quantile, type QuantileType } from '@/lib/stats';
import { expectClose } from '../expect-close';
import fixture from '../fixtures/quantile-numpy.json';
import { codeOf } from '../hostile';

describe('quantile', () => {
  it.each(fixture.cases)('computed with numpy: type $type of $data at $probability', (testCase) => {
    const values = fixture.inputs[testCase.data as keyof typeof fixture.inputs];
    const type = testCase.type as QuantileType;
    expectClose(quantile(values, testCase.probability, { type }), testCase.expected, fixture);
  });

  it('is type 7 unless another is asked for', () => {
    expect(quantile([1, 2, 3, 10], 0.25)).toBe(1.75);
  });

  it('gives the median at one half by the symmetric types', () => {
    for (const type of [2, 5, 6, 7, 8, 9] as const) {
      expectClose(quantile([4, 1, 3, 9], 0.5, { type }), 3.5, { rtol: 1e-15 });
    }
    expect(median([4, 1, 3, 9])).toBe(3.5);
  });

  it('takes a rank that misses a whole number by rounding as whole', () => {
    const values = Array.from({ length: 10 }, (_, i) => i + 1);
    expect(quantile(values, 0.1 + 0.2, { type: 1 })).toBe(3);
  });

  it('refuses a probability outside 0 to 1 and an unknown type', () => {
    for (const p of [-0.1, 1.1, NaN]) expect(codeOf(() => quantile([1, 2], p))).toBe('out-of-domain');
    expect(codeOf(() => quantile([1, 2], 0.5, { type: 10 as QuantileType }))).toBe('out-of-domain');
  });

  it('does not overflow between the ends of the number range', () => {
    expectClose(quantile([-1.7e308, 1.7e308], 0.75), 0.85e308, { rtol: 1e-12 });
    expect(codeOf(() => nIqr([-1.7e308, -1.7e308, 1.7e308, 1.7e308]))).toBe('out-of-domain');
  });
});
