/**
 * Level of each mark when marks of one diameter are stacked at their true places: 0 for the first,
 * and one more for each that would otherwise overlap. Positions come in ascending order.
 */
export function stackMarks(positions: readonly number[], diameter: number): number[] {
  const lastAtLevel: number[] = [];
  return positions.map((at) => {
    let level = lastAtLevel.findIndex((last) => at - last >= diameter);
    if (level < 0) level = lastAtLevel.length;
    lastAtLevel[level] = at;
    return level;
  });
}

/** The largest diameter, between the two given, at which the stack stays within the height. */
export function fitStack(
  positions: readonly number[],
  height: number,
  [most, least]: [number, number],
): number {
  for (let diameter = most; diameter > least; diameter -= 0.5) {
    const levels = stackMarks(positions, diameter).reduce((top, level) => Math.max(top, level + 1), 0);
    if (levels * diameter <= height) return diameter;
  }
  return least;
}
