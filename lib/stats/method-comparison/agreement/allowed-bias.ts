import { StatsError } from '../../stats-error';
import type { Interval } from '../types';

/** In the unit of the data, or in percent of the level. */
export type AllowedBias = { readonly absolute: number } | { readonly percent: number };

export type BiasVerdict = 'within' | 'beyond' | 'undecided';

export function allowedAt(caller: string, allowed: AllowedBias, level: number): number {
  const given = 'absolute' in allowed ? allowed.absolute : allowed.percent;
  const size = 'absolute' in allowed ? given : (given / 100) * Math.abs(level);
  if (!(given > 0 && Number.isFinite(size))) {
    throw new StatsError('out-of-domain', `${caller} requires an allowed bias above zero, found ${given}`);
  }
  return size;
}

/** Where the interval of the bias lies against -allowed .. allowed. */
export function verdictOn({ lower, upper }: Interval, allowed: number): BiasVerdict {
  if (lower >= -allowed && upper <= allowed) return 'within';
  return lower > allowed || upper < -allowed ? 'beyond' : 'undecided';
}
