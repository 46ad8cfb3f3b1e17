import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';

export interface ApiToken {
  id: number;
  laboratoryId: number;
  name: string;
  lastFour: string;
  createdBy: number | null;
  createdAt: string;
  expiresAt: string;
  revokedAt: string | null;
  lastUsedAt: string | null;
}

interface Row {
  id: number;
  laboratory_id: number;
  name: string;
  last_four: string;
  created_by: number | null;
  created_at: string;
  expires_at: string;
  revoked_at: string | null;
  last_used_at: string | null;
}

const USE_NOTED_EVERY_MS = 60_000;

export async function createApiToken(
  connection: Db,
  token: {
    laboratoryId: number;
    name: string;
    tokenHash: string;
    lastFour: string;
    createdBy: number | null;
    expiresAt: string;
  },
): Promise<number> {
  const [id] = await connection('api_tokens').insert({
    laboratory_id: token.laboratoryId,
    name: token.name,
    token_hash: token.tokenHash,
    last_four: token.lastFour,
    created_by: token.createdBy,
    created_at: timestamp(),
    expires_at: token.expiresAt,
  });
  if (id === undefined) throw new Error('the token was given no id');
  return id;
}

/** A laboratory's tokens, newest first; the hashes stay in the database. */
export async function listApiTokens(connection: Db, laboratoryId: number): Promise<ApiToken[]> {
  const rows: Row[] = await connection('api_tokens')
    .where({ laboratory_id: laboratoryId })
    .orderBy('id', 'desc')
    .select(
      'id',
      'laboratory_id',
      'name',
      'last_four',
      'created_by',
      'created_at',
      'expires_at',
      'revoked_at',
      'last_used_at',
    );
  return rows.map((row) => ({
    id: row.id,
    laboratoryId: row.laboratory_id,
    name: row.name,
    lastFour: row.last_four,
    createdBy: row.created_by,
    createdAt: row.created_at,
    expiresAt: row.expires_at,
    revokedAt: row.revoked_at,
    lastUsedAt: row.last_used_at,
  }));
}

export async function countTokensInForce(connection: Db, laboratoryId: number): Promise<number> {
  const row = await connection('api_tokens')
    .where({ laboratory_id: laboratoryId })
    .whereNull('revoked_at')
    .where('expires_at', '>', timestamp())
    .count({ count: '*' })
    .first();
  return Number(row?.count ?? 0);
}

/** Returns the token's name, or null when the laboratory has no such token in force. */
export async function revokeApiToken(
  connection: Db,
  token: { id: number; laboratoryId: number },
): Promise<string | null> {
  const rows: { name: string }[] = await connection('api_tokens')
    .where({ id: token.id, laboratory_id: token.laboratoryId })
    .whereNull('revoked_at')
    .update({ revoked_at: timestamp() }, ['name']);
  return rows[0]?.name ?? null;
}

/** Notes that a token is in use, at most once a minute, so that a busy program does not write on every call. */
export async function touchApiToken(connection: Db, id: number): Promise<void> {
  const now = Date.now();
  await connection('api_tokens')
    .where({ id })
    .where((query) =>
      query
        .whereNull('last_used_at')
        .orWhere('last_used_at', '<', new Date(now - USE_NOTED_EVERY_MS).toISOString()),
    )
    .update({ last_used_at: new Date(now).toISOString() });
}
