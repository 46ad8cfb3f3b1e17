import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { listLaboratoriesOutside, type LaboratoryChoice } from '@/db/views/laboratory-choice-view';
import { listParticipants, type Participant } from '@/db/views/participants-view';
import { hasRecentEntry } from '@/db/views/round-log-view';
import { can } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { getRound } from './round-plan';

/** A page that refreshes itself would fill the log; one line an hour and person tells as much. */
const LOOK_COUNTS_FOR_MS = 3_600_000;

/** A participant as far as the reader may know it: without the key there is a code, its state, and nothing else. */
export type ParticipantEntry = Omit<Participant, 'laboratoryName' | 'town'> & {
  laboratoryName: string | null;
  town: string | null;
};

async function noteLook(userId: number, roundId: number): Promise<void> {
  const look = { userId, roundId, action: 'key.viewed' };
  const since = new Date(Date.now() - LOOK_COUNTS_FOR_MS).toISOString();
  if (!(await hasRecentEntry(db(), { ...look, since }))) await addAuditEntry(db(), look);
}

/** Whatever the log of the installation or the outbox tells beside a laboratory's name would lead from there to its code. */
const WITHOUT_KEY = {
  enrolmentId: 0,
  laboratoryId: 0,
  laboratoryName: null,
  town: null,
  reason: '',
  itemsReceivedAt: null,
  submittedAt: null,
  resultCount: null,
  receiptCode: null,
} as const satisfies Partial<ParticipantEntry>;

/**
 * Everyone enrolled or invited. For those who may see the key the names stand behind the codes, and the look is in
 * the log before anything is shown; for others, codes in their own order, so that the order tells no names.
 */
export async function listParticipantsFor(actor: Actor, slug: string): Promise<ParticipantEntry[]> {
  const round = await getRound(slug);
  const participants = await listParticipants(db(), round.id);
  if (can(actor, 'round:see-key') && actor.userId !== null) {
    if (participants.length > 0) await noteLook(actor.userId, round.id);
    return participants;
  }
  return participants
    .map(({ participantCode, state }) => ({ ...WITHOUT_KEY, participantCode, state }))
    .sort((a, b) => a.participantCode.localeCompare(b.participantCode));
}

export async function listLaboratoriesToAdd(slug: string): Promise<LaboratoryChoice[]> {
  const round = await getRound(slug);
  return listLaboratoriesOutside(db(), round.id);
}
