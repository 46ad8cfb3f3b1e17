/**
 * p values adjusted for several tests by Holm's method: the smallest times m, the next times m - 1, and so on, never
 * falling. An adjusted p below 0.05 holds for all tests together. Source: Holm 1979, Scand. J. Statistics 6, 65.
 */
export function holm(pValues: readonly number[]): number[] {
  const m = pValues.length;
  const order = pValues.map((p, index) => ({ p, index })).sort((x, y) => x.p - y.p);
  const adjusted = new Array<number>(m);
  let highest = 0;
  order.forEach(({ p, index }, i) => {
    highest = Math.max(highest, Math.min(1, (m - i) * p));
    adjusted[index] = highest;
  });
  return adjusted;
}
