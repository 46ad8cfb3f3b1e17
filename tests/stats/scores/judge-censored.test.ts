import { describe, expect, it } from 'vitest';
import { judgeCensored } from '@/lib/stats';
import { codeOf } from '../hostile';

describe('judgeCensored with x_pt = 10 and sigma_pt = 2, so a range of 6 to 14', () => {
  it.each([
    ['<', 5.9, 'inconsistent'],
    ['<', 6, 'consistent'],
    ['<', 10, 'consistent'],
    ['<', 14, 'consistent'],
    ['<', 14.1, 'uninformative'],
    ['>', 14.1, 'inconsistent'],
    ['>', 14, 'consistent'],
    ['>', 6, 'consistent'],
    ['>', 5.9, 'uninformative'],
  ] as const)('%s%f is %s', (comparator, limit, expected) => {
    expect(judgeCensored({ comparator, limit, assignedValue: 10, sigmaPt: 2 })).toBe(expected);
  });

  it('takes the ends of the range from decimal figures', () => {
    expect(judgeCensored({ comparator: '<', limit: 1.1, assignedValue: 0.9, sigmaPt: 0.1 })).toBe(
      'consistent',
    );
  });

  it('refuses a sigma_pt of zero', () => {
    expect(codeOf(() => judgeCensored({ comparator: '<', limit: 1, assignedValue: 1, sigmaPt: 0 }))).toBe(
      'no-spread',
    );
  });
});
