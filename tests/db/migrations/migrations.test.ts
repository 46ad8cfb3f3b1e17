import type { Knex } from 'knex';
import { expect, it } from 'vitest';
import { emptyDatabase } from '../test-database';

async function schemaOf(db: Knex): Promise<string[]> {
  const rows: { sql: string }[] = await db('sqlite_master')
    .whereNotNull('sql')
    .whereNot('name', 'like', 'sqlite_%')
    .whereNot('name', 'like', 'knex_%')
    .orderBy('name')
    .select('sql');
  return rows.map((row) => row.sql);
}

it('goes up from empty, down to empty and up again to the same schema', async () => {
  const db = emptyDatabase();
  await db.migrate.latest();
  const first = await schemaOf(db);
  expect(first.length).toBeGreaterThan(40);
  await db.migrate.rollback(undefined, true);
  expect(await schemaOf(db)).toEqual([]);
  await db.migrate.latest();
  expect(await schemaOf(db)).toEqual(first);
});

it('goes down and up again one migration at a time', async () => {
  const db = emptyDatabase();
  const [, applied] = (await db.migrate.latest()) as [number, string[]];
  const full = await schemaOf(db);
  for (const _name of applied) await db.migrate.down();
  expect(await schemaOf(db)).toEqual([]);
  for (const _name of applied) await db.migrate.up();
  expect(await schemaOf(db)).toEqual(full);
});

it('sets what SQLite needs on each connection', async () => {
  const db = emptyDatabase();
  expect(await db.raw('pragma foreign_keys')).toEqual([{ foreign_keys: 1 }]);
  expect(await db.raw('pragma journal_mode')).toEqual([{ journal_mode: 'wal' }]);
  expect(await db.raw('pragma busy_timeout')).toEqual([{ timeout: 15_000 }]);
});
