import { createHash, randomBytes } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import knex, { type Knex } from 'knex';
import { afterAll, afterEach } from 'vitest';
import { knexConfig } from '@/db/config';
import { DATABASE_FILE } from '@/lib/env';

const MIGRATIONS = path.join(process.cwd(), 'migrations');
const holder = globalThis as typeof globalThis & { assizeDb?: Knex };

const closeAfterTest: (() => Promise<void>)[] = [];
const closeAfterFile: (() => Promise<void>)[] = [];

afterEach(async () => {
  for (const close of closeAfterTest.splice(0)) await close();
});
afterAll(async () => {
  for (const close of closeAfterFile.splice(0)) await close();
});

/**
 * A migrated, empty database in a folder of its own, which also becomes ASSIZE_DATA_DIR and what db() gives. It is
 * closed and removed after the test, or after the file when `for` says so (for beforeAll).
 */
export async function testDatabase(options: { for?: 'test' | 'file' } = {}): Promise<Knex> {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'assize-test-'));
  const file = path.join(folder, DATABASE_FILE);
  fs.copyFileSync(await migratedFile(), file);
  const connection = knex(knexConfig(file));
  process.env.ASSIZE_DATA_DIR = folder;
  holder.assizeDb = connection;
  const close = async () => {
    await connection.destroy();
    if (holder.assizeDb === connection) delete holder.assizeDb;
    fs.rmSync(folder, { recursive: true, force: true });
  };
  if (options.for === 'file') closeAfterFile.push(close);
  else closeAfterTest.push(close);
  return connection;
}

/** An empty file for tests of the migrations themselves. */
export function emptyDatabase(): Knex {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'assize-test-'));
  const connection = knex(knexConfig(path.join(folder, DATABASE_FILE)));
  closeAfterTest.push(async () => {
    await connection.destroy();
    fs.rmSync(folder, { recursive: true, force: true });
  });
  return connection;
}

/** Migrated once for each state of the migrations, then copied; workers that race each make one and the last name wins. */
async function migratedFile(): Promise<string> {
  const base = path.join(os.tmpdir(), `assize-migrated-${hashOfMigrations()}.sqlite`);
  if (fs.existsSync(base)) return base;
  const draft = `${base}.${randomBytes(4).toString('hex')}`;
  const connection = knex(knexConfig(draft));
  await connection.migrate.latest();
  // Closing the only connection folds the write-ahead log into the file, so that it can be copied alone.
  await connection.destroy();
  fs.renameSync(draft, base);
  return base;
}

function hashOfMigrations(): string {
  const hash = createHash('sha256');
  for (const name of fs.readdirSync(MIGRATIONS).sort()) {
    hash.update(name).update(fs.readFileSync(path.join(MIGRATIONS, name)));
  }
  return hash.digest('hex').slice(0, 16);
}
