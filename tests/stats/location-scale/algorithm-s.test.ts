import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { algorithmS, algorithmSFactors } from '@/lib/stats';
import { expectClose } from '../expect-close';
import fixture from '../fixtures/bootstrap-r.json';
import { codeOf } from '../hostile';

describe('algorithmSFactors', () => {
  it('published, from memory: ISO 13528 Table C.1 for 1 to 10 degrees of freedom', () => {
    const eta = [1.645, 1.517, 1.444, 1.395, 1.359, 1.332, 1.31, 1.292, 1.277, 1.264];
    const xi = [1.097, 1.054, 1.039, 1.032, 1.027, 1.024, 1.021, 1.019, 1.018, 1.017];
    eta.forEach((expected, i) => {
      const found = algorithmSFactors({ degreesOfFreedom: i + 1 });
      // The table's xi differ from the formula by up to 1 in the last digit.
      expectClose(found.eta, expected, { atol: 0.00051 });
      expectClose(found.xi, xi[i] as number, { atol: 0.0011 });
      expect(found.toSd).toBe(1);
    });
  });

  it.each(fixture.ranges)(
    'computed with R: ranges of $rangeOf by ptukey and integrate',
    ({ rangeOf, eta, xi, toSd }) => {
      const found = algorithmSFactors({ rangeOf });
      expectClose(found.eta, eta, { rtol: 1e-7 }); // qtukey stops at about 1e-8
      expectClose(found.xi, xi, { rtol: 1e-8 });
      expectClose(found.toSd, toSd, { rtol: 1e-8 }); // and so does ptukey
    },
  );

  it('for ranges of two are those of 1 degree of freedom, and shrink to 1 for many', () => {
    const [range, single] = [algorithmSFactors({ rangeOf: 2 }), algorithmSFactors({ degreesOfFreedom: 1 })];
    expect(range).toEqual({ ...single, toSd: Math.SQRT2 });
    const many = algorithmSFactors({ degreesOfFreedom: 1e6 });
    expectClose(many.eta, 1, { atol: 0.001 });
    expectClose(many.xi, 1, { atol: 0.001 });
  });

  it('refuse what is no number of replicates or degrees of freedom', () => {
    for (const nu of [0, -1, NaN, Infinity]) {
      expect(codeOf(() => algorithmSFactors({ degreesOfFreedom: nu }))).toBe('out-of-domain');
    }
    for (const n of [1, 2.5, 1001])
      expect(codeOf(() => algorithmSFactors({ rangeOf: n }))).toBe('out-of-domain');
  });
});

describe('algorithmS', () => {
  const sds = fc.array(fc.integer({ min: 0, max: 500 }), { minLength: 2, maxLength: 60 });

  it('stands still at its result', () => {
    fc.assert(
      fc.property(sds, fc.constantFrom(1, 2, 3.5, 20), (values, degreesOfFreedom) => {
        const { pooled, eta, xi, zeroScale } = algorithmS(values, { degreesOfFreedom });
        if (zeroScale) return;
        const squares = values.reduce((sum, w) => sum + Math.min(w, eta * pooled) ** 2, 0);
        expectClose(xi * Math.sqrt(squares / values.length), pooled, { rtol: 1e-11 });
      }),
      { numRuns: 300 },
    );
  });

  it('does not depend on order or unit', () => {
    const values = [0.3, 0.4, 0.2, 2, 0.35, 0.1];
    const base = algorithmS(values, { degreesOfFreedom: 2 }).pooled;
    expect(algorithmS([...values].reverse(), { degreesOfFreedom: 2 }).pooled).toBe(base);
    for (const unit of [2 ** 900, 2 ** -900]) {
      expectClose(
        algorithmS(
          values.map((w) => w * unit),
          { degreesOfFreedom: 2 },
        ).pooled,
        base * unit,
        { rtol: 1e-12 },
      );
    }
  });

  it('is moved by a bounded amount by wild values', () => {
    const values = [0.3, 0.4, 0.2, 0.35, 0.1, 0.28, 0.33, 0.41, 0.25, 0.3];
    const base = algorithmS(values, { degreesOfFreedom: 1 }).pooled;
    for (const size of [10, 1e6, 1e300]) {
      expect(algorithmS([...values, size, size], { degreesOfFreedom: 1 }).pooled).toBeLessThan(2 * base);
    }
  });

  it('turns ranges into a standard deviation', () => {
    const { pooled, standardDeviation } = algorithmS([0.3, 0.4, 0.2, 0.5], { rangeOf: 2 });
    expectClose(standardDeviation, pooled / Math.SQRT2, { rtol: 1e-15 });
  });

  it('gives each step when asked', () => {
    const { trace, iterations, pooled, start, eta, xi } = algorithmS([0.3, 0.4, 0.2, 2], {
      degreesOfFreedom: 1,
      working: true,
    });
    expect(trace).toHaveLength(iterations);
    expect(trace?.[0]?.pooled).toBe(start);
    expect(trace?.at(-1)?.newPooled).toBe(pooled);
    for (const row of trace ?? []) {
      const squares = [0.3, 0.4, 0.2, 2].map((w) => Math.min(w, eta * row.pooled) ** 2);
      expectClose(row.newPooled, xi * Math.sqrt(squares.reduce((sum, x) => sum + x, 0) / 4), { rtol: 1e-12 });
      expectClose(row.limit, eta * row.pooled, { rtol: 1e-14 });
    }
  });

  it('says when there is no spread, and where it started', () => {
    expect(algorithmS([0, 0, 0], { degreesOfFreedom: 1 })).toMatchObject({
      pooled: 0,
      zeroScale: true,
      startFrom: 'all-zero',
    });
    const half = algorithmS([0, 0, 0, 1, 1], { degreesOfFreedom: 1 });
    expect(half.startFrom).toBe('root-mean-square');
    expect(half.pooled).toBeGreaterThan(0);
    expect(algorithmS([0, 0, 0, 0, 0, 0, 0, 1, 1], { degreesOfFreedom: 1 })).toMatchObject({
      pooled: 0,
      zeroScale: true,
    });
  });

  it('refuses negative, missing and infinite values', () => {
    expect(codeOf(() => algorithmS([1], { degreesOfFreedom: 1 }))).toBe('too-few-values');
    expect(codeOf(() => algorithmS([1, -1], { degreesOfFreedom: 1 }))).toBe('out-of-domain');
    expect(codeOf(() => algorithmS([1, NaN], { degreesOfFreedom: 1 }))).toBe('not-finite');
  });
});
