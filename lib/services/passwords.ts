import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import {
  closeLinksOfUser,
  countLinksSince,
  findOpenLink,
  takeLink,
  type LinkPurpose,
} from '@/db/one-time-link-store';
import { endSessionsOfUser } from '@/db/session-store';
import { removeAttemptsOf } from '@/db/sign-in-attempt-store';
import { inTransaction } from '@/db/transaction';
import { findPasswordHash, findUser, findUserByEmail, setPasswordHash, type User } from '@/db/user-store';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import { passwordComplaint } from '@/lib/schemas/sign-in';
import { hashToken } from '@/lib/token-hash';
import { mailLink } from './link-mail';
import { hashPassword, isPassword } from './password-hash';
import { beginSession, type SignedIn } from './sign-in';

const RESETS_AN_HOUR = 3;
const HOUR_MS = 3_600_000;

/** Sends a reset link when the address has an account. The caller learns nothing, from the answer or the time it takes. */
export async function askForReset(email: string): Promise<void> {
  const since = new Date(Date.now() - HOUR_MS).toISOString();
  await inTransaction(db(), async (trx) => {
    const user = await findUserByEmail(trx, email);
    const sent = await countLinksSince(trx, { userId: user?.id ?? 0, purpose: 'reset', since });
    const mayHave = user !== null && !user.isDisabled && user.hasPassword && sent < RESETS_AN_HOUR;
    if (mayHave) await mailLink(trx, user, 'reset');
    await addAuditEntry(trx, {
      userId: user?.id,
      action: 'password.reset-asked',
      outcome: mayHave ? 'done' : 'refused',
      detail: email,
    });
  });
}

/** The person an open link was made for; looking does not use it up, since mail scanners look too. */
export async function findLinkHolder(token: string, purpose: LinkPurpose): Promise<User | null> {
  const link = await findOpenLink(db(), { tokenHash: hashToken(token), purpose });
  const user = link && (await findUser(db(), link.userId));
  return user && !user.isDisabled ? user : null;
}

/** Sets the password by a one-time link, ends all sessions, and begins one. */
export async function setPasswordByLink(asked: {
  token: string;
  purpose: LinkPurpose;
  password: string;
}): Promise<SignedIn> {
  const user = await findLinkHolder(asked.token, asked.purpose);
  if (!user) throw linkIsOver();
  requireGoodPassword(asked.password, user);
  const passwordHash = await hashPassword(asked.password);
  return inTransaction(db(), async (trx) => {
    const link = await findOpenLink(trx, { tokenHash: hashToken(asked.token), purpose: asked.purpose });
    const current = link && (await findUser(trx, link.userId));
    if (!link || !current || current.isDisabled || !(await takeLink(trx, link.id))) throw linkIsOver();
    await setPasswordHash(trx, user.id, passwordHash);
    await closeLinksOfUser(trx, user.id);
    await endSessionsOfUser(trx, user.id);
    await removeAttemptsOf(trx, user.email);
    await addAuditEntry(trx, { userId: user.id, action: `password.set-by-${asked.purpose}-link` });
    return { userId: user.id, sessionId: await beginSession(trx, user.id) };
  });
}

/** Changes the password of someone signed in; every other session of theirs ends. */
export async function changePassword(
  actor: Actor,
  asked: { sessionId: string; currentPassword: string; password: string },
): Promise<void> {
  const userId = actor.userId;
  if (userId === null) throw new AppError('forbidden', 'Only a person has a password.');
  if (!(await isPassword(await findPasswordHash(db(), userId), asked.currentPassword))) {
    await addAuditEntry(db(), { userId, action: 'password.changed', outcome: 'refused' });
    throw new AppError('invalid', 'The password was not changed.', {
      fieldErrors: { currentPassword: 'This is not your present password.' },
    });
  }
  requireGoodPassword(asked.password, actor);
  const passwordHash = await hashPassword(asked.password);
  await inTransaction(db(), async (trx) => {
    await setPasswordHash(trx, userId, passwordHash);
    await closeLinksOfUser(trx, userId);
    await endSessionsOfUser(trx, userId, { exceptId: asked.sessionId });
    await addAuditEntry(trx, { userId, action: 'password.changed' });
  });
}

export function requireGoodPassword(password: string, owner: { email: string; name: string }): void {
  const complaint = passwordComplaint(password, owner);
  if (complaint)
    throw new AppError('invalid', 'The password was not set.', { fieldErrors: { password: complaint } });
}

function linkIsOver(): AppError {
  return new AppError('not-found', 'This link has been used or has expired. Ask for a new one.');
}
