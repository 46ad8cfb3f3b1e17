import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { censoredLikelihood, mean, normalLogCdf, sd } from '@/lib/stats';
import { expectClose } from '../expect-close';
import fixture from '../fixtures/bootstrap-r.json';
import { codeOf } from '../hostile';

interface Case {
  readonly values: readonly number[];
  readonly lessThan: readonly number[];
  readonly greaterThan: readonly number[];
}

function logLikelihood({ values, lessThan, greaterThan }: Case, m: number, s: number): number {
  const density = (x: number) => -(((x - m) / s) ** 2) / 2 - Math.log(s) - Math.log(2 * Math.PI) / 2;
  return (
    values.reduce((sum, x) => sum + density(x), 0) +
    lessThan.reduce((sum, x) => sum + normalLogCdf((x - m) / s), 0) +
    greaterThan.reduce((sum, x) => sum + normalLogCdf((m - x) / s), 0)
  );
}

const cases = fc.record({
  values: fc
    .array(fc.integer({ min: 0, max: 200 }), { minLength: 2, maxLength: 30 })
    .filter((list) => new Set(list).size > 1),
  lessThan: fc.array(fc.integer({ min: -100, max: 300 }), { maxLength: 20 }),
  greaterThan: fc.array(fc.integer({ min: -100, max: 300 }), { maxLength: 20 }),
});

describe('censoredLikelihood', () => {
  it.each(fixture.censored.map((entry, i) => [i + 1, entry] as const))(
    'computed with R, nlminb: case %i',
    (_, expected) => {
      const found = censoredLikelihood(expected);
      // A minimiser finds the place to half the digits of the height.
      expectClose(found.location, expected.location, { rtol: 1e-6 });
      expectClose(found.scale, expected.scale, { rtol: 1e-6 });
      expectClose(found.logLikelihood, expected.logLikelihood, { rtol: 1e-10 });
      expectClose(found.locationStandardError, expected.locationStandardError, { rtol: 1e-4 });
      expectClose(found.scaleStandardError, expected.scaleStandardError, { rtol: 1e-4 });
    },
  );

  it('stands at the top of the likelihood', () => {
    fc.assert(
      fc.property(cases, (input) => {
        const { location, scale, logLikelihood: top } = censoredLikelihood(input);
        expectClose(logLikelihood(input, location, scale), top, { rtol: 1e-10, atol: 1e-10 });
        for (const [dm, ds] of [
          [1e-3, 0],
          [-1e-3, 0],
          [0, 1e-3],
          [0, -1e-3],
        ] as const) {
          const near = logLikelihood(input, location + dm * scale, scale * (1 + ds));
          expect(near).toBeLessThanOrEqual(top + 1e-9 * (1 + Math.abs(top)));
        }
      }),
      { numRuns: 300 },
    );
  });

  it('without censored results is the mean and the standard deviation with divisor n', () => {
    const values = [3, 1, 4, 1, 5, 9];
    const found = censoredLikelihood({ values });
    expectClose(found.location, mean(values), { rtol: 1e-13 });
    expectClose(found.scale, sd(values) * Math.sqrt(5 / 6), { rtol: 1e-13 });
    expectClose(found.locationStandardError, found.scale / Math.sqrt(6), { rtol: 1e-12 });
    expect(found.statement).toBe('No censored results.');
  });

  it('comes out lower when results below a limit are taken in, and mirrors for those above', () => {
    const low = censoredLikelihood({ values: [1, 2, 3], lessThan: [1, 1] });
    const high = censoredLikelihood({ values: [-1, -2, -3], greaterThan: [-1, -1] });
    expect(low.location).toBeLessThan(2);
    expectClose(high.location, -low.location, { rtol: 1e-12 });
    expectClose(high.scale, low.scale, { rtol: 1e-12 });
    expect(low).toMatchObject({ numeric: 3, censoredLow: 2, censoredHigh: 0 });
    expect(low.statement).toContain('2 censored of 5');
  });

  it('is not moved by limits that say nothing, nor by the unit', () => {
    const input = { values: [1, 2, 3, 7], lessThan: [1.5], greaterThan: [6] };
    const base = censoredLikelihood(input);
    expectClose(censoredLikelihood({ ...input, lessThan: [1.5, 1e6, 1e12] }).location, base.location, {
      rtol: 1e-12,
    });
    const unit = 2 ** -300;
    const scaled = censoredLikelihood({
      values: input.values.map((x) => x * unit),
      lessThan: [1.5 * unit],
      greaterThan: [6 * unit],
    });
    expectClose(scaled.location / unit, base.location, { rtol: 1e-12 });
  });

  it('stands limits that contradict the results', () => {
    for (const limit of [-10, -1e6, -1e50]) {
      const found = censoredLikelihood({ values: [0, 1, 0.5], lessThan: [limit] });
      expect(found.location).toBeLessThan(0);
      expect(found.scale).toBeGreaterThan(-limit / 2);
    }
  });

  it('refuses results that do not vary, too few and NaN', () => {
    expect(codeOf(() => censoredLikelihood({ values: [1], lessThan: [2] }))).toBe('too-few-values');
    expect(codeOf(() => censoredLikelihood({ values: [2, 2], lessThan: [1] }))).toBe('no-spread');
    expect(codeOf(() => censoredLikelihood({ values: [1, 2], lessThan: [NaN] }))).toBe('not-finite');
    expect(codeOf(() => censoredLikelihood({ values: [0, 5e-324], greaterThan: [1e308] }))).toBe('no-spread');
    expect(codeOf(() => censoredLikelihood({ values: [0, 1e-300], greaterThan: [1e308] }))).toBe(
      'out-of-domain',
    );
  });
});
