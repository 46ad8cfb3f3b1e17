import { scaleLinear, scalePoint } from '@visx/scale';
import { px, type ChartSize } from './chart-size';
import type { AssignedValue, ResultPoint } from './chart-types';
import { resultDomain, sigmaLines } from './distribution-geometry';
import { clampSide, type Clamped } from './score-scale';

export type RoundBar = { point: ResultPoint; x: number; y: number; clamped: Clamped };

const MARGIN = { left: 58, right: 52, top: 26, bottom: 34 };

export function roundBarsGeometry(
  input: { results: readonly ResultPoint[]; assigned: AssignedValue },
  { width, height }: ChartSize,
) {
  const { assigned } = input;
  const results = [...input.results].sort((a, b) => a.value - b.value || a.code.localeCompare(b.code, 'en'));
  const [low, high] = resultDomain(
    results.map((result) => result.value),
    assigned,
  );
  const bottom = height - MARGIN.bottom;
  const y = scaleLinear<number>({ domain: [low, high], range: [bottom, MARGIN.top] });
  const x = scalePoint<number>({
    domain: results.map((_, index) => index),
    range: [MARGIN.left, width - MARGIN.right],
    padding: 0.6,
  });
  const bars = results.map((point, index): RoundBar => ({
    point,
    x: px(x(index) ?? 0),
    y: px(y(Math.max(low, Math.min(high, point.value)))),
    clamped: clampSide(point.value, low, high),
  }));
  return {
    y,
    bars,
    left: MARGIN.left,
    right: width - MARGIN.right,
    bottom,
    assignedY: px(y(assigned.value)),
    markSize: px(Math.max(3, Math.min(9, x.step() * 0.7))),
    lines: sigmaLines(assigned).map((line) => ({ ...line, y: px(y(line.value)) })),
  };
}
