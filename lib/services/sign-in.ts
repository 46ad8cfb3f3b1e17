import 'server-only';
import { randomBytes } from 'node:crypto';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { createSession, removeSessionsExpiredBefore } from '@/db/session-store';
import {
  addAttempt,
  listFailures,
  markAttemptSucceeded,
  removeAttemptsBefore,
} from '@/db/sign-in-attempt-store';
import { inTransaction } from '@/db/transaction';
import { findPasswordHash, findUserByEmail, type User } from '@/db/user-store';
import { AppError } from '@/lib/errors';
import { formatTime } from '@/lib/format';
import { SESSION_HOURS } from '@/lib/rules/session';
import { EMAIL_LENGTH, PASSWORD_MAX } from '@/lib/schemas/sign-in';
import { isPassword } from './password-hash';

export const MAX_FAILURES = 10;
export const FAILURE_MINUTES = 15;
const KEPT_DAYS = 30;

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;

export interface SignedIn {
  userId: number;
  sessionId: string;
}

/** Checks an e-mail and password and begins a session. One answer for every reason of failure. */
export async function signIn(credentials: { email: string; password: string }): Promise<SignedIn> {
  const email = credentials.email.trim().toLowerCase();
  if (!canBeSomeones(email, credentials.password)) {
    await logFailure('', null, 'no e-mail or password that anyone can have');
    throw wrongCredentials();
  }
  const attemptId = await claimAttempt(email);
  const user = await findUserByEmail(db(), email);
  const passwordHash = user && !user.isDisabled ? await findPasswordHash(db(), user.id) : null;
  const isRight = await isPassword(passwordHash, credentials.password);
  if (!user || !isRight) {
    await logFailure(email, user, 'wrong e-mail or password');
    throw wrongCredentials();
  }
  return inTransaction(db(), async (trx) => {
    await markAttemptSucceeded(trx, attemptId);
    const sessionId = await beginSession(trx, user.id);
    await addAuditEntry(trx, { userId: user.id, action: 'sign-in' });
    return { userId: user.id, sessionId };
  });
}

const LIKE_AN_EMAIL = /^[^\s@]+@[^\s@]+$/;

/** What no one can sign in with is not kept among the attempts: it may be endless, or a password in the wrong field. */
function canBeSomeones(email: string, password: string): boolean {
  return LIKE_AN_EMAIL.test(email) && email.length <= EMAIL_LENGTH && password.length <= PASSWORD_MAX;
}

function wrongCredentials(): AppError {
  return new AppError(
    'invalid',
    'The e-mail or the password is not right. Check both, or ask for a new password.',
  );
}

/** Begins a session in a running transaction; the caller has made sure who the person is. */
export async function beginSession(trx: Db, userId: number): Promise<string> {
  const id = randomBytes(32).toString('base64url');
  const now = Date.now();
  await createSession(trx, { id, userId, expiresAt: new Date(now + SESSION_HOURS * HOUR_MS).toISOString() });
  await removeSessionsExpiredBefore(trx, new Date(now - KEPT_DAYS * DAY_MS).toISOString());
  return id;
}

async function claimAttempt(email: string): Promise<number> {
  const now = Date.now();
  const claimed = await inTransaction(db(), async (trx) => {
    await removeAttemptsBefore(trx, new Date(now - DAY_MS).toISOString());
    const failures = await listFailures(
      trx,
      email,
      new Date(now - FAILURE_MINUTES * MINUTE_MS).toISOString(),
    );
    const oldestThatCounts = failures.at(-MAX_FAILURES);
    if (oldestThatCounts)
      return { freeAt: new Date(oldestThatCounts).getTime() + FAILURE_MINUTES * MINUTE_MS };
    return { id: await addAttempt(trx, email, new Date(now).toISOString()) };
  });
  if (claimed.id !== undefined) return claimed.id;
  await logFailure(email, null, 'too many failures');
  const freeAt = new Date(Math.ceil(claimed.freeAt / MINUTE_MS) * MINUTE_MS).toISOString();
  throw new AppError(
    'too-many',
    `Signing in failed ${MAX_FAILURES} times within ${FAILURE_MINUTES} minutes. Try again after ${formatTime(freeAt)}, or ask for a new password.`,
  );
}

async function logFailure(email: string, user: User | null, reason: string): Promise<void> {
  await addAuditEntry(db(), {
    userId: user?.id,
    action: 'sign-in',
    outcome: 'refused',
    detail: email ? `${reason}: ${email}` : reason,
  });
}
