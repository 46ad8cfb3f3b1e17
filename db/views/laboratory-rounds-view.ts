import 'server-only';
import type { Db } from '../connection';
import type { EnrolmentState } from '../enrolment-store';
import { roundFromRow, type Round } from '../round-store';

export interface LaboratoryRound extends Round {
  schemeName: string;
  participantCode: string;
  enrolmentState: EnrolmentState;
  enrolledAt: string;
  decidedAt: string | null;
  itemsReceivedAt: string | null;
  /** The current submission; null before the first. */
  receiptCode: string | null;
  submittedAt: string | null;
}

function ownRounds(connection: Db, laboratoryId: number) {
  return (
    connection('enrolments')
      .join('rounds', 'rounds.id', 'enrolments.round_id')
      .join('schemes', 'schemes.id', 'rounds.scheme_id')
      .leftJoin('submissions', (join) => {
        join.on('submissions.enrolment_id', 'enrolments.id').andOnVal('submissions.state', 'submitted');
      })
      .where('enrolments.laboratory_id', laboratoryId)
      // A round that is loaded after the event is the provider's own work until it is published.
      .where((query) => query.where('rounds.is_past', false).orWhere('rounds.state', 'published'))
      .select(
        'rounds.*',
        'schemes.name as scheme_name',
        'enrolments.participant_code',
        'enrolments.state as enrolment_state',
        'enrolments.created_at as enrolled_at',
        'enrolments.decided_at',
        'enrolments.items_received_at',
        'submissions.receipt_code',
        'submissions.submitted_at',
      )
  );
}

/** The rounds in which a laboratory has a part, the last to close first. */
export async function listLaboratoryRounds(connection: Db, laboratoryId: number): Promise<LaboratoryRound[]> {
  const rows: Record<string, unknown>[] = await ownRounds(connection, laboratoryId).orderBy([
    { column: 'rounds.closes_at', order: 'desc' },
    { column: 'rounds.id', order: 'desc' },
  ]);
  return rows.map((row) => roundFromRow(row) as LaboratoryRound);
}

export async function findLaboratoryRound(
  connection: Db,
  slug: string,
  laboratoryId: number,
): Promise<LaboratoryRound | null> {
  const row = await ownRounds(connection, laboratoryId).where('rounds.slug', slug).first();
  return row ? (roundFromRow(row) as LaboratoryRound) : null;
}

export interface SignalCount {
  roundId: number;
  signal: 'none' | 'warning' | 'action' | 'not-scored';
  count: number;
}

/** A laboratory's own signals in the newest evaluation of each published round. */
export async function listSignalCounts(connection: Db, laboratoryId: number): Promise<SignalCount[]> {
  const newest = connection('evaluations as later')
    .whereRaw('later.round_id = evaluations.round_id')
    .max('later.version');
  const rows: SignalCount[] = await connection('scores')
    .join('enrolments', 'enrolments.id', 'scores.enrolment_id')
    .join('evaluations', 'evaluations.id', 'scores.evaluation_id')
    .join('rounds', 'rounds.id', 'evaluations.round_id')
    .where({
      'enrolments.laboratory_id': laboratoryId,
      'enrolments.state': 'enrolled',
      'rounds.state': 'published',
    })
    .where('evaluations.version', newest)
    .groupBy('rounds.id', 'scores.signal')
    .select('rounds.id as roundId', 'scores.signal as signal', connection.raw('count(*) as count'));
  return rows.map((row) => ({ ...row, count: Number(row.count) }));
}
