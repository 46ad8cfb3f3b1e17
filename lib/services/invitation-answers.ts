import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { findEnrolment, updateEnrolment } from '@/db/enrolment-store';
import { findRound } from '@/db/round-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import { formatDateTime } from '@/lib/format';
import type { Actor } from '@/lib/rules/roles';
import { roundStateWords } from '@/lib/rules/round-states';

export type InvitationAnswer = 'enrolled' | 'declined';

/**
 * A laboratory's own answer to an invitation. It may still accept after it declined, but an enrolment that the
 * provider withdrew is the provider's to restore.
 */
export async function answerInvitation(
  actor: Actor,
  slug: string,
  laboratoryId: number,
  answer: InvitationAnswer,
  reason = '',
): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await findRound(trx, slug);
    const enrolment = round ? await findEnrolment(trx, round.id, laboratoryId) : null;
    if (!round || !enrolment || round.isPast) throw notFound('The round');
    if (enrolment.state === answer) return;
    if (round.state !== 'draft' && round.state !== 'open') {
      throw new AppError(
        'conflict',
        `The invitation can no longer be answered: ${round.name} is ${roundStateWords(round.state)}.`,
      );
    }
    const now = new Date().toISOString();
    if (answer === 'enrolled' && round.closesAt <= now) {
      throw new AppError('conflict', `${round.name} took results until ${formatDateTime(round.closesAt)}.`);
    }
    const isOpenToAnswer =
      enrolment.state === 'invited' || (enrolment.state === 'declined' && answer === 'enrolled');
    if (!isOpenToAnswer) {
      throw new AppError(
        'conflict',
        `Your laboratory is ${enrolment.state} in ${round.name}. Ask the provider to change that.`,
      );
    }
    await updateEnrolment(trx, enrolment.id, { state: answer, reason, decidedAt: now });
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      laboratoryId,
      action: `enrolment.${answer}`,
      detail: reason,
    });
  });
}
