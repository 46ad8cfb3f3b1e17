import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { createSignOff, findLatestEvaluation, listSignOffs, type Evaluation } from '@/db/evaluation-store';
import { findRound, type Round } from '@/db/round-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import { can } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { roundStateWords } from '@/lib/rules/round-states';
import { applyStep, requireStep } from './round-steps';

/** The evaluation that waits for a signature, and the people who prepared it and so may not sign. */
export async function getEvaluationToSign(
  connection: Db,
  slug: string,
): Promise<{ round: Round; evaluation: Evaluation; preparedBy: (number | null)[] }> {
  const round = await findRound(connection, slug);
  if (!round) throw notFound('The round');
  const evaluation = await findLatestEvaluation(connection, round.id);
  if (!evaluation || round.state !== 'evaluated') {
    throw new AppError('conflict', `There is nothing to sign: the round is ${roundStateWords(round.state)}.`);
  }
  return { round, evaluation, preparedBy: [evaluation.createdBy] };
}

async function requireSigner(trx: Db, actor: Actor, slug: string, version: number) {
  const found = await getEvaluationToSign(trx, slug);
  if (actor.userId === null || !can(actor, 'round:sign', { preparedBy: found.preparedBy })) {
    throw new AppError('forbidden', 'An evaluation is signed by a reviewer who did not prepare it.');
  }
  if (found.evaluation.version !== version) {
    throw new AppError(
      'conflict',
      `You read version ${version}; version ${found.evaluation.version} is waiting now. Read it before you sign.`,
    );
  }
  return { ...found, userId: actor.userId };
}

/** Signs the version that the reviewer has read. */
export async function signEvaluation(
  actor: Actor,
  slug: string,
  version: number,
  comment: string,
): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const { round, evaluation, userId } = await requireSigner(trx, actor, slug, version);
    const signed = await listSignOffs(trx, evaluation.id);
    if (signed.some((entry) => entry.userId === userId)) {
      throw new AppError('conflict', `You have signed version ${version} already.`);
    }
    await createSignOff(trx, { evaluationId: evaluation.id, userId, decision: 'signed', comment });
    await addAuditEntry(trx, {
      userId,
      roundId: round.id,
      action: 'evaluation.signed',
      detail: `version ${version}`,
    });
  });
}

/** Sends the evaluation back to review with a comment; it stays in the record. */
export async function returnEvaluation(
  actor: Actor,
  slug: string,
  version: number,
  comment: string,
): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const { evaluation, userId } = await requireSigner(trx, actor, slug, version);
    const round = await requireStep(trx, slug, 'return');
    await createSignOff(trx, { evaluationId: evaluation.id, userId, decision: 'returned', comment });
    await applyStep(trx, round, 'return', { evaluatedAt: null });
    await addAuditEntry(trx, { userId, roundId: round.id, action: 'evaluation.returned', detail: comment });
  });
}
