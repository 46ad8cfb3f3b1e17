import 'server-only';
import type { Db } from '../connection';
import { fromRow } from '../rows';
import type { Result } from '../submission-store';

export interface RoundResult extends Result {
  enrolmentId: number;
  participantCode: string;
}

/** The results that count: of enrolled participants' current submissions, by code, measurand and replicate. */
export async function listRoundResults(
  connection: Db,
  roundId: number,
  filter: { roundMeasurandId?: number; enrolmentId?: number } = {},
): Promise<RoundResult[]> {
  const query = connection('results')
    .join('submissions', 'submissions.id', 'results.submission_id')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .where({
      'submissions.round_id': roundId,
      'submissions.state': 'submitted',
      'enrolments.state': 'enrolled',
    })
    .orderBy(['enrolments.participant_code', 'results.round_measurand_id', 'results.replicate'])
    .select('results.*', 'enrolments.id as enrolment_id', 'enrolments.participant_code');
  if (filter.roundMeasurandId !== undefined)
    query.where('results.round_measurand_id', filter.roundMeasurandId);
  if (filter.enrolmentId !== undefined) query.where('enrolments.id', filter.enrolmentId);
  const rows: Record<string, unknown>[] = await query;
  return rows.map((row) => fromRow<RoundResult>(row));
}
