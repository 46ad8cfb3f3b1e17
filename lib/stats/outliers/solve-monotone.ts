/**
 * The x between low and high at which an increasing function reaches the target; outside its range the nearer end.
 *
 * Secant steps that lessen the weight of an end that stays (Illinois method, Dowell and Jarratt 1971), with a halving
 * when the bracket has not halved in three steps. Ends at a relative width of 1e-12.
 */
export function solveMonotone(f: (x: number) => number, target: number, low: number, high: number): number {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a) - target, f(b) - target];
  if (fa >= 0) return a;
  if (fb <= 0) return b;
  let side = 0;
  let width = b - a;
  for (let i = 1; i <= 200 && b - a > 1e-12 * Math.max(Math.abs(a), Math.abs(b)); i += 1) {
    const slow = i % 3 === 0 && b - a > width / 2;
    if (i % 3 === 0) width = b - a;
    const secant = (a * fb - b * fa) / (fb - fa);
    const x = !slow && secant > a && secant < b ? secant : a / 2 + b / 2;
    const fx = f(x) - target;
    if (fx === 0) return x;
    if (fx < 0) {
      [a, fa] = [x, fx];
      if (side < 0) fb /= 2;
      side = -1;
    } else {
      [b, fb] = [x, fx];
      if (side > 0) fa /= 2;
      side = 1;
    }
    // The secant lands on the root from one side; a step of rounding size ends the search there.
    if (Math.abs(fx) <= 1e-14 * Math.abs(target)) return x;
  }
  return a / 2 + b / 2;
}
