/** A stretch of sizes on the logarithmic scale. */
export interface LogWindow {
  readonly from: number;
  readonly to: number;
}

/** Length of what the windows cover together, outside the zone. */
export function coveredOutside(windows: readonly LogWindow[], zone: LogWindow): number {
  const pieces = windows.flatMap(({ from, to }) => [
    { from, to: Math.min(to, zone.from) },
    { from: Math.max(from, zone.to), to },
  ]);
  let covered = 0;
  let reached = -Infinity;
  for (const { from, to } of pieces
    .filter((piece) => piece.to > piece.from)
    .sort((x, y) => x.from - y.from)) {
    covered += Math.max(0, to - Math.max(from, reached));
    reached = Math.max(reached, to);
  }
  return covered;
}
