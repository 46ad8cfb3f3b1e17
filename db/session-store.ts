import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';

/** Begins with the laboratory that the person chose last. */
export async function createSession(
  connection: Db,
  session: { id: string; userId: number; expiresAt: string },
): Promise<void> {
  const last: { laboratory_id: number | null } | undefined = await connection('sessions')
    .where({ user_id: session.userId })
    .whereNotNull('laboratory_id')
    .orderBy('created_at', 'desc')
    .first('laboratory_id');
  await connection('sessions').insert({
    id: session.id,
    user_id: session.userId,
    laboratory_id: last?.laboratory_id ?? null,
    created_at: timestamp(),
    expires_at: session.expiresAt,
  });
}

export async function chooseLaboratory(
  connection: Db,
  sessionId: string,
  laboratoryId: number,
): Promise<void> {
  await connection('sessions').where({ id: sessionId }).update({ laboratory_id: laboratoryId });
}

export async function endSession(connection: Db, sessionId: string): Promise<void> {
  await connection('sessions')
    .where({ id: sessionId })
    .whereNull('ended_at')
    .update({ ended_at: timestamp() });
}

/** Ends every session of a person, but one when `exceptId` is given; returns how many ended. */
export async function endSessionsOfUser(
  connection: Db,
  userId: number,
  options: { exceptId?: string } = {},
): Promise<number> {
  const query = connection('sessions').where({ user_id: userId }).whereNull('ended_at');
  if (options.exceptId) query.whereNot({ id: options.exceptId });
  return query.update({ ended_at: timestamp() });
}

export async function countOpenSessions(connection: Db, userId: number): Promise<number> {
  const row = await connection('sessions')
    .where({ user_id: userId })
    .whereNull('ended_at')
    .where('expires_at', '>', timestamp())
    .count({ count: '*' })
    .first();
  return Number(row?.count ?? 0);
}

/** Removes sessions that expired before a moment; nothing refers to them. */
export async function removeSessionsExpiredBefore(connection: Db, moment: string): Promise<void> {
  await connection('sessions').where('expires_at', '<', moment).delete();
}
