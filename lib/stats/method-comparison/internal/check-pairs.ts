import { checkValues } from '../../internal/check-values';
import { StatsError } from '../../stats-error';

/** Throws unless x and y are equally long, long enough and finite. */
export function checkPairs(
  caller: string,
  x: readonly number[],
  y: readonly number[],
  minimum: number,
): void {
  if (x.length !== y.length) {
    throw new StatsError(
      'unequal-lengths',
      `${caller} requires as many x as y, found ${x.length} and ${y.length}`,
    );
  }
  checkValues(caller, x, minimum);
  checkValues(caller, y, minimum);
}

/** Throws when all values are the same. */
export function checkSpread(caller: string, name: string, values: readonly number[]): void {
  if (values.every((value) => value === values[0])) {
    throw new StatsError(
      'no-spread',
      `${caller} requires at least two different ${name}, found all ${values[0]}`,
    );
  }
}
