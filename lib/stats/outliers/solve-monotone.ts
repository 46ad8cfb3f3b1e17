/**
 * The x between low and high at which an increasing function reaches the target, by halving with secant steps.
 * Needs no bracket check: a target outside the range gives the nearer end.
 */
export function solveMonotone(f: (x: number) => number, target: number, low: number, high: number): number {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a) - target, f(b) - target];
  if (fa >= 0) return a;
  if (fb <= 0) return b;
  for (let i = 0; i < 200 && b - a > 1e-13 * Math.max(Math.abs(a), Math.abs(b)); i += 1) {
    // Secant on every other step; halving in between keeps the bracket shrinking.
    const guess = i % 2 === 0 ? a - (fa * (b - a)) / (fb - fa) : (a + b) / 2;
    const x = guess > a && guess < b ? guess : (a + b) / 2;
    const fx = f(x) - target;
    if (fx === 0) return x;
    if (fx < 0) [a, fa] = [x, fx];
    else [b, fb] = [x, fx];
  }
  return (a + b) / 2;
}
