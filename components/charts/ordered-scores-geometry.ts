import { scaleBand } from '@visx/scale';
import { px, type ChartSize } from './chart-size';
import type { ScorePoint } from './chart-types';
import { clampSide, scoreExtent, scoreScale, type Clamped } from './score-scale';
import { placeEdgeValues } from './spread-labels';
import { thinLabels } from './thin-labels';

export type ScoreBar = {
  point: ScorePoint & { score: number };
  x: number;
  width: number;
  y: number;
  height: number;
  middle: number;
  tip: number;
  valueX: number;
  clamped: Clamped;
  showsCode: boolean;
};

const MARGIN = { left: 40, right: 44, axis: 10 };
const VALUE_ROOM = 54;
const LABEL_GAP = 14;
// Wide enough for the plain sans serif that a saved picture may have to fall back on.
const LETTER = 8.6;

export function hasScore(point: ScorePoint): point is ScorePoint & { score: number } {
  return point.score !== null && point.signal !== 'not-scored';
}

export function orderScores(points: readonly ScorePoint[]): (ScorePoint & { score: number })[] {
  return points
    .filter(hasScore)
    .sort((a, b) => a.score - b.score || a.code.localeCompare(b.code, 'en', { numeric: true }));
}

export function orderedScoresGeometry(points: readonly ScorePoint[], { width, height }: ChartSize) {
  const ordered = orderScores(points);
  const extent = scoreExtent(ordered.map((point) => point.score));
  const top = MARGIN.axis + (ordered.some((point) => point.score > extent) ? VALUE_ROOM : 10);
  const codeRoom = 10 + LETTER * Math.max(3, ...ordered.map((point) => codeLabel(point).length));
  const bottom = height - codeRoom - (ordered.some((point) => point.score < -extent) ? VALUE_ROOM : 10);
  const y = scoreScale(extent, top, bottom);
  const x = scaleBand<number>({
    domain: ordered.map((_, index) => index),
    range: [MARGIN.left, width - MARGIN.right],
    paddingInner: 0.35,
    paddingOuter: 0.3,
  });
  // Few bars would be as wide as a door; a bar is never wider than this.
  const barWidth = Math.min(x.bandwidth(), 22);
  const shown = thinLabels(
    ordered.map((point, index) => ({ at: middleOf(x, index), rank: labelRank(point) })),
    LABEL_GAP,
  );
  const bars = ordered.map((point, index): ScoreBar => {
    const middle = middleOf(x, index);
    const clamped = clampSide(point.score, -extent, extent);
    // Among hundreds of bars one's own would be too thin to show its colour.
    const ownWidth = point.own ? Math.max(barWidth, 6) : barWidth;
    const tip = y(Math.max(-extent, Math.min(extent, point.score)));
    const zero = y(0);
    return {
      point,
      x: px(middle - ownWidth / 2),
      width: px(ownWidth),
      y: px(Math.min(tip, zero - 0.5)),
      height: px(Math.max(1, Math.abs(tip - zero))),
      middle: px(middle),
      tip: px(tip),
      valueX: px(middle),
      clamped,
      showsCode: shown[index] ?? false,
    };
  });
  placeEdgeValues(bars, (bar) => bar.middle, LABEL_GAP, [MARGIN.left + 4, width - MARGIN.right]);
  return {
    bars,
    y,
    zero: px(y(0)),
    top,
    step: px(x.step()),
    left: MARGIN.left,
    right: width - MARGIN.right,
    codesTop: px(height - codeRoom + 4),
    markSize: px(Math.max(5, Math.min(10, x.step() * 0.75))),
    missing: points.length - ordered.length,
  };
}

export function codeLabel(point: ScorePoint): string {
  return point.own ? `${point.code} own` : point.code;
}

function middleOf(x: ReturnType<typeof scaleBand<number>>, index: number): number {
  return (x(index) ?? 0) + x.bandwidth() / 2;
}

function labelRank(point: ScorePoint): number {
  if (point.own) return 0;
  if (point.signal === 'action') return 1;
  return point.signal === 'warning' ? 2 : 3;
}
