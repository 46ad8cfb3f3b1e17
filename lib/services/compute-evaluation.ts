import 'server-only';
import type { Db } from '@/db/connection';
import { listEnrolments } from '@/db/enrolment-store';
import type { EvaluatedMeasurand, ScoreRow } from '@/db/evaluation-store';
import { listRoundMeasurands, type RoundMeasurand } from '@/db/round-measurand-store';
import { listMeasuredResults, listRoundSources, type MeasuredResult } from '@/db/views/round-results-view';
import { evaluateMeasurand, type EvaluateMeasurandInput, type MeasurandEvaluation } from '@/lib/stats';
import { evaluationInput, hashText, inputsText } from './evaluation-inputs';
import { packScores, type PackedScores } from './packed-scores';

/** Text as UTF-8 bytes, whose memory can be handed from thread to thread without a copy. */
type TextBytes = Uint8Array<ArrayBuffer>;

/** Everything that is kept of an evaluation, in a form that passes between threads at little cost. */
export interface ComputedEvaluation {
  readonly settingsJson: string;
  readonly inputsJson: TextBytes;
  readonly inputsSha256: string;
  /** Of the plan, the submissions and the codes that the inputs were made from. */
  readonly sourcesSha256: string;
  readonly measurands: readonly ComputedMeasurand[];
  readonly scores: PackedScores;
}

type ComputedMeasurand = Omit<EvaluatedMeasurand, 'bodyJson'> & { readonly bodyJson: TextBytes };

interface Evaluated {
  readonly plan: RoundMeasurand;
  readonly input: EvaluateMeasurandInput;
  readonly evaluation: MeasurandEvaluation;
}

/** Evaluates every measurand of a round from what `connection` shows. */
export async function computeEvaluation(connection: Db, roundId: number): Promise<ComputedEvaluation> {
  const sourcesSha256 = await hashSources(connection, roundId);
  const plans = await listRoundMeasurands(connection, roundId);
  const results = groupByMeasurand(await listMeasuredResults(connection, roundId));
  const enrolments = await listEnrolments(connection, roundId);
  const enrolmentIds = new Map(enrolments.map((enrolment) => [enrolment.participantCode, enrolment.id]));
  const evaluated = plans.map((plan) => {
    const input = evaluationInput(plan, results.get(plan.id) ?? []);
    return { plan, input, evaluation: evaluateMeasurand(input) };
  });
  const inputsJson = inputsText(evaluated.map(({ plan, input }) => ({ roundMeasurandId: plan.id, input })));
  return {
    settingsJson: JSON.stringify(plans),
    inputsJson: encoder.encode(inputsJson),
    inputsSha256: hashText(inputsJson),
    sourcesSha256,
    measurands: evaluated.map(rowOf),
    scores: packScores(evaluated.flatMap((entry) => scoresOf(entry, enrolmentIds))),
  };
}

/**
 * The same plan and submissions give the same hash. Results are written once, so that this stands for the inputs
 * themselves and costs a row a laboratory.
 */
export async function hashSources(connection: Db, roundId: number): Promise<string> {
  const plans = await listRoundMeasurands(connection, roundId);
  return hashText(JSON.stringify([plans, await listRoundSources(connection, roundId)]));
}

function groupByMeasurand(results: readonly MeasuredResult[]): Map<number, MeasuredResult[]> {
  const groups = new Map<number, MeasuredResult[]>();
  for (const result of results) {
    const group = groups.get(result.roundMeasurandId);
    if (group) group.push(result);
    else groups.set(result.roundMeasurandId, [result]);
  }
  return groups;
}

const encoder = new TextEncoder();
const decoder = new TextDecoder();

export function textOf(bytes: TextBytes): string {
  return decoder.decode(bytes);
}

/** One by one, so that the long texts never all exist at once. */
export function* measurandRows({ measurands }: ComputedEvaluation): Generator<EvaluatedMeasurand> {
  for (const measurand of measurands) yield { ...measurand, bodyJson: textOf(measurand.bodyJson) };
}

/** The memory that another thread may take over. */
export function buffersOf({ inputsJson, measurands, scores }: ComputedEvaluation): ArrayBuffer[] {
  const blocks = [inputsJson, ...measurands.map(({ bodyJson }) => bodyJson), ...Object.values(scores)];
  return blocks.map(({ buffer }) => buffer);
}

function rowOf({ plan, evaluation }: Evaluated): ComputedMeasurand {
  return {
    roundMeasurandId: plan.id,
    assignedValue: evaluation.assigned.value,
    assignedUncertainty: evaluation.assigned.standardUncertainty,
    sigmaPt: evaluation.sigmaPt.value,
    scoreKind: evaluation.scoreKind,
    scoredCount: evaluation.counts.scored,
    bodyJson: encoder.encode(JSON.stringify(evaluation)),
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
