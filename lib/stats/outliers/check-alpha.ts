import { StatsError } from '../stats-error';

/** Throws unless alpha is a significance level: above 0 and below 1. */
export function checkAlpha(caller: string, alpha: number): void {
  if (!(alpha > 0 && alpha < 1)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a significance level between 0 and 1, found ${alpha}`,
    );
  }
}

/** Throws unless the number is whole and at least `minimum`. */
export function checkCount(caller: string, what: string, count: number, minimum: number): void {
  if (!(count >= minimum)) {
    throw new StatsError('too-few-values', `${caller} requires at least ${minimum} ${what}, found ${count}`);
  }
  if (!Number.isInteger(count)) {
    throw new StatsError('out-of-domain', `${caller} requires a whole number of ${what}, found ${count}`);
  }
}
