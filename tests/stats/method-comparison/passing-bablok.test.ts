import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { passingBablok } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { asDecimals, generatorOf, normalOf, orderFrom, shuffled, wholePairs } from './random';
import { slowPassingBablok } from './slow';

const Z95 = 1.959963984540054;

describe('passingBablok', () => {
  it('is the definition of the paper for every set up to 60 with many ties, as decimals', () => {
    fc.assert(
      fc.property(wholePairs(3), ({ x, y, decimals }) => {
        const slow = slowPassingBablok({ x, y }, Z95);
        const run = () => passingBablok(asDecimals(x, decimals), asDecimals(y, decimals));
        if (slow === null) {
          expect(codeOf(run)).toBe('no-spread');
          return;
        }
        const fast = run();
        expect(fast.slope + 0).toBe(slow.slope + 0);
        expect(fast.slopes).toBe(slow.slopes);
        expect(fast.shift).toBe(slow.shift);
        expect([fast.lowerRank, fast.upperRank]).toEqual([slow.lowerRank, slow.upperRank]);
        expect(fast.slopeInterval.lower + 0).toBe(slow.lower + 0);
        expect(fast.slopeInterval.upper + 0).toBe(slow.upper + 0);
        for (const value of [fast.intercept, fast.interceptInterval.lower, fast.interceptInterval.upper])
          expect(value).not.toBeNaN();
      }),
      { numRuns: 800 },
    );
  });

  it('leaves slopes of -1 out although 0.4 - 0.1 is not 0.3 in binary', () => {
    const x = [0.1, 0.4, 0.7, 0.9];
    const y = [0.7, 0.4, 0.1, 0.95];
    const line = passingBablok(x, y);
    // (0.1, 0.7), (0.4, 0.4), (0.7, 0.1) lie on a line of slope -1: three of the six slopes.
    expect(line.excludedPairs).toBe(3);
    expect(line.slopes).toBe(3);
  });

  it('leaves them out for means of two readings too, which are not decimals in their last place', () => {
    const x = [(0.1 + 0.2) / 2 + 1 / 3, (0.3 + 0.4) / 2 + 1 / 3, 1 / 3, 2.7];
    const y = [2 / 3 - 0.15, 2 / 3 - 0.35, 2 / 3, 2.9];
    expect(passingBablok(x, y).excludedPairs).toBe(3);
  });

  it('turns round when the methods are exchanged', () => {
    fc.assert(
      fc.property(wholePairs(4, 30), ({ x, y }) => {
        const there = slowPassingBablok({ x, y }, Z95);
        const back = slowPassingBablok({ x: y, y: x }, Z95);
        if (there === null || back === null || there.slopes % 2 === 0 || there.slope === 0) return;
        expectClose(passingBablok(y, x).slope, 1 / passingBablok(x, y).slope, { rtol: 1e-14 });
      }),
    );
  });

  it('does not depend on the order of the pairs, moves with the data and keeps to their unit', () => {
    const next = generatorOf(7);
    const noise = normalOf(next);
    const x = Array.from({ length: 41 }, () => Math.round(1000 * next()) / 10);
    const y = x.map((value) => Math.round(10 * (3 + 1.1 * value + noise())) / 10);
    const line = passingBablok(x, y);
    const order = orderFrom(3, x.length);
    const again = passingBablok(shuffled(x, order), shuffled(y, order));
    expect({ ...again, cusum: line.cusum, shift: line.shift }).toEqual(line);
    const moved = passingBablok(
      x.map((value) => value + 5),
      y.map((value) => value - 2),
    );
    expectClose(moved.slope, line.slope, { rtol: 1e-12 });
    expectClose(moved.intercept, line.intercept - 2 - 5 * line.slope, { rtol: 1e-10 });
    const scaled = passingBablok(
      x.map((value) => value * 1000),
      y.map((value) => value * 1000),
    );
    expectClose(scaled.slope, line.slope, { rtol: 1e-12 });
    expectClose(scaled.interceptInterval.lower, line.interceptInterval.lower * 1000, { rtol: 1e-10 });
  });

  it('bears a fifth of wild points', () => {
    const x = Array.from({ length: 50 }, (_, i) => i + 1);
    const y = x.map((value, i) => (i % 5 === 0 ? 1e6 : value));
    expectClose(passingBablok(x, y).slope, 1, { atol: 0.1 });
  });

  it('says when few points give no limits', () => {
    const line = passingBablok([1, 2, 3], [1, 2, 3.1]);
    expect(line.slopeInterval).toEqual({ lower: -Infinity, upper: Infinity });
    expect(line.interceptInterval).toEqual({ lower: -Infinity, upper: Infinity });
  });

  it('sees a bend by its cusum, and none in a straight line', () => {
    const x = Array.from({ length: 60 }, (_, i) => i / 10);
    const bent = passingBablok(
      x,
      x.map((value) => value * value),
    );
    expect(bent.cusum.statistic).toBeGreaterThan(1.63);
    expect(bent.cusum.probability).toBeLessThan(0.01);
    const straight = passingBablok(
      x,
      x.map((value, i) => value + (i % 2 === 0 ? 0.1 : -0.1)),
    );
    expect(straight.cusum.statistic).toBeLessThan(1.36);
    expect(passingBablok(x, x).cusum).toMatchObject({ on: 60, statistic: null, probability: null });
  });

  it('has the limiting probabilities of Kolmogorov (published: 5 % at 1.358, 1 % at 1.628)', () => {
    const x = [1, 2, 3, 4, 5, 6];
    const line = passingBablok(x, [1.1, 1.9, 3.2, 3.9, 5.1, 5.8]);
    const h = line.cusum.statistic ?? NaN;
    let sum = 0;
    for (let k = 1; k < 200; k += 1) sum += (k % 2 === 1 ? 2 : -2) * Math.exp(-2 * k * k * h * h);
    expectClose(line.cusum.probability ?? NaN, sum, { atol: 1e-6 });
  });

  it.each([
    ['too-few-values', () => passingBablok([1, 2], [1, 2])],
    ['unequal-lengths', () => passingBablok([1, 2, 3], [1, 2])],
    ['not-finite', () => passingBablok([1, 2, NaN], [1, 2, 3])],
    ['no-spread', () => passingBablok([1, 1, 1], [1, 2, 3])],
    ['no-spread', () => passingBablok([1, 2, 3], [3, 2, 1])],
    ['out-of-domain', () => passingBablok([1, 2, 3], [1, 2, 3], { confidence: 1 })],
    ['out-of-domain', () => passingBablok([0, 1e-300, 2e-300], [0, 1e300, 3e300])],
  ])('refuses with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });

  it('works at the ends of the number range', () => {
    expect(passingBablok([0, 1e300, 1.7e308, -1.7e308], [0, 1e300, 1.7e308, -1.7e308]).slope).toBe(1);
    expect(passingBablok([0, 5e-324, 1e-323], [0, 5e-324, 1e-323]).slope).toBe(1);
    expect(passingBablok([-0, 1, 2], [0, 1, 2]).intercept).toBe(0);
  });
});

describe('passingBablok, equivariant', () => {
  const equivariant = (x: number[], y: number[]) => passingBablok(x, y, { variant: 'equivariant' });

  it('follows the unit of either method', () => {
    fc.assert(
      fc.property(wholePairs(6, 30), ({ x, y }) => {
        const run = () => equivariant(x, y);
        let line;
        try {
          line = run();
        } catch {
          expect(codeOf(run)).toBe('no-spread');
          return;
        }
        const scaled = equivariant(
          x,
          y.map((value) => value * 8),
        );
        expectClose(scaled.slope, 8 * line.slope, { rtol: 1e-13 });
        if (Number.isFinite(line.slopeInterval.lower))
          expectClose(scaled.slopeInterval.lower, 8 * line.slopeInterval.lower, { rtol: 1e-13 });
        const flipped = equivariant(
          x,
          y.map((value) => -value),
        );
        // With as many rising as falling pairs the sign is that of the rising ones in both.
        expectClose(Math.abs(flipped.slope), Math.abs(line.slope), { rtol: 1e-13 });
      }),
    );
  });

  it('is the median of the sizes, with the sign of the relation, and its limits enclose it', () => {
    const next = generatorOf(5);
    const noise = normalOf(next);
    const x = Array.from({ length: 40 }, () => 100 * next());
    for (const slope of [0.02, 1, 30, -4]) {
      const y = x.map((value) => slope * (value + noise()));
      const line = equivariant(x, y);
      expectClose(line.slope, slope, { rtol: 0.05 });
      expect(line.slopeInterval.lower).toBeLessThan(line.slope);
      expect(line.slopeInterval.upper).toBeGreaterThan(line.slope);
      const mirror = equivariant(
        x,
        y.map((value) => -value),
      );
      expectClose(mirror.slope, -line.slope, { rtol: 1e-14 });
      expectClose(mirror.slopeInterval.lower, -line.slopeInterval.upper, { rtol: 1e-14 });
      expectClose(mirror.slopeInterval.upper, -line.slopeInterval.lower, { rtol: 1e-14 });
    }
  });
});
