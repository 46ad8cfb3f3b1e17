import { describe, expect, it } from 'vitest';
import {
  algorithmA,
  horRat,
  horwitzSigma,
  horwitzThompsonSigma,
  percentSigma,
  prescribedSigma,
  robustSigma,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

const MICROGRAM_PER_KILOGRAM = 1e-9;
const at = (assignedValue: number, massFractionPerUnit = MICROGRAM_PER_KILOGRAM) => ({
  assignedValue,
  massFractionPerUnit,
});

describe('sigma_pt', () => {
  it('is the prescribed value', () => {
    expect(prescribedSigma(0.5)).toBe(0.5);
    expect(codeOf(() => prescribedSigma(0))).toBe('no-spread');
    expect(codeOf(() => prescribedSigma(-1))).toBe('out-of-domain');
    expect(codeOf(() => prescribedSigma(NaN))).toBe('not-finite');
  });

  it('is a percentage of the assigned value', () => {
    expect(percentSigma({ assignedValue: 20, percent: 25 })).toBe(5);
    expect(percentSigma({ assignedValue: -20, percent: 25 })).toBe(5);
    expect(codeOf(() => percentSigma({ assignedValue: 0, percent: 25 }))).toBe('no-spread');
    expect(codeOf(() => percentSigma({ assignedValue: 20, percent: 0 }))).toBe('no-spread');
  });

  it('by Horwitz does not depend on the unit', () => {
    for (const level of [0.5, 20, 3000, 4e7, 3e8]) {
      const inGrams = level * 1e-9;
      expectClose(horwitzSigma(at(level)) * 1e-9, horwitzSigma(at(inGrams, 1)), { rtol: 1e-14 });
      expectClose(horwitzThompsonSigma(at(level)) * 1e-9, horwitzThompsonSigma(at(inGrams, 1)), {
        rtol: 1e-14,
      });
    }
  });

  it('by Thompson is 22 percent below 120 ug/kg and Horwitz from there to 13.8 percent', () => {
    expect(horwitzThompsonSigma(at(10))).toBe(2.2);
    expect(horwitzThompsonSigma(at(119))).toBe(0.22 * 119);
    expect(horwitzThompsonSigma(at(121))).toBe(horwitzSigma(at(121)));
    expect(horwitzThompsonSigma(at(0.138, 1))).toBe(horwitzSigma(at(0.138, 1)));
    expectClose(horwitzThompsonSigma(at(0.16, 1)), 0.004, { rtol: 1e-14 });
  });

  it('by Horwitz refuses a level that is no mass fraction', () => {
    for (const rule of [horwitzSigma, horwitzThompsonSigma]) {
      expect(codeOf(() => rule(at(0)))).toBe('no-spread');
      expect(codeOf(() => rule(at(-1)))).toBe('out-of-domain');
      expect(codeOf(() => rule(at(2, 1)))).toBe('out-of-domain');
      expect(codeOf(() => rule(at(1, 0)))).toBe('no-spread');
    }
  });

  it('is the robust standard deviation of this round, when there is one', () => {
    const values = [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9];
    expect(robustSigma(values)).toBe(algorithmA(values).scale);
    expect(codeOf(() => robustSigma([3, 3, 3]))).toBe('no-spread');
  });
});

describe('horRat', () => {
  it('is 1 where the standard deviation is as predicted', () => {
    expectClose(horRat({ standardDeviation: horwitzSigma(at(10)), ...at(10) }), 1, { rtol: 1e-15 });
    const input = { standardDeviation: 2.2, ...at(10) };
    expectClose(horRat(input, { prediction: 'horwitz-thompson' }), 1, { rtol: 1e-15 });
    expect(horRat(input)).toBeLessThan(0.7);
  });
});
