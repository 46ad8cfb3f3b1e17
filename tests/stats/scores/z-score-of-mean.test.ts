import { describe, expect, it } from 'vitest';
import { zScore, zScoreOfMean } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

const input = { results: [11, 13], assignedValue: 10, reproducibilitySd: 5, repeatabilitySd: 4 };

describe('zScoreOfMean', () => {
  it('takes sigma_pt for a mean of so many replicates', () => {
    const found = zScoreOfMean(input);
    expectClose(found.sigmaPt, Math.sqrt(25 - 16 / 2), { rtol: 1e-14 });
    expectClose(found.z, 2 / Math.sqrt(17), { rtol: 1e-14 });
    expect(found).toMatchObject({ mean: 12, replicates: 2 });
  });

  it('for one result is z with sigma_R', () => {
    const found = zScoreOfMean({ ...input, results: [14] });
    expect(found.z).toBe(zScore({ value: 14, assignedValue: 10, sigmaPt: 5 }));
  });

  it('grows with the number of replicates towards the between-laboratory standard deviation', () => {
    const many = zScoreOfMean({ ...input, results: Array(1000).fill(13) });
    expectClose(many.sigmaPt, 3, { rtol: 0.002 });
  });

  it('shows its steps', () => {
    const { working, z } = zScoreOfMean(input);
    expect(working.map(({ value }) => value)).toEqual([12, zScoreOfMean(input).sigmaPt, z]);
  });

  it('refuses no results and crossed precision data', () => {
    expect(codeOf(() => zScoreOfMean({ ...input, results: [] }))).toBe('too-few-values');
    expect(codeOf(() => zScoreOfMean({ ...input, repeatabilitySd: 6 }))).toBe('out-of-domain');
    expect(codeOf(() => zScoreOfMean({ ...input, assignedValue: NaN }))).toBe('not-finite');
  });
});
