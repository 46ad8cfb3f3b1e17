export type CurvePoint = { x: number; y: number };

/** Gaussian kernel density of the values on an even grid, drawn for the eye only. */
export function densityCurve(
  values: readonly number[],
  { from, to, bandwidth, steps = 120 }: { from: number; to: number; bandwidth: number; steps?: number },
): CurvePoint[] {
  if (values.length === 0 || !(bandwidth > 0) || !(to > from)) return [];
  const scale = 1 / (values.length * bandwidth * Math.sqrt(2 * Math.PI));
  return Array.from({ length: steps + 1 }, (_, step) => {
    const x = from + ((to - from) * step) / steps;
    const y = values.reduce((sum, value) => sum + Math.exp(-0.5 * ((x - value) / bandwidth) ** 2), 0) * scale;
    return { x, y };
  });
}
