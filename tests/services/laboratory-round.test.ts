import { describe, expect, it } from 'vitest';
import { enrolLaboratories, moveEnrolment } from '@/lib/services/enrolments';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { answerInvitation } from '@/lib/services/invitation-answers';
import { getDesk } from '@/lib/services/laboratory-desk';
import { getOwnRound } from '@/lib/services/laboratory-round';
import { getTrend } from '@/lib/services/laboratory-trend';
import { findOwnScores, getOwnEntry, getOwnFigureWorking } from '@/lib/services/own-scores';
import { cancelRound, closeRound } from '@/lib/services/round-steps';
import { testDatabase } from '../db/test-database';
import { at, csvOf, openWithManagers, publish, send } from './laboratory-fixture';
import { addLaboratory, newActor } from './people-fixture';
import { inDays, planRound } from './round-fixture';

const now = () => new Date().toISOString();

describe("a laboratory's own round", () => {
  it('shows the plan and its own submissions, and nothing of the others', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 2);
    await send(open, 0, csvOf('8.4'));
    await send(open, 1, csvOf('123.4'));
    const own = await getOwnRound(open.round, at(open, 0).laboratoryId, now());
    expect(own.items).toMatchObject([{ code: 'M1' }]);
    expect(own.measurands).toMatchObject([{ code: 'AFT', unit: 'ug/kg' }]);
    expect(own.receipts).toHaveLength(1);
    expect(own.whyNoResults).toBeNull();
    const text = JSON.stringify(own);
    for (const other of ['Mill 2', '123.4', 'participantCount', 'submittedCount']) {
      expect(text).not.toContain(other);
    }
  });

  it('is not found without a part in it', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const stranger = await addLaboratory(db, 'Elsewhere');
    await expect(getOwnRound(open.round, stranger, now())).rejects.toMatchObject({ code: 'not-found' });
    await expect(getOwnRound('nowhere', at(open, 0).laboratoryId, now())).rejects.toMatchObject({
      code: 'not-found',
    });
  });

  it('keeps a round loaded after the event to the provider until it is published', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1, {
      isPast: true,
      opensAt: inDays(-30),
      dispatchAt: inDays(-30),
      closesAt: inDays(-10),
      publishAt: inDays(-1),
    });
    const { laboratoryId } = at(open, 0);
    await expect(getOwnRound(open.round, laboratoryId, now())).rejects.toMatchObject({ code: 'not-found' });
    expect((await getDesk(laboratoryId, now())).due).toEqual([]);
  });

  it('says why results are not taken', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 2);
    const why = async (place: number, at_ = now()) =>
      (await getOwnRound(open.round, at(open, place).laboratoryId, at_)).whyNoResults;
    expect(await why(0, inDays(21))).toBe('The time for results has passed.');
    await moveEnrolment(open.coordinator, open.round, at(open, 1).laboratoryId, 'withdrawn');
    expect(await why(1)).toBe('Your laboratory is withdrawn in this round.');
    await send(open, 0, csvOf('8.4'));
    await closeRound(open.coordinator, open.round);
    expect(await why(0)).toBe('The round no longer takes results.');
  });
});

describe('answering an invitation', () => {
  async function invited() {
    const db = await testDatabase();
    const { coordinator, round } = await planRound(db);
    const laboratoryId = await addLaboratory(db, 'Mill 1');
    const manager = await newActor(db, { name: 'Mona', roles: [['lab_manager', laboratoryId]] });
    await enrolLaboratories(coordinator, round, [laboratoryId], 'invited');
    const state = async () => (await db('enrolments').first('state', 'reason')) as object;
    return { db, coordinator, round, laboratoryId, manager, state };
  }

  it('accepts, declines with a reason and accepts after all', async () => {
    const { manager, round, laboratoryId, state, db } = await invited();
    await answerInvitation(manager, round, laboratoryId, 'declined', 'No time');
    expect(await state()).toEqual({ state: 'declined', reason: 'No time' });
    await answerInvitation(manager, round, laboratoryId, 'enrolled');
    await answerInvitation(manager, round, laboratoryId, 'enrolled');
    expect(await state()).toMatchObject({ state: 'enrolled' });
    const log = await db('audit_log').where('action', 'like', 'enrolment.%').orderBy('id').pluck('action');
    expect(log).toEqual(['enrolment.invited', 'enrolment.declined', 'enrolment.enrolled']);
  });

  it('cannot undo a withdrawal or leave a round it takes part in', async () => {
    const { manager, coordinator, round, laboratoryId, state } = await invited();
    await answerInvitation(manager, round, laboratoryId, 'enrolled');
    await expect(answerInvitation(manager, round, laboratoryId, 'declined')).rejects.toMatchObject({
      code: 'conflict',
    });
    await moveEnrolment(coordinator, round, laboratoryId, 'withdrawn');
    await expect(answerInvitation(manager, round, laboratoryId, 'enrolled')).rejects.toMatchObject({
      code: 'conflict',
    });
    expect(await state()).toMatchObject({ state: 'withdrawn' });
  });

  it('is too late after the close and not found for a laboratory that was not invited', async () => {
    const { db, manager, coordinator, round, laboratoryId } = await invited();
    const stranger = await addLaboratory(db, 'Elsewhere');
    await expect(answerInvitation(manager, round, stranger, 'enrolled')).rejects.toMatchObject({
      code: 'not-found',
    });
    await cancelRound(coordinator, round, 'No material');
    await expect(answerInvitation(manager, round, laboratoryId, 'enrolled')).rejects.toMatchObject({
      code: 'conflict',
    });
  });
});

describe('own scores', () => {
  const VALUES = ['8.0', '8.4', '8.8', '9.0', '20'];

  async function published() {
    const db = await testDatabase();
    const open = await openWithManagers(db, VALUES.length + 1);
    for (const [place, value] of VALUES.entries()) await send(open, place, csvOf(value));
    return { db, open };
  }

  it('are told after publication, and not an hour before', async () => {
    const { db, open } = await published();
    const own = at(open, 4).laboratoryId;
    expect(await findOwnScores(open.round, own)).toBeNull();
    await closeRound(open.coordinator, open.round);
    expect(await findOwnScores(open.round, own)).toBeNull();
    expect((await getTrend(own, null)).chosen).toBeNull();
    await db('rounds').update({ state: 'open' });
    await publish(db, open);
    const scores = await findOwnScores(open.round, own);
    expect(scores?.entries[0]?.scored).toMatchObject({ value: 20, signal: 'action' });
    expect(scores?.entries[0]?.scored?.participant).toBe(scores?.ownCode);
  });

  it('are empty for a participant that sent nothing, and not found for others', async () => {
    const { db, open } = await published();
    await publish(db, open);
    const idle = await findOwnScores(open.round, at(open, 5).laboratoryId);
    expect(idle?.entries).toMatchObject([{ scored: null, censored: null }]);
    const stranger = await addLaboratory(db, 'Elsewhere');
    expect(await findOwnScores(open.round, stranger)).toBeNull();
    const id = idle?.entries[0]?.plan.id ?? 0;
    await expect(getOwnEntry(open.round, stranger, id)).rejects.toMatchObject({ code: 'not-found' });
    await expect(getOwnEntry(open.round, at(open, 0).laboratoryId, id + 1)).rejects.toMatchObject({
      code: 'not-found',
    });
  });

  it('open their working to participants, after publication', async () => {
    const { db, open } = await published();
    const [{ id }] = await db('round_measurands').select('id');
    const own = at(open, 0).laboratoryId;
    await closeRound(open.coordinator, open.round);
    await evaluateRound(open.coordinator, open.round);
    await expect(getOwnFigureWorking(open.round, own, id, 'assigned')).rejects.toMatchObject({
      code: 'not-found',
    });
    await db('rounds').update({ state: 'published' });
    const steps = await getOwnFigureWorking(open.round, own, id, 'assigned');
    expect(steps.at(-1)).toMatchObject({ name: 'Assigned value x_pt' });
    const stranger = await addLaboratory(db, 'Elsewhere');
    await expect(getOwnFigureWorking(open.round, stranger, id, 'assigned')).rejects.toMatchObject({
      code: 'not-found',
    });
  });

  it('are hidden from a laboratory that was withdrawn', async () => {
    const { db, open } = await published();
    const { laboratoryId } = at(open, 3);
    await moveEnrolment(open.coordinator, open.round, laboratoryId, 'withdrawn');
    await publish(db, open);
    expect(await findOwnScores(open.round, laboratoryId)).toBeNull();
    expect((await getDesk(laboratoryId, now())).past[0]?.signals).toEqual({
      none: 0,
      warning: 0,
      action: 0,
      'not-scored': 0,
    });
  });

  it('line up over time for their own laboratory only', async () => {
    const { db, open } = await published();
    await publish(db, open);
    const trend = await getTrend(at(open, 4).laboratoryId, null);
    expect(trend.chosen).toMatchObject({ code: 'AFT', count: 1, schemeName: 'Mycotoxins' });
    expect(trend.points).toMatchObject([{ roundName: 'Maize 1', item: 'M1', value: 20, signal: 'action' }]);
    await expect(getTrend(at(open, 5).laboratoryId, trend.chosen?.id ?? 0)).rejects.toMatchObject({
      code: 'not-found',
    });
  });

  it('name other participants by code only', async () => {
    const { db, open } = await published();
    await publish(db, open);
    const scores = await findOwnScores(open.round, at(open, 0).laboratoryId);
    const text = JSON.stringify(scores);
    expect(scores?.entries[0]?.evaluation.scores).toHaveLength(VALUES.length);
    for (const place of [2, 3, 4, 5, 6]) expect(text).not.toContain(`Mill ${place}`);
  });
});
