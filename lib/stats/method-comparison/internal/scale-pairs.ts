/** Pairs divided by powers of two, so that squares neither overflow nor vanish; no figure is lost. */
export interface ScaledPairs {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly unitX: number;
  readonly unitY: number;
}

export function scalePairs(x: readonly number[], y: readonly number[]): ScaledPairs {
  const unitX = unitOf(x);
  const unitY = unitOf(y);
  return {
    x: Float64Array.from(x, (value) => value / unitX),
    y: Float64Array.from(y, (value) => value / unitY),
    unitX,
    unitY,
  };
}

/** The power of two just below the largest size. */
function unitOf(values: readonly number[]): number {
  let largest = 0;
  for (let i = 0; i < values.length; i += 1) largest = Math.max(largest, Math.abs(values[i] as number));
  return largest === 0 ? 1 : 2 ** Math.max(-1000, Math.floor(Math.log2(largest)));
}
