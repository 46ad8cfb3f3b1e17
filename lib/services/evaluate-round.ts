import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { listEnrolments } from '@/db/enrolment-store';
import {
  createEvaluatedMeasurands,
  createEvaluation,
  createScores,
  findLatestEvaluation,
  type EvaluatedMeasurand,
  type ScoreRow,
} from '@/db/evaluation-store';
import { listRoundMeasurands, type RoundMeasurand } from '@/db/round-measurand-store';
import { inTransaction } from '@/db/transaction';
import { listRoundResults, type RoundResult } from '@/db/views/round-results-view';
import type { Actor } from '@/lib/rules/roles';
import {
  evaluateMeasurand,
  LIBRARY_VERSION,
  type EvaluateMeasurandInput,
  type MeasurandEvaluation,
} from '@/lib/stats';
import { evaluationInput, hashText, inputsText } from './evaluation-inputs';
import { applyStep, requireStep } from './round-steps';

interface Evaluated {
  plan: RoundMeasurand;
  input: EvaluateMeasurandInput;
  evaluation: MeasurandEvaluation;
}

function evaluateAll(plans: readonly RoundMeasurand[], results: readonly RoundResult[]): Evaluated[] {
  return plans.map((plan) => {
    const input = evaluationInput(
      plan,
      results.filter((result) => result.roundMeasurandId === plan.id),
    );
    return { plan, input, evaluation: evaluateMeasurand(input) };
  });
}

function rowOf({ plan, evaluation }: Evaluated): EvaluatedMeasurand {
  return {
    roundMeasurandId: plan.id,
    assignedValue: evaluation.assigned.value,
    assignedUncertainty: evaluation.assigned.standardUncertainty,
    sigmaPt: evaluation.sigmaPt.value,
    scoreKind: evaluation.scoreKind,
    scoredCount: evaluation.counts.scored,
    bodyJson: JSON.stringify(evaluation),
  };
}

function scoresOf({ plan, evaluation }: Evaluated, enrolmentIds: ReadonlyMap<string, number>): ScoreRow[] {
  const enrolmentOf = (participant: string): number => {
    const id = enrolmentIds.get(participant);
    if (id === undefined) throw new Error(`participant ${participant} is not enrolled`);
    return id;
  };
  const scored = evaluation.scores.map((entry) => ({
    roundMeasurandId: plan.id,
    enrolmentId: enrolmentOf(entry.participant),
    value: entry.value,
    score: entry.score,
    signal: entry.score === null || entry.signal === null ? ('not-scored' as const) : entry.signal,
  }));
  const censored = evaluation.censored.map((entry) => ({
    roundMeasurandId: plan.id,
    enrolmentId: enrolmentOf(entry.participant),
    value: null,
    score: null,
    signal: 'not-scored' as const,
  }));
  return [...scored, ...censored];
}

/** Computes every measurand of a round and keeps the whole as its next version, in the caller's transaction. */
export async function keepEvaluation(
  trx: Db,
  roundId: number,
  by: { userId: number | null; at: string },
): Promise<{ version: number; inputsSha256: string }> {
  const plans = await listRoundMeasurands(trx, roundId);
  const evaluated = evaluateAll(plans, await listRoundResults(trx, roundId));
  const inputs = inputsText(evaluated.map(({ plan, input }) => ({ roundMeasurandId: plan.id, input })));
  const kept = {
    version: ((await findLatestEvaluation(trx, roundId))?.version ?? 0) + 1,
    inputsSha256: hashText(inputs),
  };
  const evaluationId = await createEvaluation(trx, {
    ...kept,
    roundId,
    libraryVersion: LIBRARY_VERSION,
    settingsJson: JSON.stringify(plans),
    inputsJson: inputs,
    createdBy: by.userId,
    createdAt: by.at,
  });
  const enrolments = await listEnrolments(trx, roundId);
  const enrolmentIds = new Map(enrolments.map((enrolment) => [enrolment.participantCode, enrolment.id]));
  await createEvaluatedMeasurands(trx, evaluationId, evaluated.map(rowOf));
  await createScores(
    trx,
    evaluationId,
    evaluated.flatMap((entry) => scoresOf(entry, enrolmentIds)),
  );
  return kept;
}

/** Evaluates a closed round; the version that is kept never changes again. */
export async function evaluateRound(actor: Actor, slug: string): Promise<{ version: number }> {
  return inTransaction(db(), async (trx) => {
    const round = await requireStep(trx, slug, 'evaluate');
    const now = new Date().toISOString();
    const { version, inputsSha256 } = await keepEvaluation(trx, round.id, { userId: actor.userId, at: now });
    await applyStep(trx, round, 'evaluate', { evaluatedAt: now });
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      action: 'round.evaluated',
      detail: `version ${version}, inputs SHA-256 ${inputsSha256}`,
    });
    return { version };
  });
}
