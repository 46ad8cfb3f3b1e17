import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';

export interface AuditEntry {
  userId?: number | null;
  apiTokenId?: number | null;
  laboratoryId?: number | null;
  roundId?: number | null;
  action: string;
  outcome?: 'done' | 'refused';
  detail?: string;
}

const DETAIL_LENGTH = 1_000;

/** Adds a line to the log; inside a transaction it stands or falls with what it tells of. */
export async function addAuditEntry(connection: Db, entry: AuditEntry): Promise<void> {
  await connection('audit_log').insert({
    at: timestamp(),
    user_id: entry.userId ?? null,
    api_token_id: entry.apiTokenId ?? null,
    laboratory_id: entry.laboratoryId ?? null,
    round_id: entry.roundId ?? null,
    action: entry.action,
    outcome: entry.outcome ?? 'done',
    detail: (entry.detail ?? '').slice(0, DETAIL_LENGTH),
  });
}
