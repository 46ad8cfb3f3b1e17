import 'server-only';
import { AsyncLocalStorage } from 'node:async_hooks';

const told = new AsyncLocalStorage<string>();

/** Runs `work` so that rows are stamped with `moment` (UTC ISO 8601): for writing down what happened earlier. */
export function atMoment<T>(moment: string, work: () => Promise<T>): Promise<T> {
  return told.run(new Date(moment).toISOString(), work);
}

/** The time that a row is stamped with: now, unless the caller tells of another moment. */
export function timestamp(): string {
  return told.getStore() ?? new Date().toISOString();
}
