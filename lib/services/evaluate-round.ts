import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { databaseFile, db, type Db } from '@/db/connection';
import {
  createEvaluatedMeasurands,
  createEvaluation,
  createScores,
  findLatestEvaluation,
} from '@/db/evaluation-store';
import { inTransaction } from '@/db/transaction';
import { listRoundSources } from '@/db/views/round-results-view';
import { AppError } from '@/lib/errors';
import { log } from '@/lib/log';
import type { Actor } from '@/lib/rules/roles';
import { LIBRARY_VERSION } from '@/lib/stats';
import {
  computeEvaluation,
  hashSources,
  measurandRows,
  textOf,
  type ComputedEvaluation,
} from './compute-evaluation';
import { evaluateInWorker, WorkerLost } from './evaluation-worker/evaluate-in-worker';
import { unpackScores } from './packed-scores';
import { applyStep, requireStep } from './round-steps';

/** A round with more results is evaluated in a thread of its own, so that the server goes on answering. */
export const MANY_RESULTS = 20_000;

/** Keeps an evaluation of a round as its next version, in the caller's transaction; computes it when it is not given. */
export async function keepEvaluation(
  trx: Db,
  roundId: number,
  by: { userId: number | null; at: string },
  early: ComputedEvaluation | null = null,
): Promise<{ version: number; inputsSha256: string }> {
  const computed = early ?? (await computeEvaluation(trx, roundId));
  const kept = {
    version: ((await findLatestEvaluation(trx, roundId))?.version ?? 0) + 1,
    inputsSha256: computed.inputsSha256,
  };
  const evaluationId = await createEvaluation(trx, {
    ...kept,
    roundId,
    libraryVersion: LIBRARY_VERSION,
    settingsJson: computed.settingsJson,
    inputsJson: textOf(computed.inputsJson),
    createdBy: by.userId,
    createdAt: by.at,
  });
  await createEvaluatedMeasurands(trx, evaluationId, measurandRows(computed));
  await createScores(trx, evaluationId, unpackScores(computed.scores));
  return kept;
}

/** Evaluates a closed round; the version that is kept never changes again. */
export async function evaluateRound(
  actor: Actor,
  slug: string,
  { manyResults = MANY_RESULTS, workerScript }: { manyResults?: number; workerScript?: string } = {},
): Promise<{ version: number }> {
  return keepEarly(actor, slug, await computeLargeRound(slug, manyResults, workerScript));
}

/** Keeps what was computed beforehand, unless its sources have changed; without it computes now. */
export async function keepEarly(
  actor: Actor,
  slug: string,
  early: ComputedEvaluation | null,
): Promise<{ version: number }> {
  return inTransaction(db(), async (trx) => {
    const round = await requireStep(trx, slug, 'evaluate');
    if (early && early.sourcesSha256 !== (await hashSources(trx, round.id))) {
      throw new AppError(
        'conflict',
        'The results or the plan of this round changed while it was evaluated. Nothing was kept; evaluate it again.',
      );
    }
    const now = new Date().toISOString();
    const by = { userId: actor.userId, at: now };
    const { version, inputsSha256 } = await keepEvaluation(trx, round.id, by, early);
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

/** The evaluation of a large round from its own thread; null for others, and where there is no thread to be had. */
async function computeLargeRound(
  slug: string,
  manyResults: number,
  workerScript?: string,
): Promise<ComputedEvaluation | null> {
  const round = await requireStep(db(), slug, 'evaluate');
  const sources = await listRoundSources(db(), round.id);
  const count = sources.reduce((sum, { resultCount }) => sum + resultCount, 0);
  if (count <= manyResults) return null;
  try {
    return await evaluateInWorker(databaseFile(), round.id, workerScript);
  } catch (error) {
    if (!(error instanceof WorkerLost)) throw error;
    log.warn({ err: error, results: count }, 'evaluating in the main thread');
    return null;
  }
}
