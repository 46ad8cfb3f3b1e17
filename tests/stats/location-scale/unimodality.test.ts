import { describe, expect, it } from 'vitest';
import { unimodality } from '@/lib/stats';
import { codeOf } from '../hostile';

const group = (at: number, n: number) => Array.from({ length: n }, (_, i) => at + Math.sin(i * 2.4) / 2);

describe('unimodality', () => {
  it('sees one group', () => {
    const found = unimodality(group(10, 30), { bandwidth: 0.5 });
    expect(found).toMatchObject({ verdict: 'one-mode', statement: 'The results form one group.' });
    expect(found.modes).toHaveLength(1);
    expect(found.modes[0]).toMatchObject({ count: 30, share: 1, major: true });
  });

  it('does not take a few wild results for a group', () => {
    const found = unimodality([...group(10, 30), 25, 40], { bandwidth: 0.5 });
    expect(found.verdict).toBe('one-main-mode');
    expect(found.statement).toBe('The results form one main group; 2 results stand apart.');
    expect(unimodality([...group(10, 30), 25], { bandwidth: 0.5 }).statement).toContain(
      '1 result stands apart',
    );
  });

  it('sees two groups, and how many results are in each', () => {
    const found = unimodality([...group(10, 30), ...group(14, 12)], { bandwidth: 0.5 });
    expect(found.verdict).toBe('several-modes');
    expect(found.modes.filter(({ major }) => major).map(({ count }) => count)).toEqual([30, 12]);
    expect(found.statement).toContain('2 groups');
  });

  it('sees when results are scattered', () => {
    const found = unimodality([1, 10, 20, 30, 40], { bandwidth: 0.5 });
    expect(found.verdict).toBe('several-modes');
    expect(found.statement).toContain('no group');
  });

  it('refuses no values and a bandwidth of 0', () => {
    expect(codeOf(() => unimodality([], { bandwidth: 1 }))).toBe('too-few-values');
    expect(codeOf(() => unimodality([1, 2], { bandwidth: 0 }))).toBe('no-spread');
  });
});
