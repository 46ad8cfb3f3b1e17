import { scalePoint } from '@visx/scale';
import { px, type ChartSize } from './chart-size';
import type { TrendPoint } from './chart-types';
import { clampSide, scoreExtent, scoreScale, type Clamped } from './score-scale';
import { thinLabels } from './thin-labels';

export type TrendMark = { point: TrendPoint & { score: number }; x: number; y: number; clamped: Clamped };

const MARGIN = { left: 40, right: 52, top: 28, bottom: 52 };
const LABEL_GAP = 68;

function hasScore(point: TrendPoint): point is TrendPoint & { score: number } {
  return point.score !== null && point.signal !== 'not-scored';
}

export function trendGeometry(rounds: readonly TrendPoint[], { width, height }: ChartSize) {
  const scored = rounds.filter(hasScore);
  const extent = scoreExtent(scored.map((point) => point.score));
  const bottom = height - MARGIN.bottom;
  const y = scoreScale(extent, MARGIN.top, bottom);
  const x = scalePoint<number>({
    domain: rounds.map((_, index) => index),
    range: [MARGIN.left, width - MARGIN.right],
    padding: 0.5,
  });
  const at = (index: number) => x(index) ?? MARGIN.left;
  const marks = rounds.map((point, index): TrendMark | null => {
    if (!hasScore(point)) return null;
    const inside = Math.max(-extent, Math.min(extent, point.score));
    return { point, x: px(at(index)), y: px(y(inside)), clamped: clampSide(point.score, -extent, extent) };
  });
  // The newest round keeps its label when they thin out, then every other counted from there.
  const shown = thinLabels(
    rounds.map((_, index) => ({ at: at(index), rank: rounds.length - index })),
    LABEL_GAP,
  );
  return {
    y,
    left: MARGIN.left,
    right: width - MARGIN.right,
    bottom,
    marks: marks.filter((mark) => mark !== null),
    runs: splitRuns(marks),
    labels: rounds.map((round, index) => ({
      text: round.label,
      x: px(at(index)),
      shown: shown[index] ?? false,
    })),
    missing: rounds.length - scored.length,
  };
}

/** The line is broken at a round without a score: it is not drawn across what was not measured. */
export function splitRuns(marks: readonly (TrendMark | null)[]): TrendMark[][] {
  const runs: TrendMark[][] = [[]];
  for (const mark of marks) {
    if (mark) runs[runs.length - 1]?.push(mark);
    else runs.push([]);
  }
  return runs.filter((run) => run.length > 1);
}
