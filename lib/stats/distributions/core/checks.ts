import { StatsError } from '../../stats-error';

/** A place on the line; the infinities are allowed, where a distribution function is 0 or 1. */
export function checkPlace(caller: string, x: number): void {
  if (Number.isNaN(x)) throw new StatsError('not-finite', `${caller} requires a number, found NaN`);
}

/** Throws unless 0 < p < 1. */
export function checkProbability(caller: string, p: number): void {
  if (Number.isNaN(p)) throw new StatsError('not-finite', `${caller} requires a probability, found NaN`);
  if (!(p > 0 && p < 1)) {
    throw new StatsError('out-of-domain', `${caller} requires a probability between 0 and 1, found ${p}`);
  }
}

/** Throws unless the parameter is above zero; `infinite` allows Infinity. */
export function checkParameter(caller: string, name: string, value: number, infinite = false): void {
  if (Number.isNaN(value) || (value === Infinity && !infinite)) {
    throw new StatsError('not-finite', `${caller} requires finite ${name}, found ${value}`);
  }
  if (!(value > 0))
    throw new StatsError('out-of-domain', `${caller} requires ${name} above 0, found ${value}`);
}
