import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import {
  createEnrolment,
  findEnrolment,
  listEnrolments,
  updateEnrolment,
  type EnrolmentState,
} from '@/db/enrolment-store';
import { listKnownLaboratoryIds } from '@/db/views/laboratory-ids-view';
import { findRound, type Round } from '@/db/round-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import { roundStateWords } from '@/lib/rules/round-states';
import { drawParticipantCode, requireRoomFor } from './participant-codes';
import { mailParticipants } from './round-mail';

async function requireRoundTakingLabs(trx: Db, slug: string): Promise<Round> {
  const round = await findRound(trx, slug);
  if (!round) throw notFound('The round');
  if (round.state !== 'draft' && round.state !== 'open') {
    throw new AppError(
      'conflict',
      `Participants are fixed, since the round is ${roundStateWords(round.state)}.`,
    );
  }
  return round;
}

/** Brings laboratories into a round, each with a new random code; those already in it are left as they are. */
export async function enrolLaboratories(
  actor: Actor,
  slug: string,
  laboratoryIds: readonly number[],
  state: 'invited' | 'enrolled',
): Promise<{ added: number }> {
  return inTransaction(db(), async (trx) => {
    const round = await requireRoundTakingLabs(trx, slug);
    const known = new Set(await listKnownLaboratoryIds(trx, laboratoryIds));
    if (known.size < new Set(laboratoryIds).size) throw notFound('A laboratory of the list');
    const present = await listEnrolments(trx, round.id);
    const taken = new Set(present.map((enrolment) => enrolment.participantCode));
    const enrolled = new Set(present.map((enrolment) => enrolment.laboratoryId));
    requireRoomFor(new Set([...enrolled, ...known]).size);
    let added = 0;
    for (const laboratoryId of known) {
      if (enrolled.has(laboratoryId)) continue;
      const participantCode = drawParticipantCode(taken);
      taken.add(participantCode);
      await createEnrolment(trx, { roundId: round.id, laboratoryId, participantCode, state });
      await addAuditEntry(trx, {
        userId: actor.userId,
        roundId: round.id,
        laboratoryId,
        action: `enrolment.${state}`,
      });
      if (!round.isPast) {
        const occasion = state === 'invited' ? 'invited' : 'opened';
        if (state === 'invited' || round.state === 'open')
          await mailParticipants(trx, round, occasion, '', laboratoryId);
      }
      added += 1;
    }
    return { added };
  });
}

const MOVES: Record<EnrolmentState, readonly EnrolmentState[]> = {
  invited: ['enrolled', 'declined', 'withdrawn'],
  enrolled: ['withdrawn'],
  declined: ['enrolled', 'invited'],
  withdrawn: ['enrolled', 'invited'],
};

/** Changes one laboratory's enrolment, by itself or by the coordinator. Results already sent are kept. */
export async function moveEnrolment(
  actor: Actor,
  slug: string,
  laboratoryId: number,
  state: EnrolmentState,
  reason = '',
): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await requireRoundTakingLabs(trx, slug);
    const enrolment = await findEnrolment(trx, round.id, laboratoryId);
    if (!enrolment) throw notFound('The enrolment');
    if (enrolment.state === state) return;
    if (!MOVES[enrolment.state].includes(state)) {
      throw new AppError('conflict', `The enrolment is ${enrolment.state}; it cannot become ${state}.`);
    }
    await updateEnrolment(trx, enrolment.id, { state, reason, decidedAt: new Date().toISOString() });
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      laboratoryId,
      action: `enrolment.${state}`,
      detail: reason,
    });
  });
}

/** The laboratory says that the test items have arrived. */
export async function confirmReceipt(actor: Actor, slug: string, laboratoryId: number): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await findRound(trx, slug);
    const enrolment = round ? await findEnrolment(trx, round.id, laboratoryId) : null;
    if (!round || round.isPast || enrolment?.state !== 'enrolled') throw notFound('The round');
    if (round.state !== 'open') {
      throw new AppError(
        'conflict',
        `Receipt is confirmed while a round is open; this one is ${roundStateWords(round.state)}.`,
      );
    }
    if (enrolment.itemsReceivedAt) return;
    await updateEnrolment(trx, enrolment.id, { itemsReceivedAt: new Date().toISOString() });
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      laboratoryId,
      action: 'items.received',
    });
  });
}
