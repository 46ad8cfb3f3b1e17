import { scaleLinear, scalePoint } from '@visx/scale';
import { px, type ChartSize } from './chart-size';
import type { AssignedValue, ResultPoint } from './chart-types';
import { resultDomain, sigmaLines } from './distribution-geometry';
import { clampSide, type Clamped } from './score-scale';
import { placeEdgeValues } from './spread-labels';

export type RoundBar = { point: ResultPoint; x: number; y: number; clamped: Clamped; valueX: number };

const MARGIN = { left: 58, right: 52, top: 30, bottom: 24 };
const VALUE_ROOM = 34;
const LABEL_GAP = 14;

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
  const sides = results.map((result) => clampSide(result.value, low, high));
  const top = MARGIN.top + (sides.includes(1) ? VALUE_ROOM : 0);
  const bottom = height - MARGIN.bottom - (sides.includes(-1) ? VALUE_ROOM : 0);
  const y = scaleLinear<number>({ domain: [low, high], range: [bottom, top] });
  const x = scalePoint<number>({
    domain: results.map((_, index) => index),
    range: [MARGIN.left, width - MARGIN.right],
    padding: 0.6,
  });
  const bars = results.map((point, index): RoundBar => ({
    point,
    x: px(x(index) ?? 0),
    y: px(y(Math.max(low, Math.min(high, point.value)))),
    clamped: sides[index] ?? 0,
    valueX: px(x(index) ?? 0),
  }));
  placeEdgeValues(bars, (bar) => bar.x, LABEL_GAP, [MARGIN.left + 4, width - MARGIN.right]);
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
