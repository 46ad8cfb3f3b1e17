import 'server-only';
import type { Db } from './connection';

/** Counts a try as failed until it is known to have succeeded, so that tries at the same moment are all counted. */
export async function addAttempt(connection: Db, email: string, at: string): Promise<number> {
  const [id] = await connection('sign_in_attempts').insert({ email, at, succeeded: false });
  if (id === undefined) throw new Error('the attempt was given no id');
  return id;
}

export async function markAttemptSucceeded(connection: Db, id: number): Promise<void> {
  await connection('sign_in_attempts').where({ id }).update({ succeeded: true });
}

/** Times of the failures since a moment and since the last success, oldest first. */
export async function listFailures(connection: Db, email: string, since: string): Promise<string[]> {
  const rows: { at: string }[] = await connection('sign_in_attempts')
    .where({ email, succeeded: 0 })
    .where('at', '>=', since)
    .whereRaw(
      'id > coalesce((select max(done.id) from sign_in_attempts as done where done.email = ? and done.succeeded = 1), 0)',
      [email],
    )
    .orderBy('id')
    .select('at');
  return rows.map((row) => row.at);
}

export async function removeAttemptsOf(connection: Db, email: string): Promise<void> {
  await connection('sign_in_attempts').where({ email }).delete();
}

export async function removeAttemptsBefore(connection: Db, moment: string): Promise<void> {
  await connection('sign_in_attempts').where('at', '<', moment).delete();
}
