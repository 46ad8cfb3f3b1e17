import { performance } from 'node:perf_hooks';

export interface Spread {
  readonly median: number;
  readonly low: number;
  readonly high: number;
  readonly runs: number;
}

const SHORTEST_SAMPLE_MS = 2;
const BUDGET_MS = 400;
const FEWEST = 5;
const MOST = 41;

/** Milliseconds a call. Calls shorter than the clock is fine are timed by the batch; a first share warms up. */
export function timesOf(call: () => unknown): number[] {
  let batch = 1;
  const sample = () => {
    const since = performance.now();
    for (let i = 0; i < batch; i += 1) call();
    return performance.now() - since;
  };
  const begun = performance.now();
  while (performance.now() - begun < BUDGET_MS / 4) {
    const took = sample();
    if (took < SHORTEST_SAMPLE_MS) batch *= 2;
  }
  const times: number[] = [];
  const since = performance.now();
  while (times.length < FEWEST || (times.length < MOST && performance.now() - since < BUDGET_MS)) {
    times.push(sample() / batch);
  }
  return times;
}

/** Median and quartiles, by nearest rank. */
export function spreadOf(times: readonly number[]): Spread {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (share: number) => sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)] as number;
  return { median: at(0.5), low: at(0.25), high: at(0.75), runs: sorted.length };
}
