import { AsyncLocalStorage } from 'node:async_hooks';

const told = new AsyncLocalStorage<number>();

/** Runs `work` as if it were that moment: whatever stamps a row with the present stamps it with the moment told. */
export function at<T>(moment: string, work: () => Promise<T>): Promise<T> {
  return told.run(Date.parse(moment), work);
}

/**
 * Lets `at` tell the time while `work` runs. The stores stamp their rows themselves, and some of those rows can never
 * be changed afterwards; a demonstration that tells of three years has to be written at the moments it tells of.
 * Only what runs inside `at` sees another time; everything else keeps the real one.
 */
export async function withStoryClock<T>(work: () => Promise<T>): Promise<T> {
  const RealDate = globalThis.Date;
  const now = () => told.getStore() ?? RealDate.now();
  globalThis.Date = new Proxy(RealDate, {
    construct: (target, given, newTarget) =>
      Reflect.construct(target, given.length === 0 ? [now()] : given, newTarget),
    get: (target, key, receiver) => (key === 'now' ? now : Reflect.get(target, key, receiver)),
  });
  try {
    return await work();
  } finally {
    globalThis.Date = RealDate;
  }
}
