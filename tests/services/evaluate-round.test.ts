import { expect, it } from 'vitest';
import { roundMeasurandSchema } from '@/lib/schemas/rounds';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { getPreparedEvaluation } from '@/lib/services/read-evaluation';
import { changeRoundMeasurand, getRound, getRoundPlan } from '@/lib/services/round-plan';
import { reviewMeasurand } from '@/lib/services/round-results';
import { closeRound, openRound } from '@/lib/services/round-steps';
import { getFigureWorking, getParticipantWorking } from '@/lib/services/show-working';
import { returnEvaluation } from '@/lib/services/sign-evaluation';
import { testDatabase } from '../db/test-database';
import { newActor } from './people-fixture';
import { loadResults, openWithLaboratories, planRound, type Planned } from './round-fixture';

/** Mean 10, and sigma_pt 2 as the fixture prescribes, so that z can be worked out in the head. */
const RESULTS = [8, 9, 10, 11, 12];
const BY_MEAN = roundMeasurandSchema.parse({
  replicates: '1',
  assignedMethod: 'mean',
  sigmaRule: 'prescribed',
  sigmaValue: '2',
  scoreKind: 'z',
});

async function closedRound(db: Awaited<ReturnType<typeof testDatabase>>): Promise<Planned> {
  const planned = await planRound(db);
  const { measurands } = await getRoundPlan(planned.round);
  await changeRoundMeasurand(planned.coordinator, planned.round, measurands[0]?.id ?? 0, BY_MEAN);
  await openRound(planned.coordinator, planned.round);
  await loadResults(planned, [...RESULTS, '<3']);
  await closeRound(planned.coordinator, planned.round);
  return planned;
}

it('scores by the plan, leaves less-than results out and counts them', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await closedRound(db);
  expect(await evaluateRound(coordinator, round)).toEqual({ version: 1 });
  const found = await getPreparedEvaluation(round);
  const { evaluation } = found?.measurands[0] ?? {};
  expect(evaluation?.assigned).toMatchObject({ method: 'mean', value: 10 });
  expect(evaluation?.counts).toMatchObject({ scored: 5, used: 5, censoredLow: 1 });
  expect(evaluation?.scores.map(({ score }) => score).sort((a, b) => (a ?? 0) - (b ?? 0))).toEqual([
    -1, -0.5, 0, 0.5, 1,
  ]);
  expect(found?.preparedByName).toBe('Cora Lind');
  const rows: { score: number | null; signal: string }[] = await db('scores').select('score', 'signal');
  expect(rows.filter(({ signal }) => signal === 'not-scored')).toEqual([
    { score: null, signal: 'not-scored' },
  ]);
  expect(rows).toHaveLength(6);
  expect((await getRound(round)).state).toBe('evaluated');
});

it('shows beforehand what the evaluation then gives, and stores nothing for it', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await closedRound(db);
  const { measurands } = await getRoundPlan(round);
  const id = measurands[0]?.id ?? 0;
  const { preview } = await reviewMeasurand(round, id);
  expect(await db('evaluations').select('id')).toEqual([]);
  await evaluateRound(coordinator, round);
  expect((await getPreparedEvaluation(round))?.measurands[0]?.evaluation).toEqual(preview);
  await expect(reviewMeasurand(round, id + 1)).rejects.toMatchObject({ code: 'not-found' });
});

it('keeps what was computed, whatever is tried on the rows', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await closedRound(db);
  await evaluateRound(coordinator, round);
  for (const table of ['evaluations', 'evaluated_measurands', 'scores', 'results']) {
    await expect(db(table).update({ id: 77 })).rejects.toThrow('is written once');
    await expect(db(table).delete()).rejects.toThrow('is written once');
  }
});

it('gives the same inputs the same hash in the next version', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await closedRound(db);
  const reviewer = await newActor(db, { name: 'Rhys Alder', roles: ['reviewer'] });
  await evaluateRound(coordinator, round);
  const first = (await getPreparedEvaluation(round))?.evaluation;
  expect(first?.inputsSha256).toMatch(/^[0-9a-f]{64}$/);
  await returnEvaluation(reviewer, round, 1, 'Once more.');
  await evaluateRound(coordinator, round);
  const second = (await getPreparedEvaluation(round))?.evaluation;
  expect(second).toMatchObject({ version: 2, inputsSha256: first?.inputsSha256 });
});

it('computes the working again from the stored inputs, down to the figure it is asked for', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await closedRound(db);
  await evaluateRound(coordinator, round);
  const { plan, evaluation } = (await getPreparedEvaluation(round))?.measurands[0] ?? {};
  if (!plan || !evaluation) throw new Error('nothing was evaluated');
  const steps = await getFigureWorking(round, plan.id, 'assigned');
  expect(steps.map(({ name }) => name)).toEqual(['Mean', 'Assigned value x_pt']);
  expect(steps.at(-1)?.value).toBe(evaluation.assigned.value);
  const lower = evaluation.scores.find(({ value }) => value === 8)?.participant ?? '';
  const z = getParticipantWorking(evaluation, lower).find(({ name }) => name === 'z');
  expect(z).toMatchObject({ inputs: { x_i: 8, x_pt: 10, sigma_pt: 2 }, value: -1 });
  expect(() => getParticipantWorking(evaluation, '0000')).toThrowError(/not found/);
  await expect(getFigureWorking(round, plan.id + 1, 'sigma')).rejects.toMatchObject({ code: 'not-found' });
});

it('evaluates 300 laboratories in one go', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 0);
  await loadResults(
    planned,
    Array.from({ length: 300 }, (_, index) => (10 + (index % 7) / 10).toFixed(1)),
  );
  await closeRound(planned.coordinator, planned.round);
  await evaluateRound(planned.coordinator, planned.round);
  const found = await getPreparedEvaluation(planned.round);
  expect(found?.measurands[0]?.evaluation.counts.scored).toBe(300);
});
