import { describe, expect, it } from 'vitest';
import {
  differencePower,
  equivalencePower,
  sampleSize,
  simulateLinePower,
  simulatePower,
  type SampleSizeGoal,
} from '@/lib/stats';
import { tFactor } from '@/lib/stats/method-comparison/internal/confidence';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { generatorOf, normalOf } from './random';

describe('sampleSize', () => {
  it('is the smallest number that is enough', () => {
    const n = sampleSize({ goal: 'bias-width', sd: 2, halfWidth: 0.5 });
    const width = (count: number) => (tFactor(0.95, count - 1) * 2) / Math.sqrt(count);
    expect(width(n)).toBeLessThanOrEqual(0.5);
    expect(width(n - 1)).toBeGreaterThan(0.5);
    const pairs = sampleSize({ goal: 'difference', sd: 1, difference: 0.5, power: 0.9 });
    expect(differencePower({ count: pairs, sd: 1, difference: 0.5 })).toBeGreaterThanOrEqual(0.9);
    expect(differencePower({ count: pairs - 1, sd: 1, difference: 0.5 })).toBeLessThan(0.9);
    const same = sampleSize({ goal: 'equivalence', sd: 1, margin: 0.5 });
    expect(equivalencePower({ count: same, sd: 1, margin: 0.5 })).toBeGreaterThanOrEqual(0.8);
    expect(equivalencePower({ count: same - 1, sd: 1, margin: 0.5 })).toBeLessThan(0.8);
  });

  it('grows as the wanted width shrinks', () => {
    const goals = (halfWidth: number): SampleSizeGoal[] => [
      { goal: 'limits-width', sd: 1, halfWidth },
      { goal: 'proportion-width', share: 0.9, halfWidth: halfWidth / 4 },
    ];
    goals(0.5).forEach((goal, i) =>
      expect(sampleSize(goal)).toBeLessThan(sampleSize(goals(0.2)[i] as SampleSizeGoal)),
    );
    // Published rule of thumb (Bland and Altman): 100 pairs give limits known to about 0.34 sd.
    expectClose(sampleSize({ goal: 'limits-width', sd: 1, halfWidth: 0.34 }), 100, { atol: 4 });
  });

  it.each([
    ['no-spread', () => sampleSize({ goal: 'bias-width', sd: 0, halfWidth: 1 })],
    ['out-of-domain', () => sampleSize({ goal: 'bias-width', sd: 1, halfWidth: -1 })],
    ['out-of-domain', () => sampleSize({ goal: 'bias-width', sd: 1, halfWidth: 1e-9 })],
    ['out-of-domain', () => sampleSize({ goal: 'equivalence', sd: 1, margin: 1, difference: 2 })],
    ['out-of-domain', () => sampleSize({ goal: 'difference', sd: 1, difference: 1, power: 1 })],
    ['too-few-values', () => differencePower({ count: 1, sd: 1, difference: 1 })],
    ['out-of-domain', () => simulatePower(() => true, { generator: generatorOf(1), runs: 1 })],
  ])('refuses with %s', (code, run) => {
    expect(codeOf(run)).toBe(code);
  });
});

describe('simulation', () => {
  it('agrees with the formula within its own interval', () => {
    const found = simulatePower(
      (generator) => {
        const draw = normalOf(generator);
        const d = Array.from({ length: 12 }, () => 0.8 + draw());
        const mean = d.reduce((sum, value) => sum + value, 0) / 12;
        const sd = Math.sqrt(d.reduce((sum, value) => sum + (value - mean) ** 2, 0) / 11);
        return Math.abs(mean) > (tFactor(0.95, 11) * sd) / Math.sqrt(12);
      },
      { generator: generatorOf(8), runs: 2_000, confidence: 0.999 },
    );
    const exact = differencePower({ count: 12, sd: 1, difference: 0.8 });
    expect(found.interval.lower).toBeLessThan(exact);
    expect(found.interval.upper).toBeGreaterThan(exact);
  });

  it('of a line finds little where there is nothing and much where there is a bias', () => {
    const levels = Array.from({ length: 40 }, (_, i) => 10 + 2 * i);
    const study = { levels, errorX: { sd: 1 }, errorY: { sd: 1 }, line: 'deming', target: 'slope' } as const;
    const options = { generator: generatorOf(2), runs: 300 };
    expect(simulateLinePower(study, options).power).toBeLessThan(0.12);
    expect(simulateLinePower({ ...study, slope: 1.05 }, options).power).toBeGreaterThan(0.9);
    const again = () => simulateLinePower({ ...study, slope: 1.02 }, { generator: generatorOf(4), runs: 50 });
    expect(again()).toEqual(again());
    const level = { ...study, line: 'passing-bablok', target: { level: 20 } } as const;
    expect(codeOf(() => simulateLinePower(level, options))).toBe('out-of-domain');
    expect(
      simulateLinePower({ ...study, intercept: 3, target: { level: 20 } }, options).power,
    ).toBeGreaterThan(0.9);
  });
});
