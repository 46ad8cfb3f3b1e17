import 'server-only';
import type { Db } from '../connection';
import { fromRow } from '../rows';
import type { EnrolmentState } from '../enrolment-store';

export interface Participant {
  enrolmentId: number;
  laboratoryId: number;
  laboratoryName: string;
  town: string;
  participantCode: string;
  state: EnrolmentState;
  reason: string;
  itemsReceivedAt: string | null;
  submittedAt: string | null;
  resultCount: number | null;
  receiptCode: string | null;
}

/** Everyone enrolled or invited, with names behind codes (the key of a round): ask for `round:see-key` first. */
export async function listParticipants(connection: Db, roundId: number): Promise<Participant[]> {
  const rows = await connection('enrolments')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .leftJoin('submissions', (join) => {
      join.on('submissions.enrolment_id', 'enrolments.id').andOnVal('submissions.state', 'submitted');
    })
    .where('enrolments.round_id', roundId)
    .orderBy('laboratories.name')
    .select(
      'enrolments.id as enrolment_id',
      'enrolments.laboratory_id',
      'laboratories.name as laboratory_name',
      'laboratories.town',
      'enrolments.participant_code',
      'enrolments.state',
      'enrolments.reason',
      'enrolments.items_received_at',
      'submissions.submitted_at',
      'submissions.result_count',
      'submissions.receipt_code',
    );
  return rows.map((row) => fromRow<Participant>(row));
}

export interface Progress {
  enrolled: number;
  submitted: number;
  lastSubmittedAt: string | null;
}

export async function getProgress(connection: Db, roundId: number): Promise<Progress> {
  const row = await connection('enrolments')
    .leftJoin('submissions', (join) => {
      join.on('submissions.enrolment_id', 'enrolments.id').andOnVal('submissions.state', 'submitted');
    })
    .where({ 'enrolments.round_id': roundId, 'enrolments.state': 'enrolled' })
    .first(
      connection.raw('count(enrolments.id) as enrolled'),
      connection.raw('count(submissions.id) as submitted'),
      connection.raw('max(submissions.submitted_at) as last_submitted_at'),
    );
  return {
    enrolled: Number(row.enrolled),
    submitted: Number(row.submitted),
    lastSubmittedAt: row.last_submitted_at,
  };
}
