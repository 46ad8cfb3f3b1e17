import 'server-only';
import type { Db } from './connection';

/** Runs `work` in a transaction, joining the one that `connection` may already be. */
export async function inTransaction<T>(connection: Db, work: (trx: Db) => Promise<T>): Promise<T> {
  if (connection.isTransaction) return work(connection);
  return connection.transaction((trx) => work(trx));
}
