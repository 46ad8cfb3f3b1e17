import { StatsError } from '../../stats-error';

const MOST_ITERATIONS = 2_000;
const AT_REST = 1e-15;
const NEARLY_AT_REST = 1e-11;

/**
 * Repeats a step until the slope stands still: changes below 1e-15 of it, or, below 1e-11, changes that no longer
 * shrink because rounding makes them.
 */
export function iterateToRest<T extends { readonly slope: number }>(
  caller: string,
  start: T,
  next: (from: T) => T,
): { readonly result: T; readonly iterations: number } {
  let current = start;
  let last = Infinity;
  for (let iterations = 1; iterations <= MOST_ITERATIONS; iterations += 1) {
    const result = next(current);
    const change = Math.abs(result.slope - current.slope);
    const size = Math.abs(result.slope);
    if (change <= AT_REST * size || (change <= NEARLY_AT_REST * size && change >= last)) {
      return { result, iterations };
    }
    current = result;
    last = change;
  }
  throw new StatsError(
    'no-convergence',
    `${caller} did not settle within ${MOST_ITERATIONS} iterations, reached a slope of ${current.slope}`,
  );
}
