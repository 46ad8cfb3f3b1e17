import { performance } from 'node:perf_hooks';
import { evaluateMeasurand, type EvaluateMeasurandInput } from '../../lib/stats';

const LABORATORIES = 30;
const WARM_UP_RUNS = 100;
const RUNS = 1_000;

/** Invented figures around 10 with two far out, the same on every machine. */
function makeInput(): EvaluateMeasurandInput {
  const results = Array.from({ length: LABORATORIES }, (_, i) => {
    const wave = Math.sin((i + 1) * 12.9898);
    const value = i === 7 ? 31 : i === 19 ? 2.1 : 10 + 1.8 * wave ** 3;
    return { participant: `L${i + 1}`, value, standardUncertainty: i % 3 === 0 ? null : 0.6 };
  });
  return {
    results,
    censored: [],
    assignedValue: { method: 'algorithm-a' },
    sigmaPt: { rule: 'percent', percent: 20 },
    score: { kind: 'z', zPrimeWhenNeeded: true },
  };
}

function timeRuns(working: boolean) {
  const input = makeInput();
  for (let i = 0; i < WARM_UP_RUNS; i += 1) evaluateMeasurand(input, { working });
  const times = Array.from({ length: RUNS }, () => {
    const since = performance.now();
    evaluateMeasurand(input, { working });
    return performance.now() - since;
  }).sort((a, b) => a - b);
  const at = (share: number) => times[Math.ceil(share * RUNS) - 1];
  return { runs: RUNS, median: at(0.5), p5: at(0.05), p95: at(0.95), slowest: at(1) };
}

console.log(JSON.stringify({ plain: timeRuns(false), withWorking: timeRuns(true) }));
