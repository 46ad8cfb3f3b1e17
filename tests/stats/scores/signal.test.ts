import { describe, expect, it } from 'vitest';
import { signalOf, type ScoreKind, type Signal } from '@/lib/stats';
import { codeOf } from '../hostile';

const below = (limit: number) => limit - limit * Number.EPSILON;
const beyond = (limit: number) => limit + limit * Number.EPSILON;

describe('signalOf', () => {
  const cases: [ScoreKind, number, Signal][] = (['z', 'z-prime', 'zeta'] as const).flatMap((kind) => [
    [kind, 0, 'none'],
    [kind, 2, 'none'],
    [kind, beyond(2), 'warning'],
    [kind, below(3), 'warning'],
    [kind, 3, 'action'],
    [kind, 1e300, 'action'],
  ]);
  cases.push(
    ['e-n', 1, 'none'],
    ['e-n', beyond(1), 'action'],
    ['p-a', 100, 'none'],
    ['p-a', beyond(100), 'action'],
  );

  it.each(cases)('%s of %d, on both sides of zero: %s', (kind, value, expected) => {
    expect(signalOf(kind, value)).toBe(expected);
    expect(signalOf(kind, -value)).toBe(expected);
  });

  it('refuses what is no number', () => {
    expect(codeOf(() => signalOf('z', NaN))).toBe('not-finite');
  });
});
