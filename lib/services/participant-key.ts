import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { listParticipants, type Participant } from '@/db/views/participants-view';
import { hasRecentEntry } from '@/db/views/round-log-view';
import { AppError } from '@/lib/errors';
import { can } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { getRound } from './round-plan';

/** A page that refreshes itself would fill the log; one line an hour and person tells as much. */
const LOOK_COUNTS_FOR_MS = 3_600_000;

/** The names behind a round's codes. The look at the key goes into the log before anything is shown. */
export async function lookAtKey(actor: Actor, slug: string): Promise<Participant[]> {
  if (!can(actor, 'round:see-key') || actor.userId === null) {
    throw new AppError('forbidden', 'Your roles do not allow you to see who is behind a code.');
  }
  const round = await getRound(slug);
  const look = { userId: actor.userId, roundId: round.id, action: 'key.viewed' };
  const since = new Date(Date.now() - LOOK_COUNTS_FOR_MS).toISOString();
  if (!(await hasRecentEntry(db(), { ...look, since }))) await addAuditEntry(db(), look);
  return listParticipants(db(), round.id);
}
