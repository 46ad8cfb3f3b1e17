import fc from 'fast-check';
import * as simple from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { mean, sd } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

describe('mean and sd', () => {
  it('computed with simple-statistics: agree on ordinary data', () => {
    const values = fc.array(fc.double({ min: 0.5, max: 1000, noNaN: true }), { minLength: 2, maxLength: 80 });
    fc.assert(
      fc.property(values, (data) => {
        expectClose(mean(data), simple.mean(data), { rtol: 1e-13 });
        expectClose(sd(data), simple.sampleStandardDeviation(data), { rtol: 1e-9, atol: 1e-11 });
      }),
    );
  });

  it('keep what cancels', () => {
    expectClose(mean([1e300, 1, -1e300]), 1 / 3, { rtol: 1e-15 });
    expectClose(sd([1e15, 1e15 + 1, 1e15 + 2]), 1, { rtol: 1e-15 });
  });

  it('stay finite where the result can be represented', () => {
    expectClose(mean([1.7e308, 1.7e308, 1.7e308]), 1.7e308, { rtol: 1e-15 });
    expectClose(sd([1e300, 2e300, 3e300]), 1e300, { rtol: 1e-15 });
    expectClose(sd([1e-300, 2e-300, 3e-300]), 1e-300, { rtol: 1e-15 });
    expect(sd([5e-324, 1e-323, 1.5e-323])).toBe(5e-324);
  });

  it('say so where it cannot', () => {
    expect(codeOf(() => sd([-1.7e308, 1.7e308]))).toBe('out-of-domain');
  });

  it('need one value for the mean and two for the standard deviation', () => {
    expect(mean([3])).toBe(3);
    expect(codeOf(() => sd([3]))).toBe('too-few-values');
    expectClose(sd([3, 5]), Math.SQRT2, { rtol: 1e-15 });
  });
});
