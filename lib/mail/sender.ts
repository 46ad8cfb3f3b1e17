import 'server-only';
import type { Transporter } from 'nodemailer';
import { db } from '@/db/connection';
import { claimMail, markMailFailed, markMailSent, type StoredMail } from '@/db/outbox-store';
import { inTransaction } from '@/db/transaction';
import { log } from '@/lib/log';
import { withoutLinks } from './links';
import { hand, openTransport, smtpAddress } from './smtp';

const MINUTE_MS = 60_000;
const EVERY_MS = 5_000;
/** Longer than any try can last, so that a mail in hand is never taken a second time. */
const LEASE_MS = 10 * MINUTE_MS;
/** Minutes to wait after each failure in turn; after the last one the mail is given up. */
const WAITS = [1, 5, 15, 60, 240, 720, 1_440];
const ERROR_LENGTH = 300;

/** Sends one mail that is due. Returns false when there is none. */
export async function sendNextMail(transport: Transporter): Promise<boolean> {
  const now = Date.now();
  const mail = await inTransaction(db(), (trx) =>
    claimMail(trx, {
      now: new Date(now).toISOString(),
      leaseUntil: new Date(now + LEASE_MS).toISOString(),
    }),
  );
  if (!mail) return false;
  try {
    await hand(transport, mail);
  } catch (error) {
    await noteFailure(mail, error);
    return true;
  }
  await markMailSent(db(), mail.id, withoutLinks(mail.body));
  log.info({ mailId: mail.id, attempts: mail.attempts }, 'mail sent');
  return true;
}

async function noteFailure(mail: StoredMail, error: unknown): Promise<void> {
  const wait = isRefusedForGood(error) ? undefined : WAITS[mail.attempts - 1];
  const message = (error instanceof Error ? error.message : 'unknown').slice(0, ERROR_LENGTH);
  await markMailFailed(db(), {
    id: mail.id,
    error: message,
    nextAttemptAt: wait === undefined ? null : new Date(Date.now() + wait * MINUTE_MS).toISOString(),
  });
  const at = { mailId: mail.id, attempts: mail.attempts, reason: message };
  if (wait === undefined) log.error(at, 'mail given up');
  else log.warn(at, 'mail not sent, will be tried again');
}

/** A 5xx answer to an address or a text will not change; a wrong password of ours will be mended. */
function isRefusedForGood(error: unknown): boolean {
  const { responseCode, code } = error as { responseCode?: number; code?: string };
  return (code === 'EENVELOPE' || code === 'EMESSAGE') && responseCode !== undefined && responseCode >= 500;
}

interface Loop {
  timer: NodeJS.Timeout;
  transport: Transporter;
}

const holder = globalThis as typeof globalThis & { assizeMailLoop?: Loop };

/** Starts the one loop of this process, when mail is to be handed to a server at all. */
export function startMailSender(): void {
  if (holder.assizeMailLoop || !smtpAddress()) return;
  const transport = openTransport();
  let busy = false;
  const timer = setInterval(() => {
    if (busy) return;
    busy = true;
    void sendAllDue(transport).finally(() => {
      busy = false;
    });
  }, EVERY_MS);
  timer.unref();
  holder.assizeMailLoop = { timer, transport };
  log.info('mail sender started');
}

export function stopMailSender(): void {
  const loop = holder.assizeMailLoop;
  if (!loop) return;
  clearInterval(loop.timer);
  loop.transport.close();
  delete holder.assizeMailLoop;
}

async function sendAllDue(transport: Transporter): Promise<void> {
  try {
    while (await sendNextMail(transport));
  } catch (error) {
    log.error({ err: error }, 'the outbox could not be read; the next turn tries again');
  }
}
