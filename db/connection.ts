import 'server-only';
import knex, { type Knex } from 'knex';
import path from 'node:path';
import { DATABASE_FILE, dataDirectory } from '@/lib/env';
import { knexConfig } from './config';

export type Db = Knex;

const holder = globalThis as typeof globalThis & { assizeDb?: Knex };

/** The process's one connection pool; it survives a reload of the module in development. */
export function db(): Db {
  holder.assizeDb ??= knex(knexConfig());
  return holder.assizeDb;
}

/** The file behind db(), for a connection in another thread. */
export function databaseFile(): string {
  return path.join(dataDirectory(), DATABASE_FILE);
}

/** A pool on a database file for a caller of its own, such as another thread, which destroys it when done. */
export function openDatabase(file: string): Db {
  return knex(knexConfig(file));
}
