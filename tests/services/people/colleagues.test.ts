import type { Knex } from 'knex';
import { beforeEach, expect, it } from 'vitest';
import type { Actor } from '@/lib/rules/roles';
import {
  inviteColleague,
  inviteColleagueAgain,
  listOwnPeople,
  removeColleague,
} from '@/lib/services/colleagues';
import { findLinkHolder } from '@/lib/services/passwords';
import { testDatabase } from '../../db/test-database';
import { addLaboratory, addPerson, emailOf, lastLinkToken, logOf, newActor } from '../people-fixture';

let db: Knex;
let mill: number;
let harbour: number;
let manager: Actor;

beforeEach(async () => {
  db = await testDatabase();
  mill = await addLaboratory(db, 'Lower Mill');
  harbour = await addLaboratory(db, 'Harbour');
  manager = await newActor(db, { name: 'Mo Weir', roles: [['lab_manager', mill]] });
});

it('lists the people of the own laboratory with their roles there only', async () => {
  await addPerson(db, {
    name: 'Bo Miller',
    roles: [['analyst', mill], ['lab_manager', harbour], 'reviewer'],
  });
  await addPerson(db, { name: 'Hal Pier', roles: [['analyst', harbour]] });
  expect(await listOwnPeople(manager)).toMatchObject([
    { name: 'Bo Miller', roles: ['analyst'], hasPassword: true },
    { name: 'Mo Weir', roles: ['lab_manager'] },
  ]);
});

it('invites to the own laboratory', async () => {
  await inviteColleague(manager, { name: 'Cy Reed', email: emailOf('Cy Reed'), role: 'analyst' });
  const person = await findLinkHolder(await lastLinkToken(db), 'welcome');
  expect(person).toMatchObject({ name: 'Cy Reed', email: emailOf('Cy Reed') });
  expect(await db('memberships').where({ user_id: person?.id }).select('role', 'laboratory_id')).toEqual([
    { role: 'analyst', laboratory_id: mill },
  ]);
  expect(await logOf(db)).toMatchObject([{ action: 'person.role-given', laboratory_id: mill }]);
});

it('sends an invitation again, but no link to someone with an account', async () => {
  const invited = await addPerson(db, { name: 'Cy Reed', roles: [['analyst', mill]], invited: true });
  await inviteColleagueAgain(manager, invited);
  expect(await findLinkHolder(await lastLinkToken(db), 'welcome')).toMatchObject({ id: invited });
  const known = await addPerson(db, { name: 'Bo Miller', roles: [['analyst', mill]] });
  await expect(inviteColleagueAgain(manager, known)).rejects.toMatchObject({ code: 'conflict' });
});

it('does not let one laboratory flood a mailbox', async () => {
  const invited = await addPerson(db, { name: 'Cy Reed', roles: [['analyst', mill]], invited: true });
  for (let time = 0; time < 3; time += 1) await inviteColleagueAgain(manager, invited);
  await expect(inviteColleagueAgain(manager, invited)).rejects.toMatchObject({ code: 'too-many' });
  expect(await db('outbox').select()).toHaveLength(3);
});

it('removes a role at the own laboratory and leaves the others', async () => {
  const userId = await addPerson(db, {
    name: 'Bo Miller',
    roles: [
      ['analyst', mill],
      ['analyst', harbour],
    ],
  });
  await removeColleague(manager, { userId, role: 'analyst' });
  expect(await db('memberships').where({ user_id: userId }).pluck('laboratory_id')).toEqual([harbour]);
});

it('keeps the last manager who can sign in', async () => {
  await addPerson(db, { name: 'In Vited', roles: [['lab_manager', mill]], invited: true });
  const self = { userId: manager.userId ?? 0, role: 'lab_manager' as const };
  await expect(removeColleague(manager, self)).rejects.toMatchObject({ code: 'conflict' });
  await addPerson(db, { name: 'Second Manager', roles: [['lab_manager', mill]] });
  await removeColleague(manager, self);
  expect(await db('memberships').where({ user_id: manager.userId })).toEqual([]);
});

it('finds nobody of another laboratory', async () => {
  const stranger = await addPerson(db, { name: 'Hal Pier', roles: [['analyst', harbour]], invited: true });
  await expect(removeColleague(manager, { userId: stranger, role: 'analyst' })).rejects.toMatchObject({
    code: 'not-found',
  });
  await expect(inviteColleagueAgain(manager, stranger)).rejects.toMatchObject({ code: 'not-found' });
  await expect(removeColleague(manager, { userId: 9_999, role: 'analyst' })).rejects.toMatchObject({
    code: 'not-found',
  });
  expect(await db('outbox').select()).toEqual([]);
});

it('is for people who belong to a laboratory', async () => {
  const staff = await newActor(db, { name: 'Ada Brook', roles: ['administrator'] });
  await expect(listOwnPeople(staff)).rejects.toMatchObject({ code: 'forbidden' });
});
