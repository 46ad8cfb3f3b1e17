import { scaleLinear } from '@visx/scale';
import { px, SCORE_EDGE, type ChartSize } from './chart-size';
import type { AssignedValue, ResultPoint } from './chart-types';
import { densityCurve, type CurvePoint } from './density-curve';
import { clampSide, type Clamped } from './score-scale';
import { fitStack, stackMarks } from './stack-marks';

export type ResultMark = { point: ResultPoint; x: number; y: number; clamped: Clamped };
export type SigmaLine = { multiple: -3 | -2 | 0 | 2 | 3; value: number; x: number };
export type DistributionInput = {
  results: readonly ResultPoint[];
  assigned: AssignedValue;
  density?: readonly CurvePoint[];
  bandwidth?: number;
};

const MARGIN = { left: 14, right: 14, top: 30 };
const AXIS_ROOM = 46;
const STRIP = 84;
const EDGE_ROW = 14;

/** Bandwidth of 0.75 sigma_pt, as the IUPAC protocol suggests for results of a round. */
export function usualBandwidth(sigmaPt: number): number {
  return 0.75 * sigmaPt;
}

export function distributionGeometry(input: DistributionInput, { width, height }: ChartSize) {
  const { assigned } = input;
  const results = [...input.results].sort((a, b) => a.value - b.value || a.code.localeCompare(b.code, 'en'));
  const values = results.map((result) => result.value);
  const [low, high] = resultDomain(values, assigned);
  const x = scaleLinear<number>({ domain: [low, high], range: [MARGIN.left, width - MARGIN.right] });
  const baseline = height - AXIS_ROOM - STRIP;
  const bandwidth = input.bandwidth ?? usualBandwidth(assigned.sigmaPt);
  const curve = input.density ?? densityCurve(values, { from: low, to: high, bandwidth });
  const peak = curve.reduce((most, point) => Math.max(most, point.y), 0);
  const y = scaleLinear<number>({ domain: [0, peak || 1], range: [baseline, MARGIN.top + 6] });
  const inside = results.filter((result) => clampSide(result.value, low, high) === 0);
  const positions = inside.map((result) => x(result.value));
  const diameter = fitStack(positions, STRIP - 8, [10, 2.5]);
  const levels = stackMarks(positions, diameter);
  const marks = inside.map((point, index): ResultMark => ({
    point,
    x: px(positions[index] ?? 0),
    y: px(baseline + 6 + ((levels[index] ?? 0) + 0.5) * diameter),
    clamped: 0,
  }));
  return {
    x,
    baseline,
    axisTop: height - AXIS_ROOM,
    top: MARGIN.top,
    left: MARGIN.left,
    right: width - MARGIN.right,
    curve: curve.map((point) => ({ x: px(x(point.x)), y: px(y(point.y)) })),
    diameter,
    marks: [...marks, ...edgeMarks(results, { low, high, x, baseline })],
    lines: sigmaLines(assigned).map((line) => ({ ...line, x: px(x(line.value)) })),
    bandwidth,
  };
}

/** The axis covers the lines at 3 sigma_pt and the results, but stops at the edge of 5 sigma_pt. */
export function resultDomain(values: readonly number[], { value, sigmaPt }: AssignedValue): [number, number] {
  const low = Math.min(value - 3.6 * sigmaPt, ...values.map((result) => result - 0.3 * sigmaPt));
  const high = Math.max(value + 3.6 * sigmaPt, ...values.map((result) => result + 0.3 * sigmaPt));
  return [Math.max(low, value - SCORE_EDGE * sigmaPt), Math.min(high, value + SCORE_EDGE * sigmaPt)];
}

export function sigmaLines({ value, sigmaPt }: AssignedValue): Omit<SigmaLine, 'x'>[] {
  return ([-3, -2, 0, 2, 3] as const).map((multiple) => ({ multiple, value: value + multiple * sigmaPt }));
}

type EdgeInput = { low: number; high: number; x: (value: number) => number; baseline: number };

function edgeMarks(results: readonly ResultPoint[], { low, high, x, baseline }: EdgeInput): ResultMark[] {
  return ([-1, 1] as const).flatMap((side) => {
    const beyond = results.filter((result) => clampSide(result.value, low, high) === side);
    // The farthest stands on top, next to the line where the eye begins.
    const ordered = side === 1 ? beyond.reverse() : beyond;
    return ordered.map((point, row) => ({
      point,
      x: px(x(side === 1 ? high : low)),
      y: px(baseline + 10 + row * EDGE_ROW),
      clamped: side,
    }));
  });
}
