import { StatsError } from '../../stats-error';

const MOST_STEPS = 300;

/**
 * Root of an increasing function between `low` and `high`, where it is below and above 0: false position with the
 * halving of Dowell and Jarratt 1971 (Illinois), and a bisection whenever the bracket did not shrink to half in three
 * steps. To the last digits of x.
 */
export function bracketedRoot(caller: string, f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  let width = b - a;
  for (let step = 1; step <= MOST_STEPS; step += 1) {
    if (fa === 0) return a;
    if (fb === 0) return b;
    const slow = step % 3 === 0 && b - a > width / 2;
    if (step % 3 === 0) width = b - a;
    const guess = slow ? a + (b - a) / 2 : a - (fa / (fb - fa)) * (b - a);
    const x = guess > a && guess < b ? guess : a + (b - a) / 2;
    if (x <= a || x >= b || b - a <= 2 * Number.EPSILON * Math.max(Math.abs(a), Math.abs(b))) return x;
    const fx = f(x);
    if (fx < 0) {
      [a, fa] = [x, fx];
      fb /= 2;
    } else {
      [b, fb] = [x, fx];
      fa /= 2;
    }
  }
  throw new StatsError('no-convergence', `${caller} did not settle within ${MOST_STEPS} steps`);
}
