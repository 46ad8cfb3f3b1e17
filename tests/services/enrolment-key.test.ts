import { expect, it } from 'vitest';
import { listLaboratoriesToAdd, listParticipantsFor } from '@/lib/services/participant-key';
import { confirmReceipt, enrolLaboratories, moveEnrolment } from '@/lib/services/enrolments';
import { getRoundLog } from '@/lib/services/round-log';
import { closeRound } from '@/lib/services/round-steps';
import { testDatabase } from '../db/test-database';
import { addLaboratory, newActor } from './people-fixture';
import { loadResults, logOf, openWithLaboratories, planRound } from './round-fixture';

it('gives each laboratory a code of its own and takes 300 at once', async () => {
  const db = await testDatabase();
  const { coordinator, round, laboratoryIds } = await openWithLaboratories(db, 300);
  const participants = await listParticipantsFor(coordinator, round);
  expect(new Set(participants.map(({ participantCode }) => participantCode)).size).toBe(300);
  expect(participants.every(({ participantCode }) => /^\d{4}$/.test(participantCode))).toBe(true);
  expect(await enrolLaboratories(coordinator, round, laboratoryIds, 'invited')).toEqual({ added: 0 });
});

it('offers only active laboratories that are not in the round yet', async () => {
  const db = await testDatabase();
  const { round } = await openWithLaboratories(db, 2);
  await addLaboratory(db, 'Outside');
  await db('laboratories').insert({
    name: 'Gone',
    kind: '',
    town: '',
    is_active: 0,
    created_at: new Date().toISOString(),
  });
  expect((await listLaboratoriesToAdd(round)).map(({ name }) => name)).toEqual(['Outside']);
});

it('adds all laboratories of a list or none', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  const known = await addLaboratory(db, 'Mill 1');
  await expect(enrolLaboratories(coordinator, round, [known, 999], 'enrolled')).rejects.toMatchObject({
    code: 'not-found',
  });
  expect(await listParticipantsFor(coordinator, round)).toEqual([]);
});

it('logs a look at the key once an hour and person, not with every reload', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await openWithLaboratories(db, 1);
  const reviewer = await newActor(db, { name: 'Rhys Alder', roles: ['reviewer'] });
  for (const actor of [coordinator, coordinator, reviewer]) await listParticipantsFor(actor, round);
  const looks: { user_id: number }[] = await db('audit_log')
    .where({ action: 'key.viewed' })
    .select('user_id');
  expect(looks.map((look) => look.user_id)).toEqual([coordinator.userId, reviewer.userId]);
});

it('shows codes without names to those who may not see the key, in an order that tells nothing', async () => {
  const db = await testDatabase();
  const { round } = await openWithLaboratories(db, 8);
  const administrator = await newActor(db, { name: 'Ada Birch', roles: ['administrator'] });
  const seen = await listParticipantsFor(administrator, round);
  expect(seen).toHaveLength(8);
  expect(JSON.stringify(seen)).not.toContain('Mill');
  expect(seen.every((entry) => entry.laboratoryId === 0 && entry.laboratoryName === null)).toBe(true);
  const codes = seen.map(({ participantCode }) => participantCode);
  expect(codes).toEqual([...codes].sort());
  expect(await logOf(db)).not.toContain('key.viewed');
});

it('gives those without the key nothing that leads from a code to a line with a name', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 3);
  await loadResults(planned, [10, 11, 12]);
  const administrator = await newActor(db, { name: 'Ada Birch', roles: ['administrator'] });
  const [entry] = await listParticipantsFor(administrator, planned.round);
  // Times, receipts and the order of the rows also stand in the log of the installation, beside the names.
  expect(entry).toMatchObject({ enrolmentId: 0, submittedAt: null, receiptCode: null, resultCount: null });
  const { lines } = await getRoundLog(administrator, planned.round);
  expect(lines.filter(({ action }) => action === 'enrolment.enrolled')).toHaveLength(3);
  expect(lines.every(({ participantCode }) => participantCode === null)).toBe(true);
  const forCoordinator = await getRoundLog(planned.coordinator, planned.round);
  expect(forCoordinator.lines.filter(({ participantCode }) => participantCode !== null)).toHaveLength(3);
});

it('withdraws with a reason, lets the laboratory in again, and refuses a move that makes no sense', async () => {
  const db = await testDatabase();
  const { coordinator, round, laboratoryIds } = await openWithLaboratories(db, 1);
  const [laboratoryId = 0] = laboratoryIds;
  await expect(moveEnrolment(coordinator, round, laboratoryId, 'invited')).rejects.toMatchObject({
    code: 'conflict',
  });
  await moveEnrolment(coordinator, round, laboratoryId, 'withdrawn', 'The parcel was lost.');
  expect(await listParticipantsFor(coordinator, round)).toMatchObject([
    { state: 'withdrawn', reason: 'The parcel was lost.' },
  ]);
  await expect(confirmReceipt(coordinator, round, laboratoryId)).rejects.toMatchObject({ code: 'not-found' });
  await moveEnrolment(coordinator, round, laboratoryId, 'enrolled');
  expect(await listParticipantsFor(coordinator, round)).toMatchObject([{ state: 'enrolled' }]);
});

it('fixes the participants at the close', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 1);
  const { coordinator, round, laboratoryIds } = planned;
  await loadResults(planned, [10]);
  await closeRound(coordinator, round);
  const later = await addLaboratory(db, 'Late mill');
  await expect(enrolLaboratories(coordinator, round, [later], 'enrolled')).rejects.toMatchObject({
    code: 'conflict',
  });
  await expect(
    moveEnrolment(coordinator, round, laboratoryIds[0] ?? 0, 'withdrawn', 'Too late'),
  ).rejects.toMatchObject({ code: 'conflict' });
});
