import type { Knex } from 'knex';
import { beforeEach, expect, it } from 'vitest';
import { findActorBySession } from '@/db/views/actor-view';
import { countSessions, signOut, signOutEverywhere, switchLaboratory } from '@/lib/services/account';
import { changePassword } from '@/lib/services/passwords';
import { signIn } from '@/lib/services/sign-in';
import { testDatabase } from '../../db/test-database';
import { actorOf, addLaboratory, addPerson, emailOf, logOf, PASSWORD } from '../people-fixture';

const NEW_PASSWORD = 'the mill by the river';

let db: Knex;
let userId: number;
let mill: number;
let harbour: number;

beforeEach(async () => {
  db = await testDatabase();
  mill = await addLaboratory(db, 'Lower Mill');
  harbour = await addLaboratory(db, 'Harbour');
  userId = await addPerson(db, {
    name: 'Bo Miller',
    roles: [
      ['lab_manager', mill],
      ['analyst', harbour],
    ],
  });
});

it('starts at the first laboratory by name and moves to another one', async () => {
  const session = await actorOf(db, userId);
  expect(session.actor.laboratoryId).toBe(harbour);
  await switchLaboratory(session, mill);
  expect((await findActorBySession(db, session.sessionId))?.laboratoryId).toBe(mill);
});

it('begins the next session where the last one was', async () => {
  await switchLaboratory(await actorOf(db, userId), mill);
  expect((await actorOf(db, userId)).actor.laboratoryId).toBe(mill);
});

it('refuses a laboratory the person does not belong to, and writes it down', async () => {
  const foreign = await addLaboratory(db, 'Upper Dairy');
  const session = await actorOf(db, userId);
  for (const id of [foreign, 9_999]) {
    await expect(switchLaboratory(session, id)).rejects.toMatchObject({ code: 'not-found' });
  }
  expect((await findActorBySession(db, session.sessionId))?.laboratoryId).toBe(harbour);
  expect((await logOf(db)).map(({ action, outcome }) => [action, outcome])).toEqual([
    ['laboratory.chosen', 'refused'],
    ['laboratory.chosen', 'refused'],
  ]);
});

it('falls back to another laboratory when the role at the chosen one is gone', async () => {
  const session = await actorOf(db, userId);
  await switchLaboratory(session, mill);
  await db('memberships').where({ user_id: userId, laboratory_id: mill }).delete();
  expect((await findActorBySession(db, session.sessionId))?.laboratoryId).toBe(harbour);
});

it('signs out here, or everywhere', async () => {
  const one = await actorOf(db, userId);
  const two = await actorOf(db, userId);
  const three = await actorOf(db, userId);
  expect(await countSessions(one.actor)).toBe(3);
  await signOut(one);
  expect(await findActorBySession(db, one.sessionId)).toBeNull();
  expect(await findActorBySession(db, two.sessionId)).not.toBeNull();
  await signOutEverywhere(two);
  for (const { sessionId } of [two, three]) expect(await findActorBySession(db, sessionId)).toBeNull();
  expect(await logOf(db)).toMatchObject([
    { action: 'sign-out' },
    { action: 'sign-out.everywhere', detail: '2 sessions' },
  ]);
});

it('changes the password, ending every session but the one it is done in', async () => {
  const here = await actorOf(db, userId);
  const there = await actorOf(db, userId);
  await changePassword(here.actor, {
    sessionId: here.sessionId,
    currentPassword: PASSWORD,
    password: NEW_PASSWORD,
  });
  expect(await findActorBySession(db, here.sessionId)).not.toBeNull();
  expect(await findActorBySession(db, there.sessionId)).toBeNull();
  await expect(signIn({ email: emailOf('Bo Miller'), password: NEW_PASSWORD })).resolves.toMatchObject({
    userId,
  });
});

it('changes nothing when the present password is wrong or the new one is weak', async () => {
  const { actor, sessionId } = await actorOf(db, userId);
  await expect(
    changePassword(actor, { sessionId, currentPassword: 'a guess', password: NEW_PASSWORD }),
  ).rejects.toMatchObject({ code: 'invalid', fieldErrors: { currentPassword: expect.any(String) } });
  await expect(
    changePassword(actor, { sessionId, currentPassword: PASSWORD, password: 'short' }),
  ).rejects.toMatchObject({ code: 'invalid', fieldErrors: { password: expect.any(String) } });
  await expect(signIn({ email: emailOf('Bo Miller'), password: PASSWORD })).resolves.toMatchObject({
    userId,
  });
  expect(await logOf(db)).toMatchObject([
    { action: 'password.changed', outcome: 'refused' },
    { action: 'sign-in' },
  ]);
});
