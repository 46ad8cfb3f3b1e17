import fc from 'fast-check';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { describe, expect, it } from 'vitest';
import {
  RUNS_RULES,
  cusumChart,
  ewmaChart,
  normalQuantile,
  shewhartChart,
  type RunsRuleId,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import { codeOf } from '../hostile';

const only = (rule: RunsRuleId, z: readonly number[]) =>
  shewhartChart(z, { rules: [rule] }).findings.map(({ at }) => at);

describe('the runs rules, one by one', () => {
  it.each<[RunsRuleId, number[], number[]]>([
    ['beyond-action', [2.99, 3, -3.4, 0], [1, 2]],
    ['two-beyond-warning', [2.1, 2.2, -2.1, 2.5, 2, 2.1], [1]],
    ['two-of-three-beyond-two', [2.1, 0, 2.2, -2.1, 0, -2.3, -1], [2, 5]],
    ['four-of-five-beyond-one', [1.1, 1.2, -1.5, 1.3, 1.4, 1.6, 0.2, 1.5], [4, 5, 7]],
    ['nine-on-one-side', [0.1, 1, 0.5, 0.2, 0.3, 0.9, 0.4, 0.1, 0.2, 0.1, 0, 1], [8, 9]],
    ['six-rising-or-falling', [1, 2, 3, 4, 5, 6, 5, 4, 3, 2, 1, 1], [5, 10]],
    ['fourteen-alternating', [0, 1, 0, 1, 0, 1, 0, 1, 0, 1, 0, 1, 0, 1, 1], [13]],
    ['fifteen-near-centre', [1.1, ...Array<number>(15).fill(0.9), -1], [15]],
    ['eight-beyond-one', [1.1, -1.2, 1.1, -1.2, 1.3, 1.4, -2, 1.1, 1], [7]],
  ])('%s', (rule, z, at) => {
    expect(only(rule, z)).toEqual(at);
    // The rule says the same of the mirrored chart.
    expect(
      only(
        rule,
        z.map((value) => -value),
      ),
    ).toEqual(at);
  });

  it('state a chance of false alarm that a long run of random z shows', () => {
    const generator = xoroshiro128plus(20261201);
    const uniform = () => ((generator.next() >>> 0) + 0.5) / 2 ** 32;
    const z = Array.from({ length: 60_000 }, () => normalQuantile(uniform()));
    const { findings } = shewhartChart(z);
    for (const { id, falseAlarm } of RUNS_RULES) {
      const share = findings.filter(({ rule }) => rule === id).length / z.length;
      // Findings follow one another, so their spread is wider than binomial.
      expectClose(share, falseAlarm, { atol: 12 * Math.sqrt(falseAlarm / z.length) });
    }
  });

  it('add up to the number expected by chance', () => {
    const calm = Array<number>(30).fill(0);
    expectClose(shewhartChart(calm, { rules: ['beyond-action'] }).expectedByChance, 30 * 0.0027, {
      rtol: 1e-12,
    });
    expect(shewhartChart([0.5], { rules: ['nine-on-one-side'] }).expectedByChance).toBe(0);
    expect(codeOf(() => shewhartChart(calm, { rules: ['no-such' as RunsRuleId] }))).toBe('out-of-domain');
  });
});

const scores = fc.array(
  fc.integer({ min: -40, max: 40 }).map((n) => n / 10),
  { minLength: 1, maxLength: 60 },
);

describe('cusumChart', () => {
  it('is the largest sum of a stretch that ends now', () => {
    fc.assert(
      fc.property(scores, (z) => {
        const { points } = cusumChart(z);
        points.forEach(({ high, low }, i) => {
          const ends = (sign: number) => {
            let [best, total] = [0, 0];
            for (let j = i; j >= 0; j -= 1) {
              total += sign * (z[j] as number) - 0.5;
              best = Math.max(best, total);
            }
            return best;
          };
          expectClose(high, ends(1), { atol: 1e-9 });
          expectClose(low, ends(-1), { atol: 1e-9 });
        });
      }),
    );
  });

  it('signals a shift, says where it began, and can start again', () => {
    const z = [0.2, -0.3, 0.1, 1.9, 2.1, 1.8, 2.2, 1.9];
    const found = cusumChart(z, { working: true });
    expect(found.firstSignal).toBe(6);
    expect(found.points[6]).toMatchObject({ signal: 'high', highRun: 4 });
    expect(expectRedone(found.working)).toBe(16);
    expect(cusumChart(z, { restart: true }).points[7]).toMatchObject({ signal: 'none', highRun: 1 });
    expect(cusumChart(z, { headStart: 2.5 }).points[0]?.high).toBeCloseTo(2.2, 12);
    expect(cusumChart(z.map((value) => -value)).points[6]?.signal).toBe('low');
    // A sum that stands on the limit is no signal.
    expect(cusumChart([5.5]).points[0]).toMatchObject({ high: 5, signal: 'none' });
  });

  it('refuses what it cannot use', () => {
    expect(codeOf(() => cusumChart([]))).toBe('too-few-values');
    expect(codeOf(() => cusumChart([1, NaN]))).toBe('not-finite');
    expect(codeOf(() => cusumChart([1], { decisionInterval: 0 }))).toBe('no-spread');
    expect(codeOf(() => cusumChart([1], { allowance: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => cusumChart([1.7e308, 1.7e308]))).toBe('out-of-domain');
  });
});

describe('ewmaChart', () => {
  it('weighs rounds by powers, and its limits are those of the weights', () => {
    fc.assert(
      fc.property(scores, fc.constantFrom(0.05, 0.2, 0.5, 1), (z, weight) => {
        const { points } = ewmaChart(z, { weight, target: 1, sigma: 2 });
        points.forEach(({ value, upper, lower }, i) => {
          let [average, squares] = [(1 - weight) ** (i + 1), 0];
          for (let j = 0; j <= i; j += 1) {
            const share = weight * (1 - weight) ** (i - j);
            average += share * (z[j] as number);
            squares += share * share;
          }
          expectClose(value, average, { atol: 1e-9 });
          expectClose(upper - 1, 3 * 2 * Math.sqrt(squares), { rtol: 1e-9 });
          expectClose(1 - lower, 3 * 2 * Math.sqrt(squares), { rtol: 1e-9 });
        });
      }),
    );
  });

  it('widens to its final limits and shows its working', () => {
    const found = ewmaChart([0.5, 0.7, 2, 2.5, 3, 3, 3, 3, 3, 3], { working: true });
    expect(found.firstSignal).not.toBeNull();
    expect(found.points[9]?.upper).toBeLessThan(found.finalUpper);
    expectClose(found.finalUpper, 1, { rtol: 1e-14 });
    expect(expectRedone(found.working)).toBe(20);
    expect(ewmaChart(Array<number>(200).fill(0)).points[199]?.upper).toBeCloseTo(1, 12);
  });

  it('refuses what it cannot use', () => {
    for (const weight of [0, -1, 1.1, NaN])
      expect(codeOf(() => ewmaChart([1], { weight }))).toBe('out-of-domain');
    expect(codeOf(() => ewmaChart([]))).toBe('too-few-values');
    expect(codeOf(() => ewmaChart([1], { sigma: 0 }))).toBe('no-spread');
    expect(codeOf(() => ewmaChart([Infinity]))).toBe('not-finite');
    expect(codeOf(() => ewmaChart([1], { sigma: 1e308, limitFactor: 1e10 }))).toBe('out-of-domain');
  });
});
