import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { addMembership } from '@/db/membership-store';
import { findSetting, setSetting } from '@/db/settings-store';
import { inTransaction } from '@/db/transaction';
import { createUser, hasUsers } from '@/db/user-store';
import { dataDirectory } from '@/lib/env';
import { AppError } from '@/lib/errors';
import type { SetUpInput } from '@/lib/schemas/sign-in';
import { hashPassword } from './password-hash';
import { requireGoodPassword } from './passwords';
import { beginSession, type SignedIn } from './sign-in';

const SET_UP_KEY = 'set_up_at';

/** The data folder known to be set up: that never changes back, so it is asked once. */
let doneFor: string | null = null;

async function isOpen(connection: Db): Promise<boolean> {
  return !(await hasUsers(connection)) && (await findSetting(connection, SET_UP_KEY)) === null;
}

/** True while nobody has an account and set-up has never been done. */
export async function isSetUpOpen(): Promise<boolean> {
  if (doneFor === dataDirectory()) return false;
  if (await isOpen(db())) return true;
  doneFor = dataDirectory();
  return false;
}

/** Makes the first administrator. Refused once anyone has an account, and for ever after the first time. */
export async function setUp(input: SetUpInput): Promise<SignedIn> {
  if (!(await isOpen(db()))) throw alreadyDone();
  requireGoodPassword(input.password, input);
  const passwordHash = await hashPassword(input.password);
  return inTransaction(db(), async (trx) => {
    if (!(await isOpen(trx))) throw alreadyDone();
    const userId = await createUser(trx, { email: input.email, name: input.name, passwordHash });
    await addMembership(trx, { userId, laboratoryId: null, role: 'administrator' });
    if (input.isCoordinator) await addMembership(trx, { userId, laboratoryId: null, role: 'coordinator' });
    await setSetting(trx, SET_UP_KEY, new Date().toISOString());
    await addAuditEntry(trx, { userId, action: 'set-up', detail: input.email });
    return { userId, sessionId: await beginSession(trx, userId) };
  });
}

function alreadyDone(): AppError {
  return new AppError('conflict', 'This installation is set up already. Sign in instead.');
}
