import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { tickDecimals } from '@/components/charts/axes';
import { densityCurve } from '@/components/charts/density-curve';
import { nextMark } from '@/components/charts/next-mark';
import { clampSide, scoreExtent, thresholdsOf } from '@/components/charts/score-scale';
import { spreadLabels } from '@/components/charts/spread-labels';
import { fitStack, stackMarks } from '@/components/charts/stack-marks';
import { thinLabels } from '@/components/charts/thin-labels';

const positions = fc
  .array(fc.double({ min: 0, max: 800, noNaN: true }), { minLength: 1, maxLength: 60 })
  .map((values) => values.sort((a, b) => a - b));

describe('thinLabels', () => {
  it('keeps the chosen labels apart and never drops one that had room', () => {
    fc.assert(
      fc.property(positions, (places) => {
        const flags = thinLabels(
          places.map((at) => ({ at, rank: 1 })),
          12,
        );
        const kept = places.filter((_, index) => flags[index]);
        kept.slice(1).forEach((at, index) => expect(at - (kept[index] ?? 0)).toBeGreaterThanOrEqual(12));
        places.forEach((at) =>
          expect(kept.some((other) => Math.abs(other - at) < 12 || other === at)).toBe(true),
        );
      }),
    );
  });

  it('prefers the lower rank over the earlier place', () => {
    const wishes = [
      { at: 0, rank: 3 },
      { at: 5, rank: 0 },
      { at: 20, rank: 3 },
    ];
    expect(thinLabels(wishes, 12)).toEqual([false, true, true]);
  });
});

describe('spreadLabels', () => {
  it('keeps order, distance and ends', () => {
    fc.assert(
      fc.property(positions, (places) => {
        const moved = spreadLabels(places, 10, [0, 800]);
        expect(moved).toHaveLength(places.length);
        moved.slice(1).forEach((at, index) => expect(at - (moved[index] ?? 0)).toBeGreaterThan(10 - 1e-6));
        expect(Math.min(...moved)).toBeGreaterThanOrEqual(-1e-6);
        expect(Math.max(...moved)).toBeLessThanOrEqual(800 + 1e-6);
      }),
    );
  });

  it('leaves labels alone that are far enough apart', () => {
    expect(spreadLabels([10, 50, 90], 12, [0, 100])).toEqual([10, 50, 90]);
    expect(spreadLabels([], 12, [0, 100])).toEqual([]);
  });

  it('spaces them evenly when they do not all fit', () => {
    expect(spreadLabels([98, 99, 100], 60, [0, 100])).toEqual([0, 50, 100]);
  });
});

describe('stackMarks', () => {
  it('never lets two marks of one level overlap', () => {
    fc.assert(
      fc.property(positions, (places) => {
        const levels = stackMarks(places, 8);
        places.forEach((a, i) =>
          places.forEach((b, j) => {
            if (i < j && levels[i] === levels[j]) expect(b - a).toBeGreaterThanOrEqual(8);
          }),
        );
      }),
    );
  });

  it('piles equal results on one another', () => {
    expect(stackMarks([5, 5, 5, 40], 8)).toEqual([0, 1, 2, 0]);
  });

  it('shrinks the marks until the pile fits, down to the least size', () => {
    expect(fitStack([5, 5, 5], 30, [10, 2])).toBe(10);
    expect(fitStack([5, 5, 5], 18, [10, 2])).toBe(6);
    expect(fitStack(Array(100).fill(5), 20, [10, 2])).toBe(2);
  });
});

describe('densityCurve', () => {
  it('covers an area of one', () => {
    const curve = densityCurve([9, 10, 10.5, 12], { from: 0, to: 22, bandwidth: 0.7, steps: 2000 });
    const area = curve.reduce((sum, point) => sum + point.y * (22 / 2000), 0);
    expect(area).toBeCloseTo(1, 6);
  });

  it('peaks at the one value it has, with the height of the normal density', () => {
    const curve = densityCurve([5], { from: 0, to: 10, bandwidth: 2, steps: 10 });
    const top = curve.reduce((best, point) => (point.y > best.y ? point : best));
    expect(top.x).toBe(5);
    expect(top.y).toBeCloseTo(1 / (2 * Math.sqrt(2 * Math.PI)), 12);
  });

  it('draws nothing without values, width or room', () => {
    expect(densityCurve([], { from: 0, to: 1, bandwidth: 1 })).toEqual([]);
    expect(densityCurve([1], { from: 0, to: 1, bandwidth: 0 })).toEqual([]);
    expect(densityCurve([1], { from: 1, to: 1, bandwidth: 1 })).toEqual([]);
  });
});

describe('score scale', () => {
  it('always shows the action lines and never passes the edge', () => {
    expect(scoreExtent([])).toBe(3.5);
    expect(scoreExtent([0.2, -1])).toBe(3.5);
    expect(scoreExtent([-3.7])).toBe(4);
    expect(scoreExtent([12, -40])).toBe(5);
  });

  it('labels the lines of z at 2 and 3 and of E_n at 1', () => {
    expect(thresholdsOf('z').map((line) => [line.at, line.label, line.strength])).toEqual([
      [2, '+2', 'warning'],
      [-2, '\u22122', 'warning'],
      [3, '+3', 'action'],
      [-3, '\u22123', 'action'],
    ]);
    expect(thresholdsOf('e-n').map((line) => line.at)).toEqual([1, -1]);
  });

  it('tells on which side a value leaves the drawing', () => {
    expect([clampSide(5, -5, 5), clampSide(5.01, -5, 5), clampSide(-6, -5, 5)]).toEqual([0, 1, -1]);
  });

  it('gives ticks the decimals that tell them apart', () => {
    expect([
      tickDecimals([0, 2, 4]),
      tickDecimals([0, 0.5]),
      tickDecimals([1, 1.05]),
      tickDecimals([3]),
    ]).toEqual([0, 1, 2, 0]);
  });
});

describe('nextMark', () => {
  it('moves by arrows and stops at the ends', () => {
    expect(nextMark('ArrowRight', 0, 3)).toBe(1);
    expect(nextMark('ArrowRight', 2, 3)).toBe(2);
    expect(nextMark('ArrowLeft', 0, 3)).toBe(0);
    expect(nextMark('Home', 2, 3)).toBe(0);
    expect(nextMark('End', 0, 3)).toBe(2);
  });

  it('leaves other keys and other elements alone', () => {
    expect(nextMark('Tab', 1, 3)).toBe(-1);
    expect(nextMark('ArrowRight', -1, 3)).toBe(-1);
  });
});
