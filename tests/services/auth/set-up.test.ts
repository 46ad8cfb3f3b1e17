import type { Knex } from 'knex';
import { beforeEach, expect, it } from 'vitest';
import { isSetUpOpen, setUp } from '@/lib/services/set-up';
import { signIn } from '@/lib/services/sign-in';
import { testDatabase } from '../../db/test-database';
import { addPerson, PASSWORD } from '../people-fixture';

const INPUT = {
  name: 'Ada Brook',
  email: 'ada@basin.example',
  password: PASSWORD,
  passwordAgain: PASSWORD,
  isCoordinator: true,
};

let db: Knex;
beforeEach(async () => {
  db = await testDatabase();
});

it('makes the first administrator, who can sign in', async () => {
  expect(await isSetUpOpen()).toBe(true);
  const { userId } = await setUp(INPUT);
  expect(await db('memberships').orderBy('id').select('user_id', 'role', 'laboratory_id')).toEqual([
    { user_id: userId, role: 'administrator', laboratory_id: null },
    { user_id: userId, role: 'coordinator', laboratory_id: null },
  ]);
  expect(await isSetUpOpen()).toBe(false);
  await expect(signIn(INPUT)).resolves.toMatchObject({ userId });
});

it('leaves the coordinator role out when it is not wanted', async () => {
  await setUp({ ...INPUT, isCoordinator: false });
  expect(await db('memberships').pluck('role')).toEqual(['administrator']);
});

it('is refused from then on, even when every account were gone', async () => {
  await setUp(INPUT);
  await expect(setUp({ ...INPUT, email: 'second@basin.example' })).rejects.toMatchObject({
    code: 'conflict',
  });
  await db('memberships').delete();
  await db.raw('drop trigger audit_log_no_delete');
  await db('audit_log').delete();
  await db('users').delete();
  await expect(setUp(INPUT)).rejects.toMatchObject({ code: 'conflict' });
});

it('is refused where there are accounts from elsewhere', async () => {
  await addPerson(db, { name: 'Bo Miller' });
  expect(await isSetUpOpen()).toBe(false);
  await expect(setUp(INPUT)).rejects.toMatchObject({ code: 'conflict' });
});

it('lets one of two people who send the form at the same moment through', async () => {
  const tries = await Promise.allSettled([setUp(INPUT), setUp({ ...INPUT, email: 'second@basin.example' })]);
  expect(tries.map((entry) => entry.status).sort()).toEqual(['fulfilled', 'rejected']);
  expect(await db('users').select()).toHaveLength(1);
});

it('wants a good password', async () => {
  await expect(setUp({ ...INPUT, password: 'password1234' })).rejects.toMatchObject({ code: 'invalid' });
  expect(await isSetUpOpen()).toBe(true);
});
