import { afterAll, expect, it, vi } from 'vitest';
import { databaseFile, db } from '@/db/connection';
import { findRound } from '@/db/round-store';
import { log } from '@/lib/log';
import { computeEvaluation, textOf } from '@/lib/services/compute-evaluation';
import { evaluateRound, keepEarly } from '@/lib/services/evaluate-round';
import {
  endEvaluationThread,
  evaluateInWorker,
  WorkerLost,
} from '@/lib/services/evaluation-worker/evaluate-in-worker';
import { closeRound } from '@/lib/services/round-steps';
import { testDatabase } from '../db/test-database';
import { loadResults, openWithLaboratories, type Planned } from './round-fixture';

const RESULTS = ['8', '9.25', '10', '11.5', '12', '<3', '-0', '1e-7', '14.123456789', '10'];

afterAll(endEvaluationThread);

async function closedRound(): Promise<Planned & { roundId: number }> {
  const connection = await testDatabase();
  const planned = await openWithLaboratories(connection, 0);
  await loadResults(planned, RESULTS);
  await closeRound(planned.coordinator, planned.round);
  const round = await findRound(connection, planned.round);
  return { ...planned, roundId: round?.id ?? 0 };
}

/** What evaluateRound keeps, but for the moment at which it did. */
async function keptRows() {
  return {
    evaluations: await db()('evaluations').select('settings_json', 'inputs_json', 'inputs_sha256', 'version'),
    measurands: await db()('evaluated_measurands').orderBy('id'),
    scores: await db()('scores').orderBy('id'),
  };
}

it('computes the same bytes in the thread as without it', async () => {
  const { roundId } = await closedRound();
  const inline = await computeEvaluation(db(), roundId);
  const inWorker = await evaluateInWorker(databaseFile(), roundId);
  expect(inline.measurands).toHaveLength(1);
  expect(inWorker).toEqual(inline);
  expect(textOf(inWorker.inputsJson)).toContain('14.123456789');
});

it('keeps the same rows for a large round as for a small one', async () => {
  const planned = await closedRound();
  const { roundId } = planned;
  const small = await computeEvaluation(db(), roundId);
  await evaluateRound(planned.coordinator, planned.round, { manyResults: 3 });
  const kept = await keptRows();
  expect(kept.evaluations).toEqual([
    {
      version: 1,
      settings_json: small.settingsJson,
      inputs_json: textOf(small.inputsJson),
      inputs_sha256: small.inputsSha256,
    },
  ]);
  expect(kept.measurands.map((row) => row.body_json)).toEqual(
    small.measurands.map(({ bodyJson }) => textOf(bodyJson)),
  );
  expect(kept.scores).toHaveLength(RESULTS.length);
  expect(kept.scores.filter((row) => row.signal === 'not-scored')).toMatchObject([
    { value: null, score: null },
  ]);
});

it('keeps nothing when the results changed after they were evaluated', async () => {
  const planned = await closedRound();
  const early = await evaluateInWorker(databaseFile(), planned.roundId);
  await db()('submissions').where({ id: 1 }).update({ state: 'superseded' });
  const keeping = keepEarly(planned.coordinator, planned.round, early);
  await expect(keeping).rejects.toMatchObject({ code: 'conflict' });
  expect(await db()('evaluations').select('id')).toEqual([]);
  expect((await findRound(db(), planned.round))?.state).toBe('closed');
  const { version } = await evaluateRound(planned.coordinator, planned.round, { manyResults: 3 });
  expect(version).toBe(1);
  expect(await db()('scores').select('id')).toHaveLength(RESULTS.length - 1);
});

it('evaluates in the main thread, and says so, when there is no thread to be had', async () => {
  const planned = await closedRound();
  await endEvaluationThread();
  const script = 'lib/services/evaluation-worker/no-such-worker.mjs';
  await expect(evaluateInWorker(databaseFile(), planned.roundId, script)).rejects.toBeInstanceOf(WorkerLost);
  const warn = vi.spyOn(log, 'warn');
  await evaluateRound(planned.coordinator, planned.round, { manyResults: 3, workerScript: script });
  expect(warn).toHaveBeenCalledWith(
    expect.objectContaining({ results: RESULTS.length }),
    'evaluating in the main thread',
  );
  expect(await db()('evaluations').select('version')).toEqual([{ version: 1 }]);
});

it('passes on what is wrong with the evaluation itself', async () => {
  await closedRound();
  await expect(evaluateInWorker('/no/such/folder\0', 1)).rejects.not.toBeInstanceOf(WorkerLost);
});
