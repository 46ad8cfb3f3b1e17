import 'server-only';
import knex, { type Knex } from 'knex';
import { knexConfig } from './config';

export type Db = Knex;

const holder = globalThis as typeof globalThis & { assizeDb?: Knex };

/** The process's one connection pool; it survives a reload of the module in development. */
export function db(): Db {
  holder.assizeDb ??= knex(knexConfig());
  return holder.assizeDb;
}
