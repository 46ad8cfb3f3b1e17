import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export type Channel = 'browser' | 'token' | 'whole-round';
export type ResultKind = 'value' | 'below' | 'above' | 'not-measured';

export interface Submission {
  id: number;
  roundId: number;
  enrolmentId: number;
  uploadId: number;
  fileName: string;
  state: 'submitted' | 'superseded';
  channel: Channel;
  receiptCode: string;
  resultCount: number;
  supersedesId: number | null;
  userId: number | null;
  apiTokenId: number | null;
  submittedAt: string;
}

export interface Result {
  submissionId: number;
  roundMeasurandId: number;
  replicate: number;
  line: number;
  resultText: string;
  kind: ResultKind;
  /** In the plan's unit; for `below` and `above` the limit; null when not measured. */
  value: number | null;
  ownValue: number | null;
  ownUnit: string;
  uncertaintyText: string;
  /** In the plan's unit. */
  expandedUncertainty: number | null;
  coverageFactor: number | null;
  loq: number | null;
  method: string;
  analysedOn: string | null;
  comment: string;
}

const INSERT_CHUNK = 500;

/** Keeps the bytes once, whoever sends them; returns the id of the kept copy. */
export async function keepUpload(connection: Db, sha256: string, bytes: Uint8Array): Promise<number> {
  const known = await connection('uploads').where({ sha256 }).first('id');
  if (known) return known.id;
  const [row] = await connection('uploads')
    .insert({
      sha256,
      bytes: Buffer.from(bytes),
      byte_count: bytes.byteLength,
      created_at: timestamp(),
    })
    .returning('id');
  return row.id;
}

export async function findCurrentSubmission(
  connection: Db,
  enrolmentId: number,
): Promise<(Submission & { sha256: string }) | null> {
  const row = await connection('submissions')
    .join('uploads', 'uploads.id', 'submissions.upload_id')
    .where({ 'submissions.enrolment_id': enrolmentId, 'submissions.state': 'submitted' })
    .first('submissions.*', 'uploads.sha256');
  return row ? fromRow<Submission & { sha256: string }>(row) : null;
}

/** The laboratories whose results that count came from themselves, not with a whole round. */
export async function listOwnSenders(
  connection: Db,
  roundId: number,
): Promise<{ laboratoryId: number; name: string }[]> {
  return connection('submissions')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .where({ 'submissions.round_id': roundId, 'submissions.state': 'submitted' })
    .whereNot('submissions.channel', 'whole-round')
    .orderBy('laboratories.name')
    .select('laboratories.id as laboratoryId', 'laboratories.name as name');
}

export async function markSuperseded(connection: Db, id: number): Promise<void> {
  await connection('submissions').where({ id }).update({ state: 'superseded' });
}

export async function createSubmission(
  connection: Db,
  submission: Omit<Submission, 'id' | 'state'>,
): Promise<number> {
  const [row] = await connection('submissions')
    .insert({ ...toRow(submission), state: 'submitted' })
    .returning('id');
  return row.id;
}

export async function createResults(connection: Db, results: readonly Result[]): Promise<void> {
  await connection.batchInsert('results', results.map(toRow), INSERT_CHUNK);
}
