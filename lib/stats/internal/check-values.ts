import { StatsError } from '../stats-error';

/** Throws unless there are at least `minimum` values and all are finite numbers. `caller` begins the message. */
export function checkValues(caller: string, values: readonly number[], minimum: number): void {
  if (values.length < minimum) {
    const unit = minimum === 1 ? 'value' : 'values';
    throw new StatsError(
      'too-few-values',
      `${caller} requires at least ${minimum} ${unit}, found ${values.length}`,
    );
  }
  for (let i = 0; i < values.length; i += 1) {
    if (!Number.isFinite(values[i])) {
      throw new StatsError(
        'not-finite',
        `${caller} takes finite numbers only, found ${values[i]} at position ${i + 1}`,
      );
    }
  }
}

/** Throws unless the number is finite. */
export function checkFinite(caller: string, name: string, value: number): void {
  if (!Number.isFinite(value)) {
    throw new StatsError('not-finite', `${caller} requires a finite ${name}, found ${value}`);
  }
}

function withArticle(name: string): string {
  return `${/^[aeiou]/.test(name) ? 'an' : 'a'} ${name}`;
}

/** Throws unless the number is finite and above zero; zero itself is `no-spread`. */
export function checkPositive(caller: string, name: string, value: number): void {
  checkFinite(caller, name, value);
  if (value === 0)
    throw new StatsError('no-spread', `${caller} requires ${withArticle(name)} above zero, found 0`);
  if (value < 0)
    throw new StatsError(
      'out-of-domain',
      `${caller} requires ${withArticle(name)} above zero, found ${value}`,
    );
}

/** Throws unless the number is finite and not negative. */
export function checkNotNegative(caller: string, name: string, value: number): void {
  checkFinite(caller, name, value);
  if (value < 0) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires ${withArticle(name)} of zero or more, found ${value}`,
    );
  }
}

/** Gives the value back (never as negative zero), or throws when the arithmetic ran out of the number range. */
export function representable(caller: string, value: number): number {
  if (!Number.isFinite(value)) {
    throw new StatsError('out-of-domain', `${caller} gives a result that is too large to represent`);
  }
  return value === 0 ? 0 : value;
}
