import 'server-only';
import type { Db } from './connection';

export interface Mail {
  dedupeKey: string;
  to: string;
  subject: string;
  body: string;
}

/** Puts mail in the outbox; the same key is kept once, so that nothing is sent twice. */
export async function addMail(connection: Db, mail: Mail): Promise<void> {
  const now = new Date().toISOString();
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
