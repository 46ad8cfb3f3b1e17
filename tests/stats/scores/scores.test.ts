import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  classifyUncertainty,
  difference,
  eNScore,
  percentDifference,
  percentOfAllowed,
  signalOf,
  zPrimeScore,
  zScore,
  zetaScore,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

const figure = fc.integer({ min: -9999, max: 9999 }).map((n) => n / 100);
const positive = fc.integer({ min: 1, max: 9999 }).map((n) => n / 100);

describe('scores', () => {
  it('turn their sign when result and assigned value are swapped', () => {
    fc.assert(
      fc.property(figure, figure, positive, positive, (value, assignedValue, a, b) => {
        const there = { value, assignedValue };
        const back = { value: assignedValue, assignedValue: value };
        expect(difference(there) + difference(back)).toBe(0);
        expect(zScore({ ...there, sigmaPt: a }) + zScore({ ...back, sigmaPt: a })).toBe(0);
        const zeta = (pair: typeof there) =>
          zetaScore({ ...pair, standardUncertainty: a, assignedUncertainty: b });
        expect(zeta(there) + zeta(back)).toBe(0);
      }),
    );
  });

  it("are related: z' lies nearer to zero than z, and E_n with k = 2 is half of zeta", () => {
    fc.assert(
      fc.property(figure, figure, positive, positive, (value, assignedValue, a, b) => {
        const pair = { value, assignedValue };
        const z = zScore({ ...pair, sigmaPt: a });
        const zPrime = zPrimeScore({ ...pair, sigmaPt: a, assignedUncertainty: b });
        expect(Math.abs(zPrime)).toBeLessThanOrEqual(Math.abs(z));
        const zeta = zetaScore({ ...pair, standardUncertainty: a, assignedUncertainty: b });
        const expanded = { expandedUncertainty: 2 * a, assignedExpandedUncertainty: 2 * b };
        expectClose(eNScore({ ...pair, ...expanded }), zeta / 2, { rtol: 1e-14 });
      }),
    );
  });

  it('are on the side of a limit where the decimal figures are', () => {
    const z = (value: number, assignedValue: number, sigmaPt: number) =>
      zScore({ value, assignedValue, sigmaPt });
    expect((1.1 - 0.9) / 0.1).toBeGreaterThan(2); // what binary arithmetic alone would say
    expect(z(1.1, 0.9, 0.1)).toBe(2);
    expect(z(0.9, 1.1, 0.1)).toBe(-2);
    expect(z(1.3, 1, 0.1)).toBe(3);
    expect(signalOf('z', z(11.3, 11, 0.1))).toBe('action');
    expect(signalOf('z', z(11.2, 11, 0.1))).toBe('none');
    expect(signalOf('z', z(11.2000000001, 11, 0.1))).toBe('warning');
    expect(signalOf('z', z(11.2999999999, 11, 0.1))).toBe('warning');
  });

  it('have whole z exactly at the limits for any decimal figures', () => {
    const thousandths = fc.integer({ min: 1, max: 9999 });
    fc.assert(
      fc.property(thousandths, thousandths, fc.constantFrom(-3, -2, 2, 3), (sigma, assigned, times) => {
        const value = (assigned + times * sigma) / 1000;
        expect(zScore({ value, assignedValue: assigned / 1000, sigmaPt: sigma / 1000 })).toBe(times);
      }),
    );
  });

  it('judge z prime, zeta, E_n and P_A by decimal figures at the limit as well', () => {
    const pair = { value: 2, assignedValue: 1 };
    expect(zPrimeScore({ ...pair, sigmaPt: 0.3, assignedUncertainty: 0.4 })).toBe(2);
    expect(zetaScore({ ...pair, standardUncertainty: 0.3, assignedUncertainty: 0.4 })).toBe(2);
    expect(
      eNScore({ value: 1.5, assignedValue: 1, expandedUncertainty: 0.3, assignedExpandedUncertainty: 0.4 }),
    ).toBe(1);
    expect(percentOfAllowed({ value: 1.1, assignedValue: 0.9, allowedDifference: 0.2 })).toBe(100);
  });

  it('refuse a scale of zero, a negative one and figures that are no numbers', () => {
    const pair = { value: 2, assignedValue: 1 };
    expect(codeOf(() => zScore({ ...pair, sigmaPt: 0 }))).toBe('no-spread');
    expect(codeOf(() => zScore({ ...pair, sigmaPt: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => zScore({ value: NaN, assignedValue: 1, sigmaPt: 1 }))).toBe('not-finite');
    expect(codeOf(() => zPrimeScore({ ...pair, sigmaPt: 0, assignedUncertainty: 1 }))).toBe('no-spread');
    expect(codeOf(() => zPrimeScore({ ...pair, sigmaPt: 1, assignedUncertainty: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => zetaScore({ ...pair, standardUncertainty: 0, assignedUncertainty: 0 }))).toBe(
      'no-spread',
    );
    expect(codeOf(() => eNScore({ ...pair, expandedUncertainty: 0, assignedExpandedUncertainty: 0 }))).toBe(
      'no-spread',
    );
    expect(codeOf(() => percentOfAllowed({ ...pair, allowedDifference: 0 }))).toBe('no-spread');
    expect(codeOf(() => percentDifference({ value: 1, assignedValue: 0 }))).toBe('out-of-domain');
  });

  it('stay finite at the ends of the number range, or say that they cannot', () => {
    expectClose(zScore({ value: 1.7e308, assignedValue: -1.7e308, sigmaPt: 1.7e308 }), 2, { rtol: 1e-15 });
    const sides = { standardUncertainty: 1e308, assignedUncertainty: 1e308 };
    expectClose(zetaScore({ value: 1e308, assignedValue: 0, ...sides }), Math.SQRT1_2, { rtol: 1e-15 });
    expectClose(zScore({ value: 2e-320, assignedValue: 1e-320, sigmaPt: 1e-320 }), 1, { rtol: 1e-3 });
    expect(codeOf(() => zScore({ value: 1e308, assignedValue: 0, sigmaPt: 1e-10 }))).toBe('out-of-domain');
    expect(Object.is(zScore({ value: -0, assignedValue: 0, sigmaPt: 1 }), 0)).toBe(true);
  });
});

describe('classifyUncertainty', () => {
  it.each([
    [0.19, 'low'],
    [0.2, 'plausible'],
    [1.5, 'plausible'],
    [1.51, 'high'],
  ])('calls %f %s between u(x_pt) = 0.2 and 1.5 s* = 1.5', (standardUncertainty, expected) => {
    expect(classifyUncertainty({ standardUncertainty, assignedUncertainty: 0.2, robustSd: 1 })).toBe(
      expected,
    );
  });
});
