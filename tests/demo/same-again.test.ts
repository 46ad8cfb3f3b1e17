import type { Knex } from 'knex';
import { expect, test } from 'vitest';
import { createUser } from '@/db/user-store';
import { demoLaboratories, MOST_LABORATORIES } from '@/seeds/scenario/laboratories';
import { seedDemonstration } from '@/seeds/seed-demonstration';
import { testDatabase } from '../db/test-database';

const NOW = new Date('2026-12-01T10:00:00Z');

/** Every row of every table as text. Password hashes are salted afresh and so left out. */
async function allRows(connection: Knex): Promise<Record<string, string[]>> {
  const tables: { name: string }[] = await connection('sqlite_master')
    .where({ type: 'table' })
    .whereNot('name', 'like', 'knex_%')
    .whereNot('name', 'like', 'sqlite_%')
    .orderBy('name')
    .select('name');
  const rows: Record<string, string[]> = {};
  for (const { name } of tables) {
    const found: Record<string, unknown>[] = await connection(name);
    rows[name] = found.map((row) => JSON.stringify({ ...row, password_hash: undefined }));
  }
  return rows;
}

test('the same day gives the same rows in another database, and seeding again changes none', async () => {
  const first = await testDatabase();
  const told = await seedDemonstration(first, { now: NOW });
  const rows = await allRows(first);

  const second = await testDatabase();
  await seedDemonstration(second, { now: new Date('2026-12-01T10:00:00Z') });
  const others = await allRows(second);
  expect(Object.keys(others)).toEqual(Object.keys(rows));
  for (const [table, expected] of Object.entries(rows)) expect(others[table], table).toEqual(expected);

  const again = await seedDemonstration(first, { now: new Date('2027-03-01T10:00:00Z') });
  expect(told.seeded).toBe(true);
  expect(again).toEqual({ ...told, seeded: false });
  expect(await allRows(first)).toEqual(rows);
}, 120_000);

test('an installation with people of its own is left as it is', async () => {
  const connection = await testDatabase();
  await createUser(connection, { email: 'someone@laboratory.example', name: 'Someone' });
  const rows = await allRows(connection);
  const told = await seedDemonstration(connection, { now: NOW });
  expect(told).toEqual({ signIns: [], tokens: [], openRound: null, seeded: false });
  expect(await allRows(connection)).toEqual(rows);
});

test('a larger demonstration keeps the named laboratories and gives every other its own name', () => {
  const many = demoLaboratories(MOST_LABORATORIES);
  expect(many).toHaveLength(MOST_LABORATORIES);
  expect(MOST_LABORATORIES).toBeGreaterThanOrEqual(300);
  expect(new Set(many.map(({ name }) => name)).size).toBe(MOST_LABORATORIES);
  const usual = demoLaboratories(33);
  expect(many.slice(0, usual.length)).toEqual(usual);
});
