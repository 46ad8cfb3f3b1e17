import { expect } from 'vitest';
import { StatsError, type StatsErrorCode } from '@/lib/stats';

/** Runs the function and gives the code of the StatsError it throws; anything else fails the test. */
export function codeOf(run: () => unknown): StatsErrorCode {
  try {
    run();
  } catch (error) {
    if (error instanceof StatsError) return error.code;
    throw error;
  }
  return expect.fail('expected a StatsError, but nothing was thrown');
}
