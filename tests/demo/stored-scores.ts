import type { Knex } from 'knex';

export interface StoredScore {
  laboratory: string;
  round: string;
  item: string;
  measurand: string;
  closesAt: string;
  value: number | null;
  assigned: number;
  score: number | null;
  signal: string;
  participantCode: string;
  bodyJson: string;
}

/** Every score of the latest evaluations, with the laboratory behind the code, in the order of the rounds. */
export async function storedScores(connection: Knex): Promise<StoredScore[]> {
  return connection('scores')
    .join('evaluations', 'evaluations.id', 'scores.evaluation_id')
    .join('evaluated_measurands', (join) => {
      join
        .on('evaluated_measurands.evaluation_id', 'scores.evaluation_id')
        .andOn('evaluated_measurands.round_measurand_id', 'scores.round_measurand_id');
    })
    .join('enrolments', 'enrolments.id', 'scores.enrolment_id')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .join('rounds', 'rounds.id', 'evaluations.round_id')
    .join('round_measurands', 'round_measurands.id', 'scores.round_measurand_id')
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .orderBy(['rounds.closes_at', 'scores.id'])
    .select({
      laboratory: 'laboratories.name',
      round: 'rounds.slug',
      item: 'test_items.code',
      measurand: 'measurands.code',
      closesAt: 'rounds.closes_at',
      value: 'scores.value',
      assigned: 'evaluated_measurands.assigned_value',
      score: 'scores.score',
      signal: 'scores.signal',
      participantCode: 'enrolments.participant_code',
      bodyJson: 'evaluated_measurands.body_json',
    });
}

export interface StoredResult {
  laboratory: string;
  round: string;
  item: string;
  measurand: string;
  replicate: number;
  kind: string;
  resultText: string;
  value: number | null;
  ownUnit: string;
  method: string;
  comment: string;
}

/** The results of current submissions as they are kept. */
export async function storedResults(connection: Knex): Promise<StoredResult[]> {
  return connection('results')
    .join('submissions', 'submissions.id', 'results.submission_id')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .join('rounds', 'rounds.id', 'submissions.round_id')
    .join('round_measurands', 'round_measurands.id', 'results.round_measurand_id')
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .where('submissions.state', 'submitted')
    .select({
      laboratory: 'laboratories.name',
      round: 'rounds.slug',
      item: 'test_items.code',
      measurand: 'measurands.code',
      replicate: 'results.replicate',
      kind: 'results.kind',
      resultText: 'results.result_text',
      value: 'results.value',
      ownUnit: 'results.own_unit',
      method: 'results.method',
      comment: 'results.comment',
    });
}

export function meanOf(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
