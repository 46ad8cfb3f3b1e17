import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { AppError, notFound } from '@/lib/errors';
import { can, type Permission, type Subject } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';

export interface AuthoriseOptions {
  /** Names a thing whose very existence is not to be told, as in "The round": a refusal then reads as not found. */
  hiddenAs?: string;
}

/**
 * Returns the actor when the rules allow it, else throws: not-signed-in; not-found for what the actor may not
 * know of (another laboratory's rows, or `hiddenAs`); forbidden. A refusal is written to the log.
 */
export async function authorise(
  actor: Actor | null,
  permission: Permission,
  subject: Subject = {},
  options: AuthoriseOptions = {},
): Promise<Actor> {
  if (!actor) throw new AppError('not-signed-in', 'Sign in first.');
  if (can(actor, permission, subject)) return actor;
  await addAuditEntry(db(), {
    userId: actor.userId,
    apiTokenId: actor.apiTokenId,
    // The subject's id may name a row that does not exist, so it goes into the text.
    laboratoryId: actor.laboratoryId,
    action: permission,
    outcome: 'refused',
    detail: subject.laboratoryId ? `laboratory ${subject.laboratoryId}` : '',
  });
  if (options.hiddenAs) throw notFound(options.hiddenAs);
  if (permission.startsWith('own:') && !belongsTo(actor, subject.laboratoryId))
    throw notFound('The laboratory');
  throw new AppError('forbidden', 'Your roles do not allow this.', {
    logMessage: `${permission} was refused`,
  });
}

function belongsTo(actor: Actor, laboratoryId: number | null | undefined): boolean {
  if (!laboratoryId) return false;
  return actor.memberships.some((membership) => membership.laboratoryId === laboratoryId);
}
