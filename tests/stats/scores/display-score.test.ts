import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { displayScore, signalOf } from '@/lib/stats';

describe('displayScore', () => {
  it.each([
    [1.234, '1.23'],
    [-1.236, '-1.24'],
    [2, '2.00'],
    [2.001, '2.001'],
    [2.0049, '2.005'],
    [2.994, '2.99'],
    [2.998, '2.998'],
    [-2.9996, '-2.9996'],
    [3, '3.00'],
    [3.004, '3.00'],
    [1.998, '2.00'],
    [0.001, '0.00'],
    [-0.001, '0.00'],
    [-0, '0.00'],
    [2.0000000000000004, '2.0000000000000004'],
    [1234.5678, '1234.57'],
  ])('shows z = %d as %s', (value, expected) => {
    expect(displayScore(value, 'z')).toBe(expected);
  });

  it.each([
    ['e-n', 1, '1.00'],
    ['e-n', 1.0004, '1.0004'],
    ['e-n', 0.999, '1.00'],
    ['p-a', 100.001, '100.001'],
    ['p-a', 100, '100.00'],
    ['p-a', 99.999, '100.00'],
  ] as const)('shows %s = %d as %s', (kind, value, expected) => {
    expect(displayScore(value, kind)).toBe(expected);
  });

  it('never shows a figure that would give another signal, and never a minus before zero', () => {
    const kinds = fc.constantFrom('z', 'z-prime', 'zeta', 'e-n', 'p-a');
    const near = fc
      .tuple(
        fc.constantFrom(0, 1, 2, 3, 100),
        fc.double({ min: -0.01, max: 0.01, noNaN: true }),
        fc.boolean(),
      )
      .map(([limit, off, negative]) => (negative ? -1 : 1) * (limit + off));
    fc.assert(
      fc.property(kinds, near, (kind, value) => {
        const text = displayScore(value, kind);
        expect(signalOf(kind, Number(text))).toBe(signalOf(kind, value));
        expect(text).toMatch(/^-?\d+\.\d{2,17}$/);
        expect(text).not.toMatch(/^-0\.0+$/);
      }),
      { numRuns: 500 },
    );
  });
});
