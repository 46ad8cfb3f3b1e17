import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { isAppError } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';

/** Runs `work`; when it answers that something is forbidden or not to be found, the log keeps who asked for what. */
export async function addRefusal<T>(actor: Actor, asked: string, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (isAppError(error) && (error.code === 'not-found' || error.code === 'forbidden')) {
      await addAuditEntry(db(), {
        userId: actor.userId,
        apiTokenId: actor.apiTokenId,
        laboratoryId: actor.laboratoryId,
        action: 'request.refused',
        outcome: 'refused',
        detail: asked,
      });
    }
    throw error;
  }
}
