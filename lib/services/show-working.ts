import 'server-only';
import { db } from '@/db/connection';
import { findLatestEvaluation } from '@/db/evaluation-store';
import { findRound } from '@/db/round-store';
import { getInputsText } from '@/db/views/evaluation-inputs-view';
import { notFound } from '@/lib/errors';
import {
  evaluateMeasurand,
  participantWorking,
  type EvaluateMeasurandInput,
  type MeasurandEvaluation,
  type WorkingStep,
} from '@/lib/stats';

type StoredInput = { roundMeasurandId: number; input: EvaluateMeasurandInput };

/** Figures of an evaluation whose working can be opened; a participant's is asked for by its code. */
export const FIGURES = [
  'assigned',
  'uncertainty',
  'sigma',
  'negligible',
  'median',
  'mad-e',
  'n-iqr',
  'mean',
  'sd',
  'robust-mean',
  'robust-sd',
] as const;

export type Figure = (typeof FIGURES)[number];

const ESTIMATE_OF_METHOD: Record<MeasurandEvaluation['assigned']['method'], Figure[]> = {
  'algorithm-a': ['robust-mean'],
  median: ['median'],
  mean: ['mean'],
  stated: [],
};

const SCALE_OF_METHOD: Record<MeasurandEvaluation['assigned']['method'], Figure[]> = {
  'algorithm-a': ['robust-sd'],
  median: ['mad-e'],
  mean: ['sd'],
  stated: [],
};

const STEP_NAMES: Record<Figure, string> = {
  assigned: 'Assigned value x_pt',
  uncertainty: 'Standard uncertainty u(x_pt)',
  sigma: 'Standard deviation for proficiency assessment sigma_pt',
  negligible: 'Is u(x_pt) at most 0.3 sigma_pt',
  median: 'Median',
  'mad-e': 'MADe',
  'n-iqr': 'nIQR',
  mean: 'Mean',
  sd: 'Standard deviation',
  'robust-mean': 'Robust mean x*',
  'robust-sd': 'Robust standard deviation s*',
};

/** The figure's own step after those it rests on. */
function figuresBehind(figure: Figure, { assigned, sigmaPt }: MeasurandEvaluation): Figure[] {
  if (figure === 'assigned') return [...ESTIMATE_OF_METHOD[assigned.method], figure];
  if (figure === 'uncertainty') return [...SCALE_OF_METHOD[assigned.method], figure];
  if (figure === 'sigma') return sigmaPt.rule === 'robust-sd' ? ['robust-sd', figure] : ['assigned', figure];
  if (figure === 'negligible') return ['uncertainty', 'sigma', figure];
  return [figure];
}

/** Computes the stored inputs again, this time with every step written down; it is only done when asked for. */
async function evaluateAgain(slug: string, roundMeasurandId: number): Promise<MeasurandEvaluation> {
  const round = await findRound(db(), slug);
  const evaluation = round ? await findLatestEvaluation(db(), round.id) : null;
  if (!evaluation) throw notFound('The evaluation');
  const inputs = JSON.parse(await getInputsText(db(), evaluation.id)) as StoredInput[];
  const stored = inputs.find((entry) => entry.roundMeasurandId === roundMeasurandId);
  if (!stored) throw notFound('The measurand');
  return evaluateMeasurand(stored.input, { working: true });
}

export async function getFigureWorking(
  slug: string,
  roundMeasurandId: number,
  figure: Figure,
): Promise<WorkingStep[]> {
  const evaluation = await evaluateAgain(slug, roundMeasurandId);
  const names = figuresBehind(figure, evaluation).map((entry) => STEP_NAMES[entry]);
  return names.flatMap((name) => (evaluation.working ?? []).filter((step) => step.name === name));
}

/** The steps of one participant's scores; they start from x_pt and sigma_pt, whose working stands beside them. */
export function getParticipantWorking(evaluation: MeasurandEvaluation, code: string): readonly WorkingStep[] {
  const isKnown = [...evaluation.scores, ...evaluation.censored].some((entry) => entry.participant === code);
  if (!isKnown) throw notFound('The participant');
  return participantWorking(evaluation, code);
}
