import { StatsError } from '../../stats-error';

const MOST = 10_000_000;

/** The smallest whole number from `from` on for which a condition holds that, once true, stays true. */
export function smallestCount(caller: string, from: number, enough: (count: number) => boolean): number {
  let high = from;
  while (!enough(high)) {
    if (high >= MOST) {
      throw new StatsError('out-of-domain', `${caller} would need more than ${MOST} items`);
    }
    high = Math.min(MOST, high * 2);
  }
  let low = Math.max(from - 1, Math.floor(high / 2));
  if (high === from) return from;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (enough(middle)) high = middle;
    else low = middle;
  }
  return high;
}

/** Throws unless the number lies between 0 and 1. */
export function checkShare(caller: string, name: string, value: number): number {
  if (!(value > 0 && value < 1)) {
    throw new StatsError('out-of-domain', `${caller} requires ${name} between 0 and 1, found ${value}`);
  }
  return value;
}

/** Throws unless there are at least `least` items. */
export function checkItems(caller: string, count: number, least: number): number {
  if (!Number.isSafeInteger(count) || count < least) {
    throw new StatsError('too-few-values', `${caller} requires at least ${least} items, found ${count}`);
  }
  return count;
}
