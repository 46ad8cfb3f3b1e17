import 'server-only';
import type { Db } from '../connection';
import { fromRow } from '../rows';
import type { Channel, Result } from '../submission-store';

export interface ReceiptHead {
  submissionId: number;
  receiptCode: string;
  sha256: string;
  byteCount: number;
  fileName: string;
  channel: Channel;
  state: 'submitted' | 'superseded';
  resultCount: number;
  submittedAt: string;
  userName: string | null;
  tokenName: string | null;
  laboratoryName: string;
  participantCode: string;
  replaces: string | null;
  replacedBy: string | null;
  replacedAt: string | null;
}

interface Owned {
  slug: string;
  laboratoryId: number;
}

function ownSubmissions(connection: Db, { slug, laboratoryId }: Owned) {
  return connection('submissions')
    .join('rounds', 'rounds.id', 'submissions.round_id')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .join('uploads', 'uploads.id', 'submissions.upload_id')
    .where({ 'rounds.slug': slug, 'enrolments.laboratory_id': laboratoryId });
}

function ownReceipts(connection: Db, owned: Owned) {
  return ownSubmissions(connection, owned)
    .leftJoin('users', 'users.id', 'submissions.user_id')
    .leftJoin('api_tokens', 'api_tokens.id', 'submissions.api_token_id')
    .leftJoin('submissions as earlier', 'earlier.id', 'submissions.supersedes_id')
    .leftJoin('submissions as later', 'later.supersedes_id', 'submissions.id')
    .select(
      'submissions.id as submission_id',
      'submissions.receipt_code',
      'submissions.file_name',
      'submissions.channel',
      'submissions.state',
      'submissions.result_count',
      'submissions.submitted_at',
      'uploads.sha256',
      'uploads.byte_count',
      'users.name as user_name',
      'api_tokens.name as token_name',
      'laboratories.name as laboratory_name',
      'enrolments.participant_code',
      'earlier.receipt_code as replaces',
      'later.receipt_code as replaced_by',
      'later.submitted_at as replaced_at',
    );
}

/** Every submission of a laboratory in a round, the newest first. */
export async function listOwnReceipts(connection: Db, owned: Owned): Promise<ReceiptHead[]> {
  const rows = await ownReceipts(connection, owned).orderBy('submissions.id', 'desc');
  return rows.map((row) => fromRow<ReceiptHead>(row));
}

export async function findOwnReceipt(
  connection: Db,
  owned: Owned & { receiptCode: string },
): Promise<ReceiptHead | null> {
  const row = await ownReceipts(connection, owned)
    .where('submissions.receipt_code', owned.receiptCode)
    .first();
  return row ? fromRow<ReceiptHead>(row) : null;
}

export interface ReceiptRow extends Omit<Result, 'submissionId' | 'roundMeasurandId' | 'method'> {
  item: string;
  measurand: string;
  unit: string;
  decimals: number;
}

/** The results of one of the laboratory's own submissions, in the order of the file. */
export async function listOwnResults(
  connection: Db,
  owned: Owned & { receiptCode: string },
): Promise<ReceiptRow[]> {
  const rows = await ownSubmissions(connection, owned)
    .join('results', 'results.submission_id', 'submissions.id')
    .join('round_measurands', 'round_measurands.id', 'results.round_measurand_id')
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .where('submissions.receipt_code', owned.receiptCode)
    .orderBy('results.line')
    .select(
      'results.line',
      'results.replicate',
      'results.result_text',
      'results.kind',
      'results.value',
      'results.own_value',
      'results.own_unit',
      'results.uncertainty_text',
      'results.expanded_uncertainty',
      'results.coverage_factor',
      'results.loq',
      'results.analysed_on',
      'results.comment',
      'test_items.code as item',
      'measurands.code as measurand',
      'measurands.unit',
      'measurands.decimals',
    );
  return rows.map((row) => fromRow<ReceiptRow>(row));
}

/**
 * The bytes as the laboratory sent them. A file with the whole round holds other laboratories' results, so it is
 * never given to a laboratory.
 */
export async function findOwnFile(
  connection: Db,
  owned: Owned & { receiptCode: string },
): Promise<{ fileName: string; bytes: Uint8Array } | null> {
  const row = await ownSubmissions(connection, owned)
    .where('submissions.receipt_code', owned.receiptCode)
    .whereIn('submissions.channel', ['browser', 'token'])
    .first('submissions.file_name as fileName', 'uploads.bytes as bytes');
  return row ?? null;
}

export interface PublicReceipt {
  receiptCode: string;
  roundName: string;
  schemeName: string;
  submittedAt: string;
  sha256: string;
  replacedAt: string | null;
}

/** What anyone with the code may know of a receipt: neither whose it is nor what was measured. */
export async function findPublicReceipt(connection: Db, receiptCode: string): Promise<PublicReceipt | null> {
  const row = await connection('submissions')
    .join('rounds', 'rounds.id', 'submissions.round_id')
    .join('schemes', 'schemes.id', 'rounds.scheme_id')
    .join('uploads', 'uploads.id', 'submissions.upload_id')
    .leftJoin('submissions as later', 'later.supersedes_id', 'submissions.id')
    .where('submissions.receipt_code', receiptCode)
    .first(
      'submissions.receipt_code as receiptCode',
      'rounds.name as roundName',
      'schemes.name as schemeName',
      'submissions.submitted_at as submittedAt',
      'uploads.sha256 as sha256',
      'later.submitted_at as replacedAt',
    );
  return row ?? null;
}
