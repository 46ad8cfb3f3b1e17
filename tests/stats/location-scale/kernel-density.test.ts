import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kernelBandwidth, kernelDensity, modes } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

function plainDensity(values: readonly number[], bandwidth: number, point: number): number {
  const kernels = values.map((value) => Math.exp(-0.5 * ((point - value) / bandwidth) ** 2));
  return (
    kernels.reduce((sum, kernel) => sum + kernel, 0) / (values.length * bandwidth * Math.sqrt(2 * Math.PI))
  );
}

const data = fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 1, maxLength: 60 });

describe('kernelDensity', () => {
  it('agrees with the plain double sum', () => {
    fc.assert(
      fc.property(data, fc.double({ min: 0.05, max: 20, noNaN: true }), (values, bandwidth) => {
        const { points, density } = kernelDensity(values, { bandwidth, gridSize: 41 });
        const highestKernel = 1 / (bandwidth * Math.sqrt(2 * Math.PI));
        points.forEach((point, i) => {
          expectClose(density[i] as number, plainDensity(values, bandwidth, point), {
            atol: 1e-13 * highestKernel,
          });
        });
      }),
    );
  });

  it('agrees with it for many values in any order, with far ones and without', () => {
    for (const n of [1_000, 4_999, 30_000]) {
      for (const far of [0, 1e6]) {
        const values = Array.from({ length: n }, (_, i) => 10 * Math.sin(i * i) + (i === 7 ? far : 0));
        const { points, density } = kernelDensity(values, { bandwidth: 0.3, gridSize: 41 });
        points.forEach((point, i) => {
          expectClose(density[i] as number, plainDensity(values, 0.3, point), { atol: 1e-13 / 0.3 });
        });
        const turned = kernelDensity(values.toReversed(), { bandwidth: 0.3, gridSize: 41 }).density;
        turned.forEach((height, i) => expectClose(height, density[i] as number, { atol: 1e-13 / 0.3 }));
      }
    }
  });

  it('has area 1', () => {
    const { points, density } = kernelDensity([1, 2, 2.5, 9], { bandwidth: 0.7, gridSize: 2000 });
    const step = (points[1] as number) - (points[0] as number);
    expectClose(density.reduce((sum, height) => sum + height, 0) * step, 1, { atol: 0.005 });
  });

  it('is evaluated at the points asked for, in their order', () => {
    const found = kernelDensity(Object.freeze([1, 2, 3]), { bandwidth: 1, points: Object.freeze([2, 0]) });
    expect(found.points).toEqual([2, 0]);
    expectClose(found.density[0] as number, plainDensity([1, 2, 3], 1, 2), { rtol: 1e-13 });
  });

  it('shows one kernel for equal values', () => {
    const found = kernelDensity([5, 5, 5], { bandwidth: 2, points: [5] });
    expectClose(found.density[0] as number, 1 / (2 * Math.sqrt(2 * Math.PI)), { rtol: 1e-14 });
  });

  it('refuses a bandwidth that is not above zero, and a grid of one point', () => {
    expect(codeOf(() => kernelDensity([1], { bandwidth: 0 }))).toBe('no-spread');
    expect(codeOf(() => kernelDensity([1], { bandwidth: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => kernelDensity([1], { bandwidth: NaN }))).toBe('not-finite');
    expect(codeOf(() => kernelDensity([1, 2], { bandwidth: 1, gridSize: 1 }))).toBe('out-of-domain');
    expect(codeOf(() => kernelDensity([], { bandwidth: 1 }))).toBe('too-few-values');
    expect(codeOf(() => kernelDensity([-1e308, 1e308], { bandwidth: 1e-9 }))).toBe('out-of-domain');
  });
});

describe('modes', () => {
  it('finds two groups and tells which is higher', () => {
    const found = modes([1, 1.1, 1.2, 0.9, 9, 9.1], { bandwidth: 0.5 });
    expect(found.modes).toHaveLength(2);
    expect(found.unimodal).toBe(false);
    expectClose(found.highest, 1.05, { atol: 0.01 });
    expectClose(found.modes[1]?.relativeHeight ?? NaN, 0.5, { atol: 0.02 });
  });

  it('finds maxima: the density is lower on both sides', () => {
    fc.assert(
      fc.property(data, fc.double({ min: 0.2, max: 10, noNaN: true }), (values, bandwidth) => {
        for (const { location, height } of modes(values, { bandwidth }).modes) {
          expectClose(height, plainDensity(values, bandwidth, location), { rtol: 1e-10 });
          for (const side of [-0.02, 0.02]) {
            const beside = plainDensity(values, bandwidth, location + side * bandwidth);
            expect(beside).toBeLessThanOrEqual(height * (1 + 1e-12));
          }
        }
      }),
    );
  });

  it('gives a wild result a small mode of its own', () => {
    const found = modes([1, 1.1, 1.2, 1e6], { bandwidth: 0.3 });
    expect(found.modes.map(({ location }) => Math.round(location))).toEqual([1, 1e6]);
    expectClose(found.modes[1]?.location ?? NaN, 1e6, { rtol: 1e-12 });
  });

  it('finds the value itself when all are equal', () => {
    expect(modes([4, 4, 4], { bandwidth: 1 })).toMatchObject({ highest: 4, unimodal: true });
  });

  it('moves with the values', () => {
    const values = [1, 1.5, 2, 6, 6.5];
    const [near, far] = [values, values.map((value) => value + 1000)].map((set) =>
      modes(set, { bandwidth: 0.8 }),
    );
    expect(near?.modes).toHaveLength(2);
    near?.modes.forEach(({ location }, i) => {
      expectClose(far?.modes[i]?.location ?? NaN, location + 1000, { atol: 1e-9 });
    });
  });
});

describe('kernelBandwidth', () => {
  it('is 0.75 sigma_pt, or 0.9 s* / p^0.2', () => {
    expect(kernelBandwidth({ rule: 'sigma-pt', sigmaPt: 2 })).toBe(1.5);
    expectClose(kernelBandwidth({ rule: 'robust-sd', robustSd: 2, count: 32 }), 0.9, { rtol: 1e-14 });
  });

  it('refuses a zero scale and a count below one', () => {
    expect(codeOf(() => kernelBandwidth({ rule: 'sigma-pt', sigmaPt: 0 }))).toBe('no-spread');
    expect(codeOf(() => kernelBandwidth({ rule: 'robust-sd', robustSd: 0, count: 9 }))).toBe('no-spread');
    expect(codeOf(() => kernelBandwidth({ rule: 'robust-sd', robustSd: 1, count: 0 }))).toBe(
      'too-few-values',
    );
  });
});
