/**
 * Times the evaluation of a large round, and how long the server's event loop is held up by it.
 * usage: node --import tsx --conditions=react-server scripts/bench/stats-round.ts; prints JSON.
 */
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { monitorEventLoopDelay, performance } from 'node:perf_hooks';
import { databaseFile, db } from '@/db/connection';
import { listRoundMeasurands } from '@/db/round-measurand-store';
import { listMeasuredResults } from '@/db/views/round-results-view';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { evaluationInput } from '@/lib/services/evaluation-inputs';
import { endEvaluationThread, evaluateInWorker } from '@/lib/services/evaluation-worker/evaluate-in-worker';
import { evaluateMeasurand } from '@/lib/stats';
import { writeLargeRound, LARGE_ROUND } from './large-round';
import { spreadOf } from './timing';

const RUNS = 7;
const TARGET_MS = 1000;

/** Time and the event-loop delay of this thread while something goes on. */
async function watched(work: () => Promise<unknown>) {
  const delay = monitorEventLoopDelay({ resolution: 5 });
  delay.enable();
  const since = performance.now();
  await work();
  const took = performance.now() - since;
  // The last delay is only recorded when the loop has turned once more.
  await new Promise((resolve) => setTimeout(resolve, 20));
  delay.disable();
  const ms = (nanoseconds: number) => nanoseconds / 1e6;
  return {
    took,
    delayMedian: ms(delay.percentile(50)),
    delayP99: ms(delay.percentile(99)),
    delayMax: ms(delay.max),
  };
}

async function measure() {
  const { slug, roundId, actor } = await writeLargeRound();
  const measured = await listMeasuredResults(db(), roundId);
  const plans = await listRoundMeasurands(db(), roundId);
  const byPlan = new Map(
    plans.map((plan) => [plan.id, measured.filter((result) => result.roundMeasurandId === plan.id)]),
  );
  const evaluateAll = () =>
    plans.map((plan) => evaluateMeasurand(evaluationInput(plan, byPlan.get(plan.id) ?? [])));
  const cpu: number[] = [];
  for (let run = 0; run < RUNS; run += 1) {
    const before = process.cpuUsage();
    evaluateAll();
    const { user, system } = process.cpuUsage(before);
    cpu.push((user + system) / 1000);
  }
  const evaluation = spreadOf(cpu);
  await evaluateInWorker(databaseFile(), roundId);
  const inWorker = await watched(() => evaluateInWorker(databaseFile(), roundId));
  const withKeeping = await watched(() => evaluateRound(actor, slug));
  return {
    ...LARGE_ROUND,
    evaluation,
    inWorker,
    withKeeping,
    targetMs: TARGET_MS,
    met: evaluation.median < TARGET_MS,
  };
}

const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'assize-bench-round-'));
process.env.ASSIZE_DATA_DIR = folder;
try {
  console.log(JSON.stringify(await measure()));
} finally {
  await endEvaluationThread();
  await db().destroy();
  fs.rmSync(folder, { recursive: true, force: true });
}
