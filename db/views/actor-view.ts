import 'server-only';
import type { Actor, Membership, Role } from '@/lib/rules/roles';
import type { Db } from '../connection';

interface ActorRow {
  chosen_laboratory_id: number | null;
  user_id: number;
  name: string;
  email: string;
  role: Role | null;
  laboratory_id: number | null;
  laboratory_name: string | null;
}

/** The person behind a session that has neither ended nor expired, with every role held, in one query. */
export async function findActorBySession(connection: Db, sessionId: string): Promise<Actor | null> {
  const rows: ActorRow[] = await connection('sessions')
    .join('users', 'users.id', 'sessions.user_id')
    .leftJoin('memberships', 'memberships.user_id', 'users.id')
    .leftJoin('laboratories', 'laboratories.id', 'memberships.laboratory_id')
    .where('sessions.id', sessionId)
    .whereNull('sessions.ended_at')
    .where('sessions.expires_at', '>', new Date().toISOString())
    .where('users.is_disabled', 0)
    .orderBy(['laboratories.name', 'memberships.id'])
    .select({
      chosen_laboratory_id: 'sessions.laboratory_id',
      user_id: 'users.id',
      name: 'users.name',
      email: 'users.email',
      role: 'memberships.role',
      laboratory_id: 'memberships.laboratory_id',
      laboratory_name: 'laboratories.name',
    });
  return toActor(rows);
}

function toActor(rows: readonly ActorRow[]): Actor | null {
  const first = rows[0];
  if (!first) return null;
  const memberships: Membership[] = [];
  for (const { role, laboratory_id, laboratory_name } of rows) {
    if (role) memberships.push({ role, laboratoryId: laboratory_id, laboratoryName: laboratory_name });
  }
  const own = memberships.filter((membership) => membership.laboratoryId !== null);
  const chosen = own.find((membership) => membership.laboratoryId === first.chosen_laboratory_id) ?? own[0];
  return {
    userId: first.user_id,
    apiTokenId: null,
    name: first.name,
    email: first.email,
    memberships,
    laboratoryId: chosen?.laboratoryId ?? null,
  };
}

/** The laboratory's program behind a token that is neither revoked nor expired. */
export async function findActorByToken(connection: Db, tokenHash: string): Promise<Actor | null> {
  const row: { id: number; name: string; laboratory_id: number; laboratory_name: string } | undefined =
    await connection('api_tokens')
      .join('laboratories', 'laboratories.id', 'api_tokens.laboratory_id')
      .where('api_tokens.token_hash', tokenHash)
      .whereNull('api_tokens.revoked_at')
      .where('api_tokens.expires_at', '>', new Date().toISOString())
      .where('laboratories.is_active', 1)
      .first({
        id: 'api_tokens.id',
        name: 'api_tokens.name',
        laboratory_id: 'api_tokens.laboratory_id',
        laboratory_name: 'laboratories.name',
      });
  if (!row) return null;
  return {
    userId: null,
    apiTokenId: row.id,
    name: row.name,
    email: '',
    memberships: [{ role: 'analyst', laboratoryId: row.laboratory_id, laboratoryName: row.laboratory_name }],
    laboratoryId: row.laboratory_id,
  };
}
