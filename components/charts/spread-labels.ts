/**
 * Moves labels along a line just so far that they stand `gap` apart and between the two ends.
 * Positions come in ascending order; when not all fit, they are spaced evenly.
 */
export function spreadLabels(
  positions: readonly number[],
  gap: number,
  [low, high]: [number, number],
): number[] {
  if (positions.length === 0) return [];
  const room = Math.min(gap, (high - low) / Math.max(1, positions.length - 1));
  const moved: number[] = [];
  for (const at of positions) {
    const previous = moved.at(-1);
    moved.push(Math.max(at, previous === undefined ? low : previous + room));
  }
  let limit = high;
  for (let index = moved.length - 1; index >= 0; index -= 1) {
    moved[index] = Math.min(moved[index] ?? limit, limit);
    limit = (moved[index] ?? limit) - room;
  }
  return moved;
}

type EdgeMark = { clamped: number; valueX: number };

/** Values of marks beyond the edge stand side by side, although the marks may be closer together. */
export function placeEdgeValues<Item extends EdgeMark>(
  marks: readonly Item[],
  middle: (mark: Item) => number,
  gap: number,
  ends: [number, number],
): void {
  for (const side of [-1, 1]) {
    const beyond = marks.filter((mark) => mark.clamped === side);
    const places = spreadLabels(beyond.map(middle), gap, ends);
    beyond.forEach((mark, index) => (mark.valueX = places[index] ?? mark.valueX));
  }
}
