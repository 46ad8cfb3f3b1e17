import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { chooseLaboratory, countOpenSessions, endSession, endSessionsOfUser } from '@/db/session-store';
import { inTransaction } from '@/db/transaction';
import { notFound } from '@/lib/errors';
import { laboratoriesOf } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';

interface Whose {
  actor: Actor;
  sessionId: string;
}

/** Chooses the laboratory the person works for from now on, in this session. */
export async function switchLaboratory({ actor, sessionId }: Whose, laboratoryId: number): Promise<void> {
  if (!laboratoriesOf(actor).some((laboratory) => laboratory.id === laboratoryId)) {
    await addAuditEntry(db(), {
      userId: actor.userId,
      action: 'laboratory.chosen',
      outcome: 'refused',
      detail: `laboratory ${laboratoryId}`,
    });
    throw notFound('The laboratory');
  }
  await chooseLaboratory(db(), sessionId, laboratoryId);
}

export async function signOut({ actor, sessionId }: Whose): Promise<void> {
  await inTransaction(db(), async (trx) => {
    await endSession(trx, sessionId);
    await addAuditEntry(trx, { userId: actor.userId, action: 'sign-out' });
  });
}

export async function signOutEverywhere({ actor }: Whose): Promise<void> {
  const { userId } = actor;
  if (userId === null) return;
  await inTransaction(db(), async (trx) => {
    const ended = await endSessionsOfUser(trx, userId);
    await addAuditEntry(trx, { userId, action: 'sign-out.everywhere', detail: `${ended} sessions` });
  });
}

export async function countSessions(actor: Actor): Promise<number> {
  return actor.userId === null ? 0 : countOpenSessions(db(), actor.userId);
}
