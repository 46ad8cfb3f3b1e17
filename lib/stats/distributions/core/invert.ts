import { StatsError } from '../../stats-error';
import { logProbability, other, type Side, type Tail } from './tail';

/** A distribution on the whole line whose density has a concave logarithm. */
interface LogConcave {
  readonly tail: (v: number) => Tail;
  readonly logDensity: (v: number) => number;
  /** Somewhere in the middle. */
  readonly start: number;
}

const MOST_STEPS = 500;

/**
 * The v at which the tail on `side` has probability p, 0 < p < 1.
 *
 * Newton's method on the logarithm of the smaller tail. Both tails of a log-concave density are log-concave
 * (Prekopa 1973), so a tangent always lies above the curve: a step from the inner side of the root passes it, and from
 * there the iteration closes in without ever passing it again, and needs no bracket. It ends when a step no longer goes
 * on. A step that would land far out, where the density itself has no digits left, is halved until it does not.
 */
export function invertTail(
  caller: string,
  { tail, logDensity, start }: LogConcave,
  p: number,
  side: Side,
): number {
  const [small, from]: [number, Side] = p <= 0.5 ? [p, side] : [1 - p, other(side)];
  const wanted = Math.log(small);
  const farOut = 3 * wanted - 10;
  const inwards = from === 'lower' ? 1 : -1;
  const logTail = (v: number) => logProbability(tail(v), from);
  let v = start;
  let log = logTail(v);
  let passed = false;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    let change = ((wanted - log) / Math.exp(logDensity(v) - log)) * inwards;
    passed ||= log <= wanted;
    // Rounding has the last word: a step that does not go inwards any more, or not by a digit, is the end.
    if (passed && change * inwards <= 0) return v;
    if (Math.abs(change) <= Number.EPSILON * Math.max(1, Math.abs(v))) return v + change;
    let next = logTail(v + change);
    while (!passed && !(next >= farOut)) {
      change /= 2;
      next = logTail(v + change);
    }
    v += change;
    log = next;
  }
  throw new StatsError('no-convergence', `${caller} did not settle within ${MOST_STEPS} steps`);
}
