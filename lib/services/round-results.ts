import 'server-only';
import { db } from '@/db/connection';
import { listParticipants } from '@/db/views/participants-view';
import { listRoundMeasurands, type RoundMeasurand } from '@/db/round-measurand-store';
import { listRoundResults, type RoundResult } from '@/db/views/round-results-view';
import { notFound } from '@/lib/errors';
import { evaluateMeasurand, type MeasurandEvaluation } from '@/lib/stats';
import { evaluationInput } from './evaluation-inputs';
import { getRound } from './round-plan';

export type { RoundResult } from '@/db/views/round-results-view';

export interface ResultsByCode {
  measurands: RoundMeasurand[];
  results: RoundResult[];
  /** Codes of enrolled participants who have sent nothing. */
  missingCodes: string[];
}

/** Every result that counts, by code; who is behind a code is not told here. */
export async function getResultsByCode(slug: string): Promise<ResultsByCode> {
  const round = await getRound(slug);
  const participants = await listParticipants(db(), round.id);
  return {
    measurands: await listRoundMeasurands(db(), round.id),
    results: await listRoundResults(db(), round.id),
    missingCodes: participants
      .filter((entry) => entry.state === 'enrolled' && entry.submittedAt === null)
      .map((entry) => entry.participantCode)
      .sort(),
  };
}

export interface MeasurandReview {
  plan: RoundMeasurand;
  measurands: RoundMeasurand[];
  preview: MeasurandEvaluation;
}

/** What the results of one measurand would give as they stand; nothing is stored. */
export async function reviewMeasurand(slug: string, roundMeasurandId: number): Promise<MeasurandReview> {
  const round = await getRound(slug);
  const measurands = await listRoundMeasurands(db(), round.id);
  const plan = measurands.find((entry) => entry.id === roundMeasurandId);
  if (!plan) throw notFound('The measurand');
  const results = await listRoundResults(db(), round.id, { roundMeasurandId });
  return { plan, measurands, preview: evaluateMeasurand(evaluationInput(plan, results)) };
}
