/** Half-way between two numbers, without overflow; the number itself when both are the same. */
export function midpoint(a: number, b: number): number {
  const half = (a + b) / 2;
  return Number.isFinite(half) ? half : a / 2 + b / 2;
}
