/** The largest double below x, and the smallest above it, for 0 <= x; below 0 lies the smallest negative number. */
export function justBelow(x: number): number {
  return x < 1e-290 ? x - Number.MIN_VALUE : x * (1 - Number.EPSILON / 2);
}

export function justAbove(x: number): number {
  return x < 1e-290 ? x + Number.MIN_VALUE : x * (1 + Number.EPSILON);
}
