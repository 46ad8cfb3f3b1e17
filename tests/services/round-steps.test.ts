import { expect, it } from 'vitest';
import { addRound, dropTestItem, getRound, getRoundPlan } from '@/lib/services/round-plan';
import { getRoundOverview } from '@/lib/services/round-overview';
import { enrolLaboratories, moveEnrolment } from '@/lib/services/enrolments';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { cancelRound, closeRound, openRound, publishRound } from '@/lib/services/round-steps';
import { listRounds } from '@/db/views/round-list-view';
import { testDatabase } from '../db/test-database';
import { csvOf, openWithManagers, publish, send } from './laboratory-fixture';
import { addLaboratory, addPerson } from './people-fixture';
import { inDays, loadResults, logOf, openWithLaboratories, planRound, ROUND } from './round-fixture';

it('does not open a round without an item, and says where to mend it', async () => {
  const db = await testDatabase();
  const { coordinator, scheme } = await planRound(db);
  const { slug } = await addRound(coordinator, scheme, { ...ROUND, name: 'Empty' });
  expect((await getRoundOverview(slug)).blockers).toEqual([
    { text: 'The plan has no test item yet.', href: '/rounds/empty/plan' },
  ]);
  await expect(openRound(coordinator, slug)).rejects.toMatchObject({
    code: 'blocked',
    userMessage: 'The plan has no test item yet.',
  });
});

it('does not open a round whose close has passed, unless it is a past round', async () => {
  const db = await testDatabase();
  const dates = {
    opensAt: inDays(-60),
    dispatchAt: inDays(-50),
    closesAt: inDays(-30),
    publishAt: inDays(-20),
  };
  const { coordinator, scheme, round } = await planRound(db, dates);
  await expect(openRound(coordinator, round)).rejects.toMatchObject({ code: 'blocked' });
  const { slug } = await addRound(coordinator, scheme, { ...ROUND, ...dates, name: 'Old', isPast: true });
  expect((await getRoundOverview(slug)).blockers.map(({ href }) => href)).toEqual(['/rounds/old/plan']);
});

it.each([
  { isPast: false, subjects: ['Maize 1 is open for results'] },
  { isPast: true, subjects: [] },
])('writes to enrolled laboratories when it opens ($isPast: past round)', async ({ isPast, subjects }) => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db, { isPast });
  const laboratoryId = await addLaboratory(db, 'Mill 1');
  await addPerson(db, { name: 'Mira Voss', roles: [['lab_manager', laboratoryId]] });
  await enrolLaboratories(coordinator, round, [laboratoryId], 'enrolled');
  await openRound(coordinator, round);
  const mail: { subject: string }[] = await db('outbox').select('subject');
  expect(mail.map(({ subject }) => subject)).toEqual(subjects);
});

async function subjects(db: Awaited<ReturnType<typeof testDatabase>>): Promise<string[]> {
  const mail: { subject: string }[] = await db('outbox').orderBy('id').select('subject');
  return mail.map(({ subject }) => subject);
}

it('takes each step only from the state before it', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  for (const step of [closeRound, evaluateRound, publishRound]) {
    await expect(step(coordinator, round)).rejects.toMatchObject({
      code: 'blocked',
      userMessage: expect.stringContaining('this step does not apply now'),
    });
  }
  await openRound(coordinator, round);
  await expect(openRound(coordinator, round)).rejects.toMatchObject({ code: 'blocked' });
});

it('closes only when someone has sent results, and evaluates only what has a number', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 2);
  const { coordinator, round } = planned;
  await expect(closeRound(coordinator, round)).rejects.toMatchObject({
    userMessage: 'No laboratory has sent results yet.',
  });
  await loadResults(planned, ['<2', '<5']);
  await closeRound(coordinator, round);
  await expect(evaluateRound(coordinator, round)).rejects.toMatchObject({
    userMessage: 'No measurand has a numeric result, so there is nothing to evaluate.',
  });
});

it('keeps a cancelled round with its reason and tells the participants of an open one', async () => {
  const db = await testDatabase();
  const { coordinator, round, laboratoryIds } = await openWithLaboratories(db, 1);
  await addPerson(db, { name: 'Mira Voss', roles: [['lab_manager', laboratoryIds[0] ?? 0]] });
  await cancelRound(coordinator, round, 'The material was not stable.');
  expect(await getRound(round)).toMatchObject({
    state: 'cancelled',
    cancelReason: 'The material was not stable.',
  });
  const mail: { subject: string; body: string }[] = await db('outbox').select('subject', 'body');
  expect(mail.map(({ subject }) => subject)).toContain('Maize 1 is cancelled');
  expect(mail.some(({ body }) => body.includes('The material was not stable.'))).toBe(true);
  await expect(openRound(coordinator, round)).rejects.toMatchObject({ code: 'blocked' });
  expect((await logOf(db)).at(-1)).toBe('round.cancelled');
});

it('tells those who were invited while the round was being planned that it is cancelled', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  const laboratoryId = await addLaboratory(db, 'Mill 1');
  await addPerson(db, { name: 'Mira Voss', roles: [['lab_manager', laboratoryId]] });
  await enrolLaboratories(coordinator, round, [laboratoryId], 'invited');
  await cancelRound(coordinator, round, 'No material.');
  expect(await subjects(db)).toEqual(['Invitation to Maize 1', 'Maize 1 is cancelled']);
});

it('writes of scores only to laboratories that took part', async () => {
  const db = await testDatabase();
  const open = await openWithManagers(db, 1);
  const invited = await addLaboratory(db, 'Never answered');
  await addPerson(db, { name: 'Nils Ohm', roles: [['lab_manager', invited]] });
  await enrolLaboratories(open.coordinator, open.round, [invited], 'invited');
  await send(open, 0, csvOf('8.4'));
  await publish(db, open);
  const told = await db('outbox').where('subject', 'like', 'Scores of%').select('to_address');
  expect(told).toEqual([{ to_address: 'mona.1@basin.example' }]);
});

it('logs at the close who was missing and what the date was', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 2);
  await loadResults(planned, [10]);
  await closeRound(planned.coordinator, planned.round);
  const line = await db('audit_log').where({ action: 'round.closed' }).first('detail');
  expect(line.detail).toBe(`1 of 2 had sent results; the closing date was ${ROUND.closesAt}`);
});

it('does not count what a laboratory sent before it was withdrawn', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 2);
  await loadResults(planned, [10, 11]);
  await moveEnrolment(planned.coordinator, planned.round, planned.laboratoryIds[0] ?? 0, 'withdrawn', 'Lost');
  expect(await listRounds(db)).toMatchObject([{ participantCount: 1, submittedCount: 1 }]);
});

it('leaves no trace of a step that was refused', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  const { items } = await getRoundPlan(round);
  await dropTestItem(coordinator, round, items[0]?.id ?? 0);
  const before = await logOf(db);
  await expect(openRound(coordinator, round)).rejects.toMatchObject({ code: 'blocked' });
  expect(await logOf(db)).toEqual(before);
  expect(await getRound(round)).toMatchObject({ state: 'draft', openedAt: null });
});
