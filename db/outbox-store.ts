import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, type Row } from './rows';

export interface Mail {
  dedupeKey: string;
  to: string;
  subject: string;
  body: string;
}

export type MailState = 'waiting' | 'sent' | 'failed';

export interface StoredMail {
  id: number;
  dedupeKey: string;
  toAddress: string;
  subject: string;
  body: string;
  state: MailState;
  attempts: number;
  lastError: string;
  createdAt: string;
  nextAttemptAt: string;
  sentAt: string | null;
}

/** Puts mail in the outbox; the same key is kept once, so that nothing is sent twice. */
export async function addMail(connection: Db, mail: Mail): Promise<void> {
  const now = timestamp();
  await connection('outbox')
    .insert({
      dedupe_key: mail.dedupeKey,
      to_address: mail.to,
      subject: mail.subject,
      body: mail.body,
      state: 'waiting',
      created_at: now,
      next_attempt_at: now,
    })
    .onConflict('dedupe_key')
    .ignore();
}

export async function findMail(connection: Db, id: number): Promise<StoredMail | null> {
  const row: Row | undefined = await connection('outbox').where({ id }).first();
  return row ? fromRow<StoredMail>(row) : null;
}

/**
 * Takes the next mail that is due, or null. Until `leaseUntil` no one else takes it; if the process dies while sending,
 * it becomes due again at that time.
 */
export async function claimMail(
  connection: Db,
  claim: { now: string; leaseUntil: string },
): Promise<StoredMail | null> {
  const due: Row | undefined = await connection('outbox')
    .where({ state: 'waiting' })
    .where('next_attempt_at', '<=', claim.now)
    .orderBy(['next_attempt_at', 'id'])
    .first();
  if (!due) return null;
  const mail = fromRow<StoredMail>(due);
  const taken = await connection('outbox')
    .where({ id: mail.id, state: 'waiting', attempts: mail.attempts })
    .update({ attempts: mail.attempts + 1, next_attempt_at: claim.leaseUntil });
  return taken === 1 ? { ...mail, attempts: mail.attempts + 1 } : null;
}

/** Notes that mail is sent, and keeps `body` in place of the text, from which secrets have been taken. */
export async function markMailSent(connection: Db, id: number, body: string): Promise<void> {
  await connection('outbox')
    .where({ id })
    .update({ state: 'sent', sent_at: timestamp(), last_error: '', body });
}

/** Notes a failure; without a time for another try the mail is given up. */
export async function markMailFailed(
  connection: Db,
  failure: { id: number; error: string; nextAttemptAt: string | null },
): Promise<void> {
  await connection('outbox')
    .where({ id: failure.id })
    .update({
      last_error: failure.error,
      ...(failure.nextAttemptAt ? { next_attempt_at: failure.nextAttemptAt } : { state: 'failed' }),
    });
}

/** Lets a mail that was given up be tried again from now on. */
export async function requeueMail(connection: Db, id: number): Promise<boolean> {
  const changed = await connection('outbox')
    .where({ id, state: 'failed' })
    .update({ state: 'waiting', attempts: 0, next_attempt_at: timestamp() });
  return changed > 0;
}
