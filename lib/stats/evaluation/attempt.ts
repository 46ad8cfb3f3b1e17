import { StatsError } from '../stats-error';

export type Attempt<T> =
  { readonly value: T; readonly reason: null } | { readonly value: null; readonly reason: string };

/** Runs a computation; an expected StatsError becomes a missing value with its sentence. Other faults pass through. */
export function attempt<T>(compute: () => T): Attempt<T> {
  try {
    return { value: compute(), reason: null };
  } catch (error) {
    if (error instanceof StatsError) return missing(error.message);
    throw error;
  }
}

export function missing(reason: string): { readonly value: null; readonly reason: string } {
  return { value: null, reason };
}
