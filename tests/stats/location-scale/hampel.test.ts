import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hampel, median, qMethod } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

function psi(q: number): number {
  const size = Math.abs(q);
  if (size <= 1.5) return q;
  if (size <= 3) return Math.sign(q) * 1.5;
  return size <= 4.5 ? Math.sign(q) * (4.5 - size) : 0;
}
const sumOfPsi = (values: readonly number[], m: number, s: number) =>
  values.reduce((sum, x) => sum + psi((x - m) / s), 0);

/** All corners in order, every change of sign between them, the nearest to the median. */
function slowDistances(values: readonly number[], s: number): number[] {
  const corners = values
    .flatMap((x) => [-4.5, -3, -1.5, 1.5, 3, 4.5].map((bend) => x + bend * s))
    .sort((a, b) => a - b);
  const found: number[] = [];
  corners.slice(1).forEach((high, i) => {
    const low = corners[i] as number;
    const [f0, f1] = [sumOfPsi(values, low, s), sumOfPsi(values, high, s)];
    if (f0 * f1 < 0 && Math.abs(f0) > 1e-9 && Math.abs(f1) > 1e-9)
      found.push(low - (f0 * (high - low)) / (f1 - f0));
  });
  return found.map((root) => Math.abs(root - median(values))).sort((a, b) => a - b);
}

const rounds = fc.array(fc.integer({ min: -60, max: 60 }), { minLength: 2, maxLength: 60 });

describe('hampel', () => {
  it('solves its equation, and no crossing lies nearer to the median', () => {
    fc.assert(
      fc.property(rounds, fc.constantFrom(0.7, 2, 5, 20), (values, scale) => {
        const { location, tied } = hampel(values, { scale });
        if (!tied) expectClose(sumOfPsi(values, location, scale), 0, { atol: 1e-10 * values.length });
        const nearest = slowDistances(values, scale)[0];
        if (nearest !== undefined)
          expect(Math.abs(location - median(values))).toBeLessThanOrEqual(nearest + 1e-9);
      }),
      { numRuns: 500 },
    );
  });

  it('gives no weight to results far away', () => {
    const good = Array.from({ length: 24 }, (_, i) => 10 + Math.sin(i * 2.4));
    for (const size of [1e3, 1e9, 1e300]) {
      expectClose(
        hampel([...good, size, size, -size], { scale: 0.7 }).location,
        hampel(good, { scale: 0.7 }).location,
        {
          atol: 0.1,
        },
      );
    }
  });

  it('takes the scale of the Q method when none is given', () => {
    const values = [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9];
    expect(hampel(values)).toEqual(hampel(values, { scale: qMethod(values).scale }));
  });

  it('takes the median where two groups pull equally, and where the scale is 0', () => {
    const apart = hampel([0, 0, 10, 10], { scale: 1 });
    expect(apart).toMatchObject({ location: 5, tied: true });
    expect(hampel([3, 3, 3], { working: true })).toMatchObject({
      location: 3,
      scale: 0,
      zeroScale: true,
      working: [],
    });
    expect(hampel([1, 2, 9], { scale: 0 }).location).toBe(2);
  });

  it('gives a step from which the figure can be redone', () => {
    for (const values of [
      [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9],
      [1, 2, 3],
      [0, 0, 10, 10],
    ]) {
      const found = hampel(values, { scale: 1, working: true });
      const { x0, f0, x1, f1, median: middle } = found.working?.[0]?.inputs as Record<string, number>;
      const redone = found.tied
        ? (middle as number)
        : (x0 as number) -
          ((f0 as number) * ((x1 as number) - (x0 as number))) / ((f1 as number) - (f0 as number));
      expectClose(redone, found.location, { rtol: 1e-13 });
      if (!found.tied) expectClose(f0 as number, sumOfPsi(values, x0 as number, 1), { atol: 1e-12 });
    }
  });

  it('moves and stretches with the values', () => {
    fc.assert(
      fc.property(rounds, fc.integer({ min: -1000, max: 1000 }), (values, shift) => {
        const base = hampel(values, { scale: 4 });
        const moved = values.map((x) => 8 * (x + shift));
        expectClose(hampel(moved, { scale: 32 }).location, 8 * (base.location + shift), { atol: 1e-8 });
      }),
    );
  });

  it('refuses one value and a negative scale', () => {
    expect(codeOf(() => hampel([1]))).toBe('too-few-values');
    expect(codeOf(() => hampel([1, 2], { scale: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => hampel([1, NaN]))).toBe('not-finite');
  });
});
