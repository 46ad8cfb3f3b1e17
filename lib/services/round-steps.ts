import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { findLatestEvaluation } from '@/db/evaluation-store';
import { findRound, moveRound, type Round } from '@/db/round-store';
import { getRoundCounts } from '@/db/views/round-facts-view';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import { ROUND_STEPS, stepBlockers, type RoundFacts, type RoundStep } from '@/lib/rules/round-states';
import { mailParticipants } from './round-mail';

export async function getRoundFacts(connection: Db, round: Round): Promise<RoundFacts> {
  const counts = await getRoundCounts(connection, round.id);
  return { ...counts, slug: round.slug, state: round.state, isPast: round.isPast, closesAt: round.closesAt };
}

/** The round as it stands inside the transaction, after the rules found nothing against the step. */
export async function requireStep(trx: Db, slug: string, step: RoundStep): Promise<Round> {
  const round = await findRound(trx, slug);
  if (!round) throw notFound('The round');
  const blockers = stepBlockers(step, await getRoundFacts(trx, round), new Date().toISOString());
  if (blockers.length > 0) throw new AppError('blocked', blockers.map((blocker) => blocker.text).join(' '));
  return round;
}

/** Moves the round; fails when another request moved it in the meantime. */
export async function applyStep(
  trx: Db,
  round: Round,
  step: RoundStep,
  stamps: Partial<Round>,
): Promise<void> {
  const isMoved = await moveRound(trx, round.id, round.state, { ...stamps, state: ROUND_STEPS[step].to });
  if (!isMoved) throw new AppError('conflict', 'Someone else has just moved this round. Look at it again.');
}

export async function openRound(actor: Actor, slug: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await requireStep(trx, slug, 'open');
    await applyStep(trx, round, 'open', { openedAt: new Date().toISOString() });
    await addAuditEntry(trx, { userId: actor.userId, roundId: round.id, action: 'round.opened' });
    if (!round.isPast) await mailParticipants(trx, round, 'opened');
  });
}

export async function closeRound(actor: Actor, slug: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await requireStep(trx, slug, 'close');
    await applyStep(trx, round, 'close', { closedAt: new Date().toISOString() });
    const { submittedCount, participantCount } = await getRoundFacts(trx, round);
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      action: 'round.closed',
      detail: `${submittedCount} of ${participantCount} had sent results; the closing date was ${round.closesAt}`,
    });
  });
}

export async function cancelRound(actor: Actor, slug: string, reason: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await requireStep(trx, slug, 'cancel');
    await applyStep(trx, round, 'cancel', { cancelledAt: new Date().toISOString(), cancelReason: reason });
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      action: 'round.cancelled',
      detail: reason,
    });
    if (!round.isPast) await mailParticipants(trx, round, 'cancelled', reason);
  });
}

export async function publishRound(actor: Actor, slug: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await requireStep(trx, slug, 'publish');
    const evaluation = await findLatestEvaluation(trx, round.id);
    await applyStep(trx, round, 'publish', { publishedAt: new Date().toISOString() });
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      action: 'round.published',
      detail: `evaluation version ${evaluation?.version}`,
    });
    if (!round.isPast) await mailParticipants(trx, round, 'published');
  });
}
