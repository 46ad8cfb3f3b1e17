import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { findMail, requeueMail, type StoredMail } from '@/db/outbox-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import { withoutLinks } from '@/lib/mail/links';
import { smtpAddress } from '@/lib/mail/smtp';
import type { Actor } from '@/lib/rules/roles';

/** True when mail leaves for a server; else it stays in the outbox, and the administrator reads it there. */
export function isMailSent(): boolean {
  return smtpAddress() !== '';
}

/** One mail with its text. Where mail is really sent, its one-time links are for the recipient alone. */
export async function getMail(id: number): Promise<StoredMail> {
  const mail = await findMail(db(), id);
  if (!mail) throw notFound('The mail');
  return isMailSent() ? { ...mail, body: withoutLinks(mail.body) } : mail;
}

export async function sendMailAgain(actor: Actor, id: number): Promise<void> {
  await inTransaction(db(), async (trx) => {
    if (!(await requeueMail(trx, id))) {
      throw new AppError('conflict', 'Only mail that was given up can be sent again.');
    }
    await addAuditEntry(trx, { userId: actor.userId, action: 'mail.sent-again', detail: `mail ${id}` });
  });
}
