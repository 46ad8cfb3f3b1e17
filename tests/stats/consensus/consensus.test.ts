import { describe, expect, it } from 'vitest';
import { consensusUncertainty, meanUncertainty, negligibleUncertainty } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

describe('consensusUncertainty', () => {
  it('is 1.25 s* / sqrt(p), or with the factor asked for', () => {
    expect(consensusUncertainty({ robustSd: 2, count: 25 })).toBe(0.5);
    expectClose(consensusUncertainty({ robustSd: 2, count: 25 }, { factor: 1.253 }), 0.5012, { rtol: 1e-14 });
    expect(consensusUncertainty({ robustSd: 0, count: 25 })).toBe(0);
  });

  it('refuses one result, a negative scale and a senseless factor', () => {
    expect(codeOf(() => consensusUncertainty({ robustSd: 1, count: 1 }))).toBe('too-few-values');
    expect(codeOf(() => consensusUncertainty({ robustSd: -1, count: 9 }))).toBe('out-of-domain');
    expect(codeOf(() => consensusUncertainty({ robustSd: 1, count: 9 }, { factor: 0 }))).toBe(
      'out-of-domain',
    );
  });
});

describe('meanUncertainty', () => {
  it('is sd / sqrt(p)', () => {
    expect(meanUncertainty({ standardDeviation: 2, count: 16 })).toBe(0.5);
    expect(codeOf(() => meanUncertainty({ standardDeviation: 2, count: 1 }))).toBe('too-few-values');
  });
});

describe('negligibleUncertainty', () => {
  it.each([
    [0.29, 1, true],
    [0.3, 1, true],
    [0.03, 0.1, true],
    [0.9, 3, true],
    [0.3001, 1, false],
  ])('u(x_pt) = %f against sigma_pt = %f: %s', (standardUncertainty, sigmaPt, negligible) => {
    expect(negligibleUncertainty({ standardUncertainty, sigmaPt })).toMatchObject({ negligible, limit: 0.3 });
  });

  it('refuses a sigma_pt of zero', () => {
    expect(codeOf(() => negligibleUncertainty({ standardUncertainty: 1, sigmaPt: 0 }))).toBe('no-spread');
  });
});
