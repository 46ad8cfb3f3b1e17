import { normalCdf, normalDensity } from '../distributions/normal';
import { bracketedRoot } from '../distributions/core/bracketed-root';
import { integrate } from './gauss-legendre';

/*
 * The range (largest less smallest) of n independent standard normal values. Probability by the trapezoidal rule on the
 * place of the smallest one, which for such a bell is exact to the last digits with this step.
 */
const STEP = 0.08;
const REACH = 9;
/** Beyond, a range of up to 1000 values has no probability left that a double could tell from 0. */
const WIDEST = 16;

export function rangeCdf(width: number, n: number): number {
  if (width <= 0) return 0;
  let sum = 0;
  for (let z = -REACH - width; z <= REACH; z += STEP) {
    sum += normalDensity(z) * (normalCdf(z + width) - normalCdf(z)) ** (n - 1);
  }
  return Math.min(1, n * STEP * sum);
}

export function rangeQuantile(p: number, n: number): number {
  return bracketedRoot('rangeQuantile', (width) => rangeCdf(width, n) - p, 0, WIDEST);
}

/** Mean of min(range, limit)^2; without a limit the mean square of the range. */
export function rangeMeanSquare(n: number, limit = WIDEST): number {
  const rest = (width: number) => 2 * width * (1 - rangeCdf(width, n));
  const half = limit / 2;
  return integrate(rest, 0, half) + integrate(rest, half, limit);
}
