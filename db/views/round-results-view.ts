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
  const query = countingResults(connection, roundId)
    .orderBy(['enrolments.participant_code', 'results.round_measurand_id', 'results.replicate'])
    .select('results.*', 'enrolments.id as enrolment_id', 'enrolments.participant_code');
  if (filter.roundMeasurandId !== undefined)
    query.where('results.round_measurand_id', filter.roundMeasurandId);
  if (filter.enrolmentId !== undefined) query.where('enrolments.id', filter.enrolmentId);
  const rows: Record<string, unknown>[] = await query;
  return rows.map((row) => fromRow<RoundResult>(row));
}

/** The part of a result that the evaluation looks at. */
export type MeasuredResult = Pick<
  RoundResult,
  'roundMeasurandId' | 'participantCode' | 'kind' | 'value' | 'expandedUncertainty' | 'coverageFactor'
>;

/** The same results and order as listRoundResults, with no more than an evaluation needs. */
export async function listMeasuredResults(connection: Db, roundId: number): Promise<MeasuredResult[]> {
  return countingResults(connection, roundId)
    .orderBy(['enrolments.participant_code', 'results.round_measurand_id', 'results.replicate'])
    .select(
      'results.round_measurand_id as roundMeasurandId',
      'enrolments.participant_code as participantCode',
      'results.kind as kind',
      'results.value as value',
      'results.expanded_uncertainty as expandedUncertainty',
      'results.coverage_factor as coverageFactor',
    );
}

/** The submissions whose results count, by enrolment; since results are written once, these tell which they are. */
export async function listRoundSources(
  connection: Db,
  roundId: number,
): Promise<{ submissionId: number; resultCount: number; participantCode: string; enrolmentId: number }[]> {
  return connection('submissions')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .where({
      'submissions.round_id': roundId,
      'submissions.state': 'submitted',
      'enrolments.state': 'enrolled',
    })
    .orderBy('submissions.id')
    .select(
      'submissions.id as submissionId',
      'submissions.result_count as resultCount',
      'enrolments.participant_code as participantCode',
      'enrolments.id as enrolmentId',
    );
}

function countingResults(connection: Db, roundId: number) {
  return connection('results')
    .join('submissions', 'submissions.id', 'results.submission_id')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .where({
      'submissions.round_id': roundId,
      'submissions.state': 'submitted',
      'enrolments.state': 'enrolled',
    });
}
