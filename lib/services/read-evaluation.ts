import 'server-only';
import { db, type Db } from '@/db/connection';
import { findEnrolment } from '@/db/enrolment-store';
import {
  findLatestEvaluation,
  listEvaluatedMeasurands,
  listSignOffs,
  type Evaluation,
  type SignOff,
} from '@/db/evaluation-store';
import type { RoundMeasurand } from '@/db/round-measurand-store';
import { findRound, type Round } from '@/db/round-store';
import { getSettingsText } from '@/db/views/evaluation-inputs-view';
import { findUserName, listRoleHolders } from '@/db/views/round-people-view';
import { notFound } from '@/lib/errors';
import { can, laboratoriesOf } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import type { MeasurandEvaluation } from '@/lib/stats';

export interface EvaluatedPlan {
  plan: RoundMeasurand;
  evaluation: MeasurandEvaluation;
}

export interface RoundEvaluation {
  round: Round;
  evaluation: Evaluation;
  signOffs: SignOff[];
  measurands: EvaluatedPlan[];
}

/**
 * The newest evaluation of a round with every measurand, or null before the first. Names, decimals and limits are those
 * it was made with: what the scheme says today must not change a report that was signed.
 */
export async function findRoundEvaluation(connection: Db, round: Round): Promise<RoundEvaluation | null> {
  const evaluation = await findLatestEvaluation(connection, round.id);
  if (!evaluation) return null;
  const plans = JSON.parse(await getSettingsText(connection, evaluation.id)) as RoundMeasurand[];
  const bodies = new Map(
    (await listEvaluatedMeasurands(connection, evaluation.id)).map((entry) => [
      entry.roundMeasurandId,
      entry.bodyJson,
    ]),
  );
  const measurands = plans.flatMap((plan) => {
    const body = bodies.get(plan.id);
    return body === undefined ? [] : [{ plan, evaluation: JSON.parse(body) as MeasurandEvaluation }];
  });
  return { round, evaluation, signOffs: await listSignOffs(connection, evaluation.id), measurands };
}

export interface VisibleEvaluation extends RoundEvaluation {
  /** Codes of the asking person's own laboratories in this round. */
  ownCodes: string[];
}

/** The evaluation as far as it may be shown to whoever asks: staff always, a participant once it is published. */
export async function getVisibleEvaluation(actor: Actor, slug: string): Promise<VisibleEvaluation> {
  const round = await findRound(db(), slug);
  if (!round) throw notFound('The evaluation');
  const ownCodes: string[] = [];
  for (const laboratory of laboratoriesOf(actor)) {
    const enrolment = await findEnrolment(db(), round.id, laboratory.id);
    if (enrolment?.state === 'enrolled') ownCodes.push(enrolment.participantCode);
  }
  const isParticipantAfterwards = round.state === 'published' && ownCodes.length > 0;
  if (!can(actor, 'round:see-results') && !isParticipantAfterwards) throw notFound('The evaluation');
  const found = await findRoundEvaluation(db(), round);
  if (!found) throw notFound('The evaluation');
  return { ...found, ownCodes };
}

export interface PreparedEvaluation extends RoundEvaluation {
  preparedByName: string | null;
}

/** The newest evaluation as the provider's staff sees it; null before the first. */
export async function getPreparedEvaluation(slug: string): Promise<PreparedEvaluation | null> {
  const round = await findRound(db(), slug);
  if (!round) throw notFound('The round');
  const found = await findRoundEvaluation(db(), round);
  if (!found) return null;
  return { ...found, preparedByName: await findUserName(db(), found.evaluation.createdBy) };
}

/** The people who may sign a version: reviewers who did not prepare it. */
export async function listSigners(evaluation: Pick<Evaluation, 'createdBy'>): Promise<string[]> {
  const reviewers = await listRoleHolders(db(), 'reviewer');
  return reviewers.filter(({ id }) => id !== evaluation.createdBy).map(({ name }) => name);
}
