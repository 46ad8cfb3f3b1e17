export type ChartSize = { width: number; height: number };

/** Each chart is drawn twice, for wide and for narrow screens, so that its text stays readable. */
export const WIDE: ChartSize = { width: 840, height: 350 };
export const NARROW: ChartSize = { width: 358, height: 330 };

/** Past this many points a chart is described as a whole instead of mark by mark. */
export const MOST_MARKS = 150;

/** Scores beyond this are drawn at the edge, with an arrow and their value. */
export const SCORE_EDGE = 5;

/** Coordinates to a tenth of a pixel keep the page small. */
export function px(value: number): number {
  return Math.round(value * 10) / 10;
}
