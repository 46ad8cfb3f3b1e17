import 'server-only';
import { db } from '@/db/connection';
import { findLaboratoryRound, type LaboratoryRound } from '@/db/views/laboratory-rounds-view';
import { findRound } from '@/db/round-store';
import { notFound } from '@/lib/errors';
import type { CensoredScore, MeasurandEvaluation, ParticipantScore, WorkingStep } from '@/lib/stats';
import { getFigureWorking, type Figure } from './show-working';
import { findRoundEvaluation, type EvaluatedPlan, type RoundEvaluation } from './read-evaluation';

/** One measurand of a published round with the laboratory's own entry; null when it reported nothing for it. */
export interface OwnEntry extends EvaluatedPlan {
  scored: ParticipantScore | null;
  censored: CensoredScore | null;
}

export interface OwnScores {
  round: LaboratoryRound;
  ownCode: string;
  published: Pick<RoundEvaluation, 'evaluation'> & { signedAt: string | null };
  entries: OwnEntry[];
}

/** The scores of a published round for one participant; null before publication and without an enrolment. */
export async function findOwnScores(slug: string, laboratoryId: number): Promise<OwnScores | null> {
  const own = await findLaboratoryRound(db(), slug, laboratoryId);
  if (own?.state !== 'published' || own.enrolmentState !== 'enrolled') return null;
  const round = await findRound(db(), slug);
  const found = round && (await findRoundEvaluation(db(), round));
  if (!found) return null;
  const code = own.participantCode;
  return {
    round: own,
    ownCode: code,
    published: {
      evaluation: found.evaluation,
      signedAt: found.signOffs.findLast((entry) => entry.decision === 'signed')?.at ?? null,
    },
    entries: found.measurands.map((entry) => ({ ...entry, ...ownEntry(entry.evaluation, code) })),
  };
}

function ownEntry(evaluation: MeasurandEvaluation, code: string): Pick<OwnEntry, 'scored' | 'censored'> {
  return {
    scored: evaluation.scores.find((entry) => entry.participant === code) ?? null,
    censored: evaluation.censored.find((entry) => entry.participant === code) ?? null,
  };
}

/** One measurand of a published round, for a participant. */
export async function getOwnEntry(
  slug: string,
  laboratoryId: number,
  roundMeasurandId: number,
): Promise<OwnScores & { entry: OwnEntry }> {
  const scores = await findOwnScores(slug, laboratoryId);
  const entry = scores?.entries.find(({ plan }) => plan.id === roundMeasurandId);
  if (!scores || !entry) throw notFound('The scores');
  return { ...scores, entry };
}

/** The working of a figure of a published round, for a participant. */
export async function getOwnFigureWorking(
  slug: string,
  laboratoryId: number,
  roundMeasurandId: number,
  figure: Figure,
): Promise<WorkingStep[]> {
  await getOwnEntry(slug, laboratoryId, roundMeasurandId);
  return getFigureWorking(slug, roundMeasurandId, figure);
}
