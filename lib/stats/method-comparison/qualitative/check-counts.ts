import { StatsError } from '../../stats-error';

/** Throws unless 0 <= positives <= trials, both whole, trials at least 1. */
export function checkCounts(caller: string, positives: number, trials: number): void {
  if (!Number.isSafeInteger(trials) || trials < 1) {
    throw new StatsError('too-few-values', `${caller} requires at least 1 result, found ${trials}`);
  }
  if (!Number.isSafeInteger(positives) || positives < 0 || positives > trials) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a whole count from 0 to ${trials}, found ${positives}`,
    );
  }
}
