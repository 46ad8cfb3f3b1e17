/**
 * One tail of a distribution, computed directly; the other is what it leaves of 1. `log` is never above 0.
 *
 * Whichever tail is the smaller, or nearly, is the one computed, so that neither loses digits.
 */
export interface Tail {
  readonly log: number;
  readonly side: Side;
}

export type Side = 'lower' | 'upper';

/** log(1 - exp(x)) for x <= 0 (Maechler 2012, Accurately computing log(1 - exp(-|a|))). */
export function logOneMinusExp(x: number): number {
  return x > -Math.LN2 ? Math.log(-Math.expm1(x)) : Math.log1p(-Math.exp(x));
}

export function logProbability(tail: Tail, side: Side): number {
  return tail.side === side ? tail.log : logOneMinusExp(tail.log);
}

export function probability(tail: Tail, side: Side): number {
  return tail.side === side ? Math.exp(tail.log) : -Math.expm1(tail.log);
}

export const other = (side: Side): Side => (side === 'lower' ? 'upper' : 'lower');

export const NO_LOWER: Tail = { log: -Infinity, side: 'lower' };
export const NO_UPPER: Tail = { log: -Infinity, side: 'upper' };
