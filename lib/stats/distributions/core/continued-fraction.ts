import { StatsError } from '../../stats-error';

const TINY = 1e-300;
const MOST_TERMS = 1_000_000;

/**
 * 1 / (first + n(1) / (d(1) + n(2) / (d(2) + ...))) by the modified Lentz method (Thompson and Barnett 1986).
 * Stops when a term changes nothing any more.
 */
export function continuedFraction(
  caller: string,
  first: number,
  numerator: (term: number) => number,
  denominator: (term: number) => number,
): number {
  let d = 1 / kept(first);
  let c = 1 / TINY;
  let value = d;
  for (let i = 1; i <= MOST_TERMS; i += 1) {
    const n = numerator(i);
    const b = denominator(i);
    d = 1 / kept(b + n * d);
    c = kept(b + n / c);
    const change = c * d;
    value *= change;
    if (Math.abs(change - 1) <= 2 * Number.EPSILON) return value;
  }
  throw new StatsError('no-convergence', `${caller} did not settle within ${MOST_TERMS} terms`);
}

const kept = (x: number) => (Math.abs(x) < TINY ? TINY : x);
