import fs from 'node:fs';
import path from 'node:path';
import type { Knex } from 'knex';
import { DATABASE_FILE, dataDirectory } from '@/lib/env';

interface RawConnection {
  pragma(statement: string): unknown;
}

const BUSY_TIMEOUT_MS = 15_000;

/** Knex settings for the database file in the data folder, which is made when it is missing. */
export function knexConfig(file = path.join(dataDirectory(), DATABASE_FILE)): Knex.Config {
  fs.mkdirSync(path.dirname(file), { recursive: true, mode: 0o700 });
  return {
    client: 'better-sqlite3',
    connection: { filename: file },
    useNullAsDefault: true,
    pool: {
      min: 1,
      max: 1,
      afterCreate(connection: RawConnection, done: (error: Error | null, connection: RawConnection) => void) {
        connection.pragma('journal_mode = WAL');
        connection.pragma('synchronous = FULL');
        connection.pragma('foreign_keys = ON');
        connection.pragma(`busy_timeout = ${BUSY_TIMEOUT_MS}`);
        done(null, connection);
      },
    },
    migrations: {
      directory: path.join(/* turbopackIgnore: true */ process.cwd(), 'migrations'),
      loadExtensions: ['.ts'],
      extension: 'ts',
    },
  };
}
