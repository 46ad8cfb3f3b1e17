import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { algorithmA, madE, median, winsorise } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

/** The standard read line by line, without the running sums: the slow version to compare with. */
function plainAlgorithmA(values: readonly number[]): { location: number; scale: number } {
  let state = { location: median(values), scale: madE(values) };
  for (let i = 0; i < 5000; i += 1) {
    const next = winsorise(values, state);
    const still = Math.abs(next.mean - state.location) + Math.abs(next.scale - state.scale);
    state = { location: next.mean, scale: next.scale };
    if (still <= 1e-14 * state.scale) break;
  }
  return state;
}

const rounds = fc
  .array(
    fc.integer({ min: 0, max: 2000 }).map((n) => n / 100),
    { minLength: 3, maxLength: 40 },
  )
  .filter((values) => madE(values) > 0);

describe('algorithmA', () => {
  it('agrees with the plain version', () => {
    fc.assert(
      fc.property(rounds, (values) => {
        const fast = algorithmA(values);
        const slow = plainAlgorithmA(values);
        expectClose(fast.location, slow.location, { atol: 1e-8 * slow.scale });
        expectClose(fast.scale, slow.scale, { rtol: 1e-8 });
      }),
      { numRuns: 300 },
    );
  });

  it('moves by a bounded amount when a fifth of the results go wild', () => {
    const good = Array.from({ length: 24 }, (_, i) => 10 + Math.sin(i * 2.4));
    const before = algorithmA(good);
    for (const size of [1e3, 1e9, 1e300, -1e300]) {
      const after = algorithmA([...good, ...Array(6).fill(size)]);
      expect(Math.abs(after.location - before.location)).toBeLessThan(before.scale);
      expect(after.scale).toBeLessThan(2.5 * before.scale);
    }
  });

  it('gives each step when asked and none otherwise', () => {
    const values = [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9];
    expect(algorithmA(values).trace).toBeNull();
    const { trace, iterations, location, scale, startScale } = algorithmA(values, { working: true });
    expect(trace).toHaveLength(iterations);
    expect(startScale).toBe(madE(values));
    for (const row of trace ?? []) {
      const step = winsorise(values, row);
      expectClose(row.newLocation, step.mean, { rtol: 1e-12 });
      expectClose(row.newScale, step.scale, { rtol: 1e-12 });
      expect(row.countBelow).toBe(values.filter((value) => value < row.lower).length);
      expect(row.countAbove).toBe(values.filter((value) => value > row.upper).length);
    }
    expect(trace?.at(-1)).toMatchObject({ newLocation: location, newScale: scale });
  });

  it('stops earlier by the third-digit rule of the standard, with the same three figures', () => {
    const values = [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9];
    const full = algorithmA(values);
    const short = algorithmA(values, { tolerance: 'third-digit' });
    expect(short.iterations).toBeLessThan(full.iterations);
    expect(short.scale.toPrecision(2)).toBe(full.scale.toPrecision(2));
    expect(
      algorithmA(
        values.map((value) => value * 1e-310),
        { tolerance: 'third-digit' },
      ).scale,
    ).toBeGreaterThan(0);
  });

  it('calls equal values a zero scale', () => {
    expect(algorithmA([7, 7, 7])).toMatchObject({
      location: 7,
      scale: 0,
      zeroScale: true,
      converged: true,
      startScaleFrom: 'all-equal',
      iterations: 0,
    });
  });

  it('starts from nIQR when MADe is zero', () => {
    const found = algorithmA([0, 0, 0, 0, 0, 1, 1, 1, -1]);
    expect(found.startScaleFrom).toBe('niqr');
    expect(found.startScale).toBe(0.7413);
    expect(found.scale).toBeGreaterThan(0.5);
  });

  it('starts from the mean absolute deviation when nIQR is zero too, and reports ties that leave no scale', () => {
    const found = algorithmA([1, 1, 1, 1, 1, 1, 1, 5, 9]);
    expect(found.startScaleFrom).toBe('mean-absolute-deviation');
    expectClose(found.startScale, (Math.sqrt(Math.PI / 2) * 12) / 9, { rtol: 1e-14 });
    expect(found).toMatchObject({ location: 1, scale: 0, zeroScale: true, converged: true });
  });

  it('takes two values, and refuses one', () => {
    const found = algorithmA([1, 2]);
    expectClose(found.location, 1.5, { rtol: 1e-12 });
    expect(found.scale).toBeGreaterThan(0.5);
    expect(codeOf(() => algorithmA([1]))).toBe('too-few-values');
  });

  it('settles from a start two hundred orders of magnitude below its end', () => {
    const far = [0, 0, 0, 0, 0, 0, -5e-324, -1.5635e-112, -1.5634e-112, 1.14e-112];
    const found = algorithmA(far);
    expect(found.startScale).toBe(5e-324);
    expect(found.scale).toBeGreaterThan(5e-113);
  });

  it('reports that it did not settle', () => {
    expect(codeOf(() => algorithmA([1, 2, 3, 50], { maxIterations: 2 }))).toBe('no-convergence');
  });

  it('refuses a senseless tolerance or limit', () => {
    for (const tolerance of [0, -1, 1, NaN]) {
      expect(codeOf(() => algorithmA([1, 2, 3], { tolerance }))).toBe('out-of-domain');
    }
    expect(codeOf(() => algorithmA([1, 2, 3], { maxIterations: 0 }))).toBe('out-of-domain');
  });

  it('evaluates a million results', () => {
    const values = Array.from({ length: 1_000_000 }, (_, i) => 50 + ((i * 7919) % 1000) / 100);
    const found = algorithmA(values);
    expectClose(found.location, 54.995, { atol: 1e-6 });
    expect(found.iterations).toBeLessThan(100);
  });
});
