import { scaleLinear } from '@visx/scale';
import { SCORE_EDGE } from './chart-size';

export type Threshold = { at: number; label: string; strength: 'warning' | 'action' };
export type Clamped = -1 | 0 | 1;

/** The lines of z, z' and zeta at 2 and 3, or the one line of E_n at 1. */
export function thresholdsOf(kind: string): Threshold[] {
  const steps: [number, Threshold['strength']][] =
    kind === 'e-n'
      ? [[1, 'action']]
      : [
          [2, 'warning'],
          [3, 'action'],
        ];
  return steps.flatMap(([size, strength]) => [
    { at: size, label: `+${size}`, strength },
    { at: -size, label: `\u2212${size}`, strength },
  ]);
}

/** Half the height of a score axis: it always shows the lines, and never goes past the edge. */
export function scoreExtent(scores: readonly number[], edge = SCORE_EDGE): number {
  const largest = scores.reduce((most, score) => Math.max(most, Math.abs(score)), 0);
  return Math.min(edge, Math.max(3.5, Math.ceil(largest * 2) / 2));
}

export function scoreScale(extent: number, top: number, bottom: number) {
  return scaleLinear<number>({ domain: [-extent, extent], range: [bottom, top] });
}

export function clampSide(value: number, low: number, high: number): Clamped {
  if (value > high) return 1;
  return value < low ? -1 : 0;
}
