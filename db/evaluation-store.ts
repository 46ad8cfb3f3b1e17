import 'server-only';
import { setImmediate } from 'node:timers/promises';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export interface Evaluation {
  id: number;
  roundId: number;
  version: number;
  libraryVersion: string;
  inputsSha256: string;
  createdBy: number | null;
  createdAt: string;
}

export interface EvaluatedMeasurand {
  roundMeasurandId: number;
  assignedValue: number | null;
  assignedUncertainty: number | null;
  sigmaPt: number | null;
  scoreKind: string;
  scoredCount: number;
  bodyJson: string;
}

export interface ScoreRow {
  roundMeasurandId: number;
  enrolmentId: number;
  value: number | null;
  score: number | null;
  signal: 'none' | 'warning' | 'action' | 'not-scored';
}

export interface SignOff {
  id: number;
  evaluationId: number;
  userId: number;
  userName: string;
  decision: 'signed' | 'returned';
  comment: string;
  at: string;
}

const SCORES_AT_ONCE = 500;

const HEAD = [
  'id',
  'round_id',
  'version',
  'library_version',
  'inputs_sha256',
  'created_by',
  'created_at',
] as const;

export async function findLatestEvaluation(connection: Db, roundId: number): Promise<Evaluation | null> {
  const row = await connection('evaluations')
    .where({ round_id: roundId })
    .orderBy('version', 'desc')
    .first(...HEAD);
  return row ? fromRow<Evaluation>(row) : null;
}

export async function createEvaluation(
  connection: Db,
  evaluation: Omit<Evaluation, 'id'> & { settingsJson: string; inputsJson: string },
): Promise<number> {
  const [row] = await connection('evaluations').insert(toRow(evaluation)).returning('id');
  return row.id;
}

export async function createEvaluatedMeasurands(
  connection: Db,
  evaluationId: number,
  measurands: Iterable<EvaluatedMeasurand>,
): Promise<void> {
  for (const entry of measurands) {
    await connection('evaluated_measurands').insert({ ...toRow(entry), evaluation_id: evaluationId });
    // The text of one measurand can be a megabyte: others are served in between.
    await setImmediate();
  }
}

export async function createScores(
  connection: Db,
  evaluationId: number,
  scores: Iterable<ScoreRow>,
): Promise<void> {
  let chunk: object[] = [];
  for (const entry of scores) {
    chunk.push({ ...toRow(entry), evaluation_id: evaluationId });
    if (chunk.length < SCORES_AT_ONCE) continue;
    await connection('scores').insert(chunk);
    chunk = [];
    // There can be a hundred thousand of them.
    await setImmediate();
  }
  if (chunk.length > 0) await connection('scores').insert(chunk);
}

export async function findEvaluatedMeasurand(
  connection: Db,
  evaluationId: number,
  roundMeasurandId: number,
): Promise<EvaluatedMeasurand | null> {
  const row = await connection('evaluated_measurands')
    .where({ evaluation_id: evaluationId, round_measurand_id: roundMeasurandId })
    .first();
  return row ? fromRow<EvaluatedMeasurand>(row) : null;
}

export async function listEvaluatedMeasurands(
  connection: Db,
  evaluationId: number,
): Promise<EvaluatedMeasurand[]> {
  const rows = await connection('evaluated_measurands').where({ evaluation_id: evaluationId }).orderBy('id');
  return rows.map((row) => fromRow<EvaluatedMeasurand>(row));
}

export async function listSignOffs(connection: Db, evaluationId: number): Promise<SignOff[]> {
  const rows = await connection('sign_offs')
    .join('users', 'users.id', 'sign_offs.user_id')
    .where({ evaluation_id: evaluationId })
    .orderBy('sign_offs.id')
    .select('sign_offs.*', 'users.name as user_name');
  return rows.map((row) => fromRow<SignOff>(row));
}

export async function createSignOff(
  connection: Db,
  signOff: Pick<SignOff, 'evaluationId' | 'userId' | 'decision' | 'comment'>,
): Promise<void> {
  await connection('sign_offs').insert({ ...toRow(signOff), at: timestamp() });
}
