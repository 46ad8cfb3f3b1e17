import 'server-only';
import type { Db } from '../connection';

/** Asks the database for something trivial; throws when it cannot be reached or was never set up. */
export async function pingDatabase(connection: Db): Promise<void> {
  await connection('users').select('id').limit(1);
}
