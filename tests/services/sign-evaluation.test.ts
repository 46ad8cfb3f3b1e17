import { expect, it } from 'vitest';
import type { Actor } from '@/lib/rules/roles';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { getPreparedEvaluation, listSigners } from '@/lib/services/read-evaluation';
import { getRoundOverview, signatureOf } from '@/lib/services/round-overview';
import { getRound } from '@/lib/services/round-plan';
import { closeRound, publishRound } from '@/lib/services/round-steps';
import { changeMeasurand, getSchemeWithMeasurands } from '@/lib/services/schemes';
import { returnEvaluation, signEvaluation } from '@/lib/services/sign-evaluation';
import { testDatabase } from '../db/test-database';
import { newActor } from './people-fixture';
import { loadResults, logOf, MEASURAND, openWithLaboratories } from './round-fixture';

async function evaluatedRound(db: Awaited<ReturnType<typeof testDatabase>>) {
  const planned = await openWithLaboratories(db, 2);
  await loadResults(planned, [9, 10, 11]);
  await closeRound(planned.coordinator, planned.round);
  // Someone who may both evaluate and sign: their own work they still may not sign.
  const both = await newActor(db, { name: 'Bo Hazel', roles: ['coordinator', 'reviewer'] });
  const reviewer = await newActor(db, { name: 'Rhys Alder', roles: ['reviewer'] });
  await evaluateRound(both, planned.round);
  return { ...planned, both, reviewer };
}

it('lets no one sign what they prepared, whatever roles they hold', async () => {
  const db = await testDatabase();
  const { both, coordinator, round } = await evaluatedRound(db);
  const attempts: Actor[] = [both, coordinator, { ...both, userId: null }];
  for (const actor of attempts) {
    await expect(signEvaluation(actor, round, 1, '')).rejects.toMatchObject({ code: 'forbidden' });
    await expect(returnEvaluation(actor, round, 1, 'No')).rejects.toMatchObject({ code: 'forbidden' });
  }
  expect(await db('sign_offs').select('id')).toEqual([]);
});

it('publishes only what a second person signed', async () => {
  const db = await testDatabase();
  const { coordinator, reviewer, round } = await evaluatedRound(db);
  await expect(publishRound(coordinator, round)).rejects.toMatchObject({
    code: 'blocked',
    userMessage: expect.stringContaining('has not signed'),
  });
  await signEvaluation(reviewer, round, 1, 'Read and compared.');
  const overview = await getRoundOverview(round);
  expect(overview.blockers).toEqual([]);
  expect(signatureOf(overview)).toMatchObject({ userName: 'Rhys Alder', comment: 'Read and compared.' });
  await publishRound(coordinator, round);
  expect(await getRound(round)).toMatchObject({ state: 'published' });
  expect((await logOf(db)).slice(-3)).toEqual(['round.evaluated', 'evaluation.signed', 'round.published']);
});

it('names the people who may sign', async () => {
  const db = await testDatabase();
  const { round } = await evaluatedRound(db);
  const found = await getPreparedEvaluation(round);
  expect(found && (await listSigners(found.evaluation))).toEqual(['Rhys Alder']);
});

it('takes a signature only for the version that was read', async () => {
  const db = await testDatabase();
  const { both, reviewer, round } = await evaluatedRound(db);
  await returnEvaluation(reviewer, round, 1, 'Laboratory 3 looks odd.');
  expect(await getRound(round)).toMatchObject({ state: 'closed', evaluatedAt: null });
  await evaluateRound(both, round);
  await expect(signEvaluation(reviewer, round, 1, '')).rejects.toMatchObject({
    code: 'conflict',
    userMessage: expect.stringContaining('version 2 is waiting now'),
  });
  await signEvaluation(reviewer, round, 2, '');
  expect((await getPreparedEvaluation(round))?.evaluation.version).toBe(2);
});

it('does not count the signature of a version that was followed by another', async () => {
  const db = await testDatabase();
  const { coordinator, both, reviewer, round } = await evaluatedRound(db);
  await signEvaluation(reviewer, round, 1, '');
  await returnEvaluation(reviewer, round, 1, 'On second thoughts, no.');
  await evaluateRound(both, round);
  await expect(publishRound(coordinator, round)).rejects.toMatchObject({ code: 'blocked' });
});

it('takes one signature of each reviewer', async () => {
  const db = await testDatabase();
  const { reviewer, round } = await evaluatedRound(db);
  await signEvaluation(reviewer, round, 1, '');
  await expect(signEvaluation(reviewer, round, 1, '')).rejects.toMatchObject({ code: 'conflict' });
  expect(await db('sign_offs').select('id')).toHaveLength(1);
});

it('shows what was signed even when the scheme has changed since', async () => {
  const db = await testDatabase();
  const { coordinator, scheme, round } = await evaluatedRound(db);
  const { measurands } = await getSchemeWithMeasurands(scheme);
  const change = { ...MEASURAND, name: 'Something else', decimals: 4, decisionLimit: 5 };
  await changeMeasurand(coordinator, scheme, measurands[0]?.id ?? 0, change);
  const plan = (await getPreparedEvaluation(round))?.measurands[0]?.plan;
  expect(plan).toMatchObject({
    name: MEASURAND.name,
    decimals: 1,
    decisionLimit: null,
    zPrimeWhenNeeded: true,
  });
});
