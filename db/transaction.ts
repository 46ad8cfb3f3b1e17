import 'server-only';
import type { Db } from './connection';

/**
 * Runs `work` in a transaction, joining the one that `connection` may already be. What `work` threw comes out: when the
 * disk is full SQLite undoes the transaction itself, and the error of undoing it again would hide the reason.
 */
export async function inTransaction<T>(connection: Db, work: (trx: Db) => Promise<T>): Promise<T> {
  if (connection.isTransaction) return work(connection);
  let failure: { error: unknown } | null = null;
  try {
    return await connection.transaction(async (trx) => {
      try {
        return await work(trx);
      } catch (error) {
        failure = { error };
        throw error;
      }
    });
  } catch (error) {
    throw (failure as { error: unknown } | null)?.error ?? error;
  }
}
