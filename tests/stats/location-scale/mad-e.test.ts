import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { madE, median, nIqr } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

describe('median, MADe and nIQR', () => {
  it('agree with the definition, written plainly', () => {
    const values = fc.array(
      fc.integer({ min: -300, max: 300 }).map((n) => n / 10),
      { minLength: 1, maxLength: 41 },
    );
    const plainMedian = (data: readonly number[]) => {
      const sorted = [...data].sort((a, b) => a - b);
      const [a, b] = [sorted[(sorted.length - 1) >> 1] as number, sorted[sorted.length >> 1] as number];
      return (a + b) / 2;
    };
    fc.assert(
      fc.property(values, (data) => {
        const centre = plainMedian(data);
        expectClose(median(data), centre, { atol: 0 });
        const deviations = data.map((value) => Math.abs(value - centre));
        expectClose(madE(data), 1.483 * plainMedian(deviations), { rtol: 1e-15 });
      }),
    );
  });

  it('bear nearly half of the values going wild', () => {
    const good = [10.1, 10.2, 10.3, 10.4, 10.5, 10.6];
    const wild = [1e9, 1e9, 1e9, 1e9, 1e9];
    expect(median([...good, ...wild])).toBe(10.6);
    expect(madE([...good, ...wild])).toBeLessThan(1);
  });

  it('take one and two values', () => {
    expect(median([4])).toBe(4);
    expect(madE([4])).toBe(0);
    expectClose(madE([4, 6]), 1.483, { rtol: 1e-15 });
    expect(codeOf(() => nIqr([4]))).toBe('too-few-values');
  });

  it('do not overflow in the middle', () => {
    expect(median([1.7e308, 1.7e308])).toBe(1.7e308);
    expectClose(madE([-1e308, 0, 1e308]), 1.483e308, { rtol: 1e-15 });
    expect(codeOf(() => madE([-1.7e308, 1.7e308]))).toBe('out-of-domain');
  });

  it('name the place of a value that is no number', () => {
    expect(() => median([1, NaN])).toThrow('median takes finite numbers only, found NaN at position 2');
    expect(() => median([])).toThrow('median requires at least 1 value, found 0');
  });
});
