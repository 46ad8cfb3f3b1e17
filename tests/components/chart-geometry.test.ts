import { describe, expect, it } from 'vitest';
import { NARROW, WIDE } from '@/components/charts/chart-size';
import type { ResultPoint, ScorePoint, TrendPoint } from '@/components/charts/chart-types';
import {
  distributionGeometry,
  resultDomain,
  usualBandwidth,
} from '@/components/charts/distribution-geometry';
import { orderedScoresGeometry, orderScores } from '@/components/charts/ordered-scores-geometry';
import { roundBarsGeometry } from '@/components/charts/round-bars-geometry';
import { trendGeometry } from '@/components/charts/trend-geometry';

function signalFor(score: number): ScorePoint['signal'] {
  const size = Math.abs(score);
  if (size <= 2) return 'none';
  return size < 3 ? 'warning' : 'action';
}

function scorePoints(scores: (number | null)[], ownAt = -1): ScorePoint[] {
  return scores.map((score, index) => ({
    code: `L${index + 1}`,
    score,
    signal: score === null ? 'not-scored' : signalFor(score),
    own: index === ownAt,
  }));
}

const assigned = { value: 10, sigmaPt: 1 };
const results = (values: number[]): ResultPoint[] =>
  values.map((value, index) => ({ code: `L${index + 1}`, value }));

describe('orderedScoresGeometry', () => {
  it('orders by score, equal scores by code as people count', () => {
    const points: ScorePoint[] = [
      { code: 'L10', score: 1, signal: 'none' },
      { code: 'L2', score: 1, signal: 'none' },
      { code: 'L3', score: -1, signal: 'none' },
    ];
    expect(orderScores(points).map((point) => point.code)).toEqual(['L3', 'L2', 'L10']);
  });

  it('leaves out what is not scored and counts it', () => {
    const geometry = orderedScoresGeometry(scorePoints([1, null, -1, null]), WIDE);
    expect(geometry.bars).toHaveLength(2);
    expect(geometry.missing).toBe(2);
  });

  it('draws bars up and down from zero, in proportion', () => {
    const { bars, zero } = orderedScoresGeometry(scorePoints([-2, 1]), WIDE);
    const [low, high] = bars;
    expect(low?.tip).toBeGreaterThan(zero);
    expect(high?.tip).toBeLessThan(zero);
    expect((low?.height ?? 0) / (high?.height ?? 1)).toBeCloseTo(2, 1);
  });

  it('draws a score of zero as a hairline, not as nothing', () => {
    expect(orderedScoresGeometry(scorePoints([0]), WIDE).bars[0]?.height).toBe(1);
  });

  it('stops at the edge and says so', () => {
    const { bars, y } = orderedScoresGeometry(scorePoints([12, 5, -7]), WIDE);
    expect(bars.map((bar) => bar.clamped)).toEqual([-1, 0, 1]);
    expect(bars.map((bar) => bar.tip)).toEqual([y(-5), y(5), y(5)].map((at) => Math.round(at * 10) / 10));
  });

  it.each([WIDE, NARROW])('keeps 300 laboratories inside %o and their labels apart', (size) => {
    const scores = Array.from({ length: 300 }, (_, index) => (index - 150) / 40);
    const { bars, left, right } = orderedScoresGeometry(scorePoints(scores, 150), size);
    expect(Math.min(...bars.map((bar) => bar.x))).toBeGreaterThanOrEqual(left);
    expect(Math.max(...bars.map((bar) => bar.x + bar.width))).toBeLessThanOrEqual(right);
    const labelled = bars.filter((bar) => bar.showsCode);
    labelled.slice(1).forEach((bar, index) => {
      expect(bar.middle - (labelled[index]?.middle ?? 0)).toBeGreaterThanOrEqual(13.8);
    });
    expect(labelled.some((bar) => bar.point.own)).toBe(true);
    expect(bars.find((bar) => bar.point.own)?.width).toBeGreaterThanOrEqual(6);
  });

  it('writes the values beyond the edge side by side', () => {
    const scores = [...Array.from({ length: 100 }, (_, index) => index / 100), 6, 7, 8, 9];
    const beyond = orderedScoresGeometry(scorePoints(scores), NARROW).bars.filter((bar) => bar.clamped === 1);
    expect(beyond).toHaveLength(4);
    beyond.slice(1).forEach((bar, index) => {
      expect(bar.valueX - (beyond[index]?.valueX ?? 0)).toBeGreaterThanOrEqual(13.8);
    });
  });

  it('draws an empty round without failing', () => {
    expect(orderedScoresGeometry([], WIDE).bars).toEqual([]);
  });
});

describe('distributionGeometry', () => {
  it('shows the lines at 3 sigma_pt even when all results agree', () => {
    expect(resultDomain([10, 10, 10], assigned)).toEqual([6.4, 13.6]);
  });

  it('stops at 5 sigma_pt and puts what lies beyond at the edge, the farthest first', () => {
    const geometry = distributionGeometry({ results: results([10, 40, 30, -5]), assigned }, WIDE);
    expect(geometry.x.domain()).toEqual([5, 15]);
    const beyond = geometry.marks.filter((mark) => mark.clamped !== 0);
    expect(beyond.map((mark) => [mark.point.value, mark.clamped])).toEqual([
      [-5, -1],
      [40, 1],
      [30, 1],
    ]);
    expect(beyond[1]?.y).toBeLessThan(beyond[2]?.y ?? 0);
  });

  it('places lines at x_pt and at 2 and 3 sigma_pt', () => {
    const geometry = distributionGeometry({ results: results([9, 11]), assigned }, WIDE);
    expect(geometry.lines.map((line) => line.value)).toEqual([7, 8, 10, 12, 13]);
    for (const line of geometry.lines) expect(line.x).toBeCloseTo(geometry.x(line.value), 0);
  });

  it('keeps 300 marks between the base line and the axis', () => {
    const values = Array.from({ length: 300 }, (_, index) => 10 + ((index * 37) % 100) / 40 - 1.25);
    for (const size of [WIDE, NARROW]) {
      const { marks, baseline, axisTop } = distributionGeometry({ results: results(values), assigned }, size);
      expect(Math.min(...marks.map((mark) => mark.y))).toBeGreaterThan(baseline);
      expect(Math.max(...marks.map((mark) => mark.y))).toBeLessThan(axisTop);
    }
  });

  it('keeps the curve under the labels and on the base line', () => {
    const { curve, baseline, top } = distributionGeometry(
      { results: results([8, 9, 10, 10.2, 13]), assigned },
      WIDE,
    );
    expect(Math.min(...curve.map((point) => point.y))).toBeGreaterThan(top);
    expect(Math.max(...curve.map((point) => point.y))).toBeLessThanOrEqual(baseline);
  });

  it('takes a density from the caller, and its own bandwidth otherwise', () => {
    const density = [
      { x: 9, y: 0 },
      { x: 10, y: 2 },
    ];
    expect(distributionGeometry({ results: results([10]), assigned, density }, WIDE).curve).toHaveLength(2);
    expect(usualBandwidth(2)).toBe(1.5);
    expect(distributionGeometry({ results: [], assigned }, WIDE).curve).toEqual([]);
  });
});

describe('trendGeometry', () => {
  const rounds = (scores: (number | null)[]): TrendPoint[] =>
    scorePoints(scores).map(({ code, score, signal }) => ({ key: code, label: code, score, signal }));

  it('breaks the line at a round without a score', () => {
    const { runs, marks, missing } = trendGeometry(rounds([1, 2, null, 0, 1, null, 2]), WIDE);
    expect(runs.map((run) => run.map((mark) => mark.point.key))).toEqual([
      ['L1', 'L2'],
      ['L4', 'L5'],
    ]);
    expect(marks).toHaveLength(5);
    expect(missing).toBe(2);
  });

  it('always labels the newest round', () => {
    const { labels } = trendGeometry(rounds(Array.from({ length: 40 }, () => 0.5)), NARROW);
    expect(labels.at(-1)?.shown).toBe(true);
    expect(labels.filter((label) => label.shown).length).toBeLessThan(8);
  });

  it('draws a score beyond the edge at the edge', () => {
    const { marks, y } = trendGeometry(rounds([-9]), WIDE);
    expect(marks[0]?.clamped).toBe(-1);
    expect(marks[0]?.y).toBeCloseTo(y(-5), 1);
  });
});

describe('roundBarsGeometry', () => {
  it('orders the results and clamps those beyond 5 sigma_pt', () => {
    const { bars, y } = roundBarsGeometry({ results: results([11, 99, 9, 10]), assigned }, WIDE);
    expect(bars.map((bar) => bar.point.value)).toEqual([9, 10, 11, 99]);
    expect(bars.map((bar) => bar.clamped)).toEqual([0, 0, 0, 1]);
    expect(bars[3]?.y).toBeCloseTo(y(15), 1);
  });

  it('draws the assigned value where it belongs', () => {
    const { assignedY, y, lines } = roundBarsGeometry({ results: results([10]), assigned }, WIDE);
    expect(assignedY).toBeCloseTo(y(10), 1);
    expect(lines.find((line) => line.multiple === 0)?.y).toBe(assignedY);
  });
});
