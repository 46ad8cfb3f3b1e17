import type { Knex } from 'knex';
import { beforeEach, describe, expect, it } from 'vitest';
import { findActorBySession } from '@/db/views/actor-view';
import type { Actor, ProviderRole } from '@/lib/rules/roles';
import {
  changePerson,
  disablePerson,
  enablePerson,
  giveLaboratoryRole,
  invitePerson,
  sendNewLink,
  takeLaboratoryRole,
} from '@/lib/services/people';
import { findLinkHolder } from '@/lib/services/passwords';
import { testDatabase } from '../../db/test-database';
import {
  actorOf,
  addLaboratory,
  addPerson,
  emailOf,
  lastLinkToken,
  logOf,
  newActor,
} from '../people-fixture';

let db: Knex;
let mill: number;
let admin: Actor;

beforeEach(async () => {
  db = await testDatabase();
  mill = await addLaboratory(db, 'Lower Mill');
  admin = await newActor(db, { name: 'Ada Brook', roles: ['administrator'] });
});

function invitation(over: Partial<Parameters<typeof invitePerson>[1]> = {}) {
  const providerRoles: ProviderRole[] = [];
  return {
    name: 'Cy Reed',
    email: emailOf('Cy Reed'),
    providerRoles,
    laboratoryId: null,
    laboratoryRole: 'analyst' as const,
    ...over,
  };
}

function rolesOf(userId: number): Promise<{ role: string; laboratory_id: number | null }[]> {
  return db('memberships').where({ user_id: userId }).orderBy('id').select('role', 'laboratory_id');
}

describe('inviting', () => {
  it('makes an account without a password, with roles and a link', async () => {
    const { userId } = await invitePerson(
      admin,
      invitation({ providerRoles: ['reviewer', 'coordinator'], laboratoryId: mill }),
    );
    expect(await rolesOf(userId)).toEqual([
      { role: 'reviewer', laboratory_id: null },
      { role: 'coordinator', laboratory_id: null },
      { role: 'analyst', laboratory_id: mill },
    ]);
    expect(await findLinkHolder(await lastLinkToken(db), 'welcome')).toMatchObject({
      id: userId,
      hasPassword: false,
    });
    expect((await logOf(db)).map((row) => row.action)).toEqual(Array(3).fill('person.role-given'));
  });

  it('gives someone who is known just the new role, and says so by mail', async () => {
    const userId = await addPerson(db, { name: 'Cy Reed', roles: ['reviewer'] });
    await invitePerson(admin, invitation({ name: 'Another Name', laboratoryId: mill }));
    expect(await rolesOf(userId)).toHaveLength(2);
    expect(await db('users').where({ id: userId }).first()).toMatchObject({ name: 'Cy Reed' });
    const mail = await db('outbox').select('subject', 'body');
    expect(mail).toHaveLength(1);
    expect(mail[0].subject).toBe('Access to Lower Mill in Assize');
    expect(mail[0].body).not.toContain('/welcome/');
  });

  it('refuses a role held already, a disabled account and an unknown laboratory, and stores nothing', async () => {
    const known = await addPerson(db, { name: 'Cy Reed', roles: ['reviewer'] });
    await expect(invitePerson(admin, invitation({ providerRoles: ['reviewer'] }))).rejects.toMatchObject({
      code: 'conflict',
    });
    await disablePerson(admin, known);
    await expect(invitePerson(admin, invitation({ laboratoryId: mill }))).rejects.toMatchObject({
      code: 'conflict',
    });
    const stranger = invitation({
      email: emailOf('New One'),
      providerRoles: ['reviewer'],
      laboratoryId: 999,
    });
    await expect(invitePerson(admin, stranger)).rejects.toMatchObject({ code: 'not-found' });
    expect(await db('users').where({ email: emailOf('New One') })).toEqual([]);
    expect(await db('outbox').select()).toEqual([]);
  });
});

describe('roles', () => {
  it('are set and taken at the provider without touching laboratories', async () => {
    const userId = await addPerson(db, { name: 'Cy Reed', roles: ['reviewer', ['analyst', mill]] });
    await changePerson(admin, { userId, name: 'Cyra Reed', providerRoles: ['coordinator'] });
    expect(await rolesOf(userId)).toEqual([
      { role: 'analyst', laboratory_id: mill },
      { role: 'coordinator', laboratory_id: null },
    ]);
    expect(await db('users').where({ id: userId }).first()).toMatchObject({ name: 'Cyra Reed' });
  });

  it('are given and taken at a laboratory', async () => {
    const userId = await addPerson(db, { name: 'Cy Reed', roles: ['reviewer'] });
    await giveLaboratoryRole(admin, { userId, laboratoryId: mill, role: 'lab_manager' });
    expect(await rolesOf(userId)).toContainEqual({ role: 'lab_manager', laboratory_id: mill });
    await takeLaboratoryRole(admin, { userId, laboratoryId: mill, role: 'lab_manager' });
    expect(await rolesOf(userId)).toEqual([{ role: 'reviewer', laboratory_id: null }]);
    await expect(
      takeLaboratoryRole(admin, { userId, laboratoryId: mill, role: 'lab_manager' }),
    ).rejects.toMatchObject({ code: 'not-found' });
  });
});

describe('the last administrator', () => {
  const self = () => admin.userId ?? 0;

  it('can be neither disabled nor lose the role', async () => {
    await expect(disablePerson(admin, self())).rejects.toMatchObject({ code: 'conflict' });
    await expect(
      changePerson(admin, { userId: self(), name: 'Ada Brook', providerRoles: ['coordinator'] }),
    ).rejects.toMatchObject({ code: 'conflict' });
    expect(await rolesOf(self())).toEqual([{ role: 'administrator', laboratory_id: null }]);
  });

  it('is not counted among those who cannot sign in yet or any more', async () => {
    await addPerson(db, { name: 'In Vited', roles: ['administrator'], invited: true });
    const disabled = await addPerson(db, { name: 'Di Weir', roles: ['administrator'] });
    await disablePerson(admin, disabled);
    await expect(disablePerson(admin, self())).rejects.toMatchObject({ code: 'conflict' });
    await enablePerson(admin, disabled);
    await disablePerson(admin, self());
    expect(await db('users').where({ id: self() }).first()).toMatchObject({ is_disabled: 1 });
  });
});

describe('disabling', () => {
  it('ends every session and link at once', async () => {
    const userId = await addPerson(db, { name: 'Cy Reed', roles: ['reviewer'] });
    const { sessionId } = await actorOf(db, userId);
    await sendNewLink(admin, userId);
    const token = await lastLinkToken(db);
    await disablePerson(admin, userId);
    expect(await findActorBySession(db, sessionId)).toBeNull();
    await enablePerson(admin, userId);
    expect(await findActorBySession(db, sessionId)).toBeNull();
    expect(await findLinkHolder(token, 'reset')).toBeNull();
  });
});

describe('a new link', () => {
  it('is an invitation or a reset, and makes the earlier one worthless', async () => {
    const invited = await addPerson(db, { name: 'In Vited', invited: true });
    await sendNewLink(admin, invited);
    const first = await lastLinkToken(db);
    await sendNewLink(admin, invited);
    expect(await findLinkHolder(first, 'welcome')).toBeNull();
    expect(await findLinkHolder(await lastLinkToken(db), 'welcome')).toMatchObject({ id: invited });
    const known = await addPerson(db, { name: 'Cy Reed' });
    expect(await sendNewLink(admin, known)).toEqual({ email: emailOf('Cy Reed') });
    expect(await findLinkHolder(await lastLinkToken(db), 'reset')).toMatchObject({ id: known });
  });

  it('is not sent to a disabled or unknown person', async () => {
    const userId = await addPerson(db, { name: 'Cy Reed' });
    await disablePerson(admin, userId);
    await expect(sendNewLink(admin, userId)).rejects.toMatchObject({ code: 'conflict' });
    await expect(sendNewLink(admin, 9_999)).rejects.toMatchObject({ code: 'not-found' });
  });
});
