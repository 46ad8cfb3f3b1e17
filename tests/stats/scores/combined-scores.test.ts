import { describe, expect, it } from 'vitest';
import { COMBINED_SCORES_CAUTION, combinedScores } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

describe('combinedScores', () => {
  it('rescales the sum and sums the squares', () => {
    const found = combinedScores([1, 2, 3, -2]);
    expect(found).toMatchObject({ rsz: 2, ssz: 18, count: 4, beyondWarning: 1, beyondAction: 1 });
    expect(found.caution).toBe(COMBINED_SCORES_CAUTION);
  });

  it('says how likely they are by chance', () => {
    const found = combinedScores([1.959963984540054]);
    expectClose(found.rszProbability, 0.05, { rtol: 1e-12 });
    expectClose(found.sszProbability, 0.05, { rtol: 1e-12 });
    expect(combinedScores([0, 0])).toMatchObject({ rszProbability: 1, sszProbability: 1 });
  });

  it('shows what the caution means: opposite scores cancel in RSZ', () => {
    const found = combinedScores([4, -4]);
    expect(found.rsz).toBe(0);
    expect(found.sszProbability).toBeLessThan(1e-6);
  });

  it('counts the limits as the signals have them', () => {
    expect(combinedScores([2, -2, 3, -3])).toMatchObject({ beyondWarning: 2, beyondAction: 2 });
  });

  it('refuses no scores, NaN and sums that cannot be represented', () => {
    expect(codeOf(() => combinedScores([]))).toBe('too-few-values');
    expect(codeOf(() => combinedScores([NaN]))).toBe('not-finite');
    expect(codeOf(() => combinedScores([1e200]))).toBe('out-of-domain');
  });
});
