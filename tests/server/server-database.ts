import path from 'node:path';
import knex, { type Knex } from 'knex';
import { knexConfig } from '@/db/config';
import { DATABASE_FILE } from '@/lib/env';

const holder = globalThis as typeof globalThis & { assizeDb?: Knex };

/** A second connection to a running server's database, which services called in the test use too. */
export function openServerDatabase(dataDir: string): Knex {
  const connection = knex(knexConfig(path.join(dataDir, DATABASE_FILE)));
  holder.assizeDb = connection;
  return connection;
}

export async function closeServerDatabase(connection: Knex): Promise<void> {
  await connection.destroy();
  if (holder.assizeDb === connection) delete holder.assizeDb;
}

const STORED = ['uploads', 'submissions', 'results'] as const;

export type StoredCounts = Record<(typeof STORED)[number], number>;

/** How many rows the tables of taken results have. */
export async function countStored(connection: Knex): Promise<StoredCounts> {
  const counts = { uploads: 0, submissions: 0, results: 0 };
  for (const table of STORED) {
    const row = await connection(table).count<{ n: number }[]>('* as n').first();
    counts[table] = Number(row?.n ?? 0);
  }
  return counts;
}
