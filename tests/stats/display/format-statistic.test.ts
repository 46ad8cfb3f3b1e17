import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatStatistic } from '@/lib/stats';
import { codeOf } from '../hostile';

describe('formatStatistic', () => {
  it.each([
    [0.285, 2, '0.28'],
    [0.275, 2, '0.28'],
    [1.005, 2, '1.00'],
    [1.015, 2, '1.02'],
    [2.5, 0, '2'],
    [3.5, 0, '4'],
    [-0.004, 2, '0.00'],
    [-0.006, 2, '-0.01'],
    [-0, 0, '0'],
    [0.1 + 0.2, 2, '0.30'],
    [1e21, 1, '1000000000000000000000.0'],
    [5e-324, 3, '0.000'],
    [1.5e-7, 8, '0.00000015'],
    [99.995, 2, '100.00'],
  ])('shows %d with %d decimals as %s', (value, decimals, expected) => {
    expect(formatStatistic(value, decimals)).toBe(expected);
  });

  it('rounds ties away from zero when asked', () => {
    expect(formatStatistic(0.285, 2, { ties: 'away' })).toBe('0.29');
    expect(formatStatistic(-2.5, 0, { ties: 'away' })).toBe('-3');
  });

  it('is never further from the number than half a unit of the last place', () => {
    const numbers = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(numbers, fc.integer({ min: 0, max: 6 }), (value, decimals) => {
        const off = Math.abs(Number(formatStatistic(value, decimals)) - value);
        expect(off).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-9) + 1e-9 * 10 ** -decimals);
      }),
    );
  });

  it('refuses what is no number and senseless decimals', () => {
    expect(codeOf(() => formatStatistic(NaN, 2))).toBe('not-finite');
    for (const decimals of [-1, 1.5, 101])
      expect(codeOf(() => formatStatistic(1, decimals))).toBe('out-of-domain');
  });
});
