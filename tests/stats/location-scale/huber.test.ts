import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { algorithmA, huberFactor, huberLocation, huberProposal2, mean, sd } from '@/lib/stats';
import { peerEstimates } from '@/scripts/peers/peer-estimates';
import { expectClose } from '../expect-close';
import fixture from '../fixtures/estimators-r.json';
import { codeOf } from '../hostile';

interface PeerSet {
  readonly name: string;
  readonly values: readonly number[];
  readonly expected: Readonly<Record<string, number>>;
}

describe(`estimators computed with ${fixture.program}`, () => {
  const sets = fixture.sets as unknown as readonly PeerSet[];

  it.each(sets.map(({ name, values, expected }) => [name, values, expected] as const))(
    '%s',
    (_, values, expected) => {
      const found = peerEstimates(values);
      for (const [key, value] of Object.entries(expected)) {
        // robustbase's own Qn is good to single precision only.
        expectClose(found[key] ?? NaN, value, { rtol: key === 'qnRobustbase' ? 1e-7 : fixture.rtol });
      }
    },
  );
});

describe('huberProposal2', () => {
  const values = [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9];

  it('is Algorithm A but for the rounded factor', () => {
    const [exact, printed] = [huberProposal2(values), algorithmA(values)];
    expectClose(exact.location, printed.location, { rtol: 0.001 });
    expectClose(exact.scale, printed.scale, { rtol: 0.003 });
    expectClose(exact.consistencyFactor, 1.1333926554624871, { rtol: 1e-14 });
  });

  it('with a very large k is mean and standard deviation', () => {
    const found = huberProposal2(values, { k: 40 });
    expectClose(found.location, mean(values), { rtol: 1e-12 });
    expectClose(found.scale, sd(values), { rtol: 1e-12 });
  });

  it('solves its two equations', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 200 }), { minLength: 3, maxLength: 40 }), (list) => {
        const { location, scale, zeroScale } = huberProposal2(list);
        if (zeroScale) return;
        const moved = list.map((x) => Math.min(location + 1.5 * scale, Math.max(location - 1.5 * scale, x)));
        expectClose(mean(moved), location, { atol: 1e-10 * scale });
        expectClose(1.1333926554624871 * sd(moved), scale, { rtol: 1e-10 });
      }),
    );
  });

  it('about a known location solves its equation, from zero spread to the ends of the number range', () => {
    const { location, scale } = huberProposal2(values, { location: 5 });
    const squares = values.map((x) => Math.min(Math.abs(x - 5), 1.5 * scale) ** 2);
    expectClose(1.1333926554624871 * Math.sqrt(mean(squares)), scale, { rtol: 1e-13 });
    expect(location).toBe(5);
    expect(huberProposal2([5, 5, 5], { location: 5 })).toMatchObject({ scale: 0, zeroScale: true });
    expect(huberProposal2([1, 1, 1, 1, 1, 1, 2, 3], { location: 1 }).scale).toBe(0);
    expect(codeOf(() => huberProposal2([-1.7e308, 1.7e308], { location: 1.7e308 }))).toBe('out-of-domain');
  });

  it('calls equal values a zero scale, and gives steps when asked', () => {
    expect(huberProposal2([7, 7, 7])).toMatchObject({
      location: 7,
      scale: 0,
      zeroScale: true,
      iterations: 0,
    });
    const { trace, iterations } = huberProposal2(values, { working: true, k: 1 });
    expect(trace).toHaveLength(iterations);
    expectClose(trace?.[0]?.delta ?? NaN, trace?.[0]?.scale ?? NaN, { rtol: 1e-15 });
  });

  it('refuses a senseless k, too few values and NaN', () => {
    for (const k of [0, -1]) expect(codeOf(() => huberProposal2(values, { k }))).toBe('out-of-domain');
    expect(codeOf(() => huberFactor(NaN))).toBe('not-finite');
    expect(codeOf(() => huberProposal2([1]))).toBe('too-few-values');
    expect(codeOf(() => huberProposal2([1, NaN]))).toBe('not-finite');
    expect(codeOf(() => huberProposal2([1, 2], { location: NaN }))).toBe('not-finite');
  });
});

describe('huberLocation', () => {
  it('makes the pulled values centre on it', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 99 }), { minLength: 1, maxLength: 40 }), (list) => {
        const { location, scale } = huberLocation(list, { scale: 3 });
        const pull = list.reduce((sum, x) => sum + Math.min(4.5, Math.max(-4.5, x - location)), 0);
        expect(scale).toBe(3);
        expectClose(pull, 0, { atol: 1e-10 * list.length });
      }),
    );
  });

  it('is the median with zero scale', () => {
    expect(huberLocation([1, 1, 1, 9])).toMatchObject({ location: 1, zeroScale: true });
    expect(huberLocation([4])).toMatchObject({ location: 4, zeroScale: true });
  });

  it('refuses a senseless k and a negative scale', () => {
    expect(codeOf(() => huberLocation([1, 2], { k: 0 }))).toBe('out-of-domain');
    expect(codeOf(() => huberLocation([1, 2], { scale: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => huberLocation([]))).toBe('too-few-values');
  });
});
