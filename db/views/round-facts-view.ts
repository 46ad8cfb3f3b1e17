import 'server-only';
import type { Db } from '../connection';

export interface RoundCounts {
  itemCount: number;
  itemsWithoutMeasurand: string[];
  measurandCount: number;
  participantCount: number;
  submittedCount: number;
  measurandsWithoutResult: string[];
  signedBy: string | null;
}

async function count(query: ReturnType<Db>): Promise<number> {
  const row = await query.count<{ n: number | string }[]>('* as n').first();
  return Number(row?.n ?? 0);
}

function currentSubmissions(connection: Db, roundId: number) {
  return connection('submissions').join('enrolments', 'enrolments.id', 'submissions.enrolment_id').where({
    'submissions.round_id': roundId,
    'submissions.state': 'submitted',
    'enrolments.state': 'enrolled',
  });
}

async function listMeasurandsWithoutResult(connection: Db, roundId: number): Promise<string[]> {
  const withResult = currentSubmissions(connection, roundId)
    .join('results', 'results.submission_id', 'submissions.id')
    .where('results.kind', 'value')
    .select('results.round_measurand_id');
  const rows = await connection('round_measurands')
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .where('round_measurands.round_id', roundId)
    .whereNotIn('round_measurands.id', withResult)
    .orderBy(['test_items.position', 'measurands.position'])
    .select('test_items.code as item', 'measurands.code as code');
  return rows.map((row) => `${row.item} ${row.code}`);
}

async function findSigner(connection: Db, roundId: number): Promise<string | null> {
  const latest = connection('evaluations').where({ round_id: roundId }).max('id');
  const row = await connection('sign_offs')
    .join('users', 'users.id', 'sign_offs.user_id')
    .where('sign_offs.evaluation_id', latest)
    .orderBy('sign_offs.id', 'desc')
    .first('sign_offs.decision', 'users.name');
  return row?.decision === 'signed' ? row.name : null;
}

/** What the rules of the next step need to know of a round. */
export async function getRoundCounts(connection: Db, roundId: number): Promise<RoundCounts> {
  const empty = await connection('test_items')
    .leftJoin('round_measurands', 'round_measurands.test_item_id', 'test_items.id')
    .where('test_items.round_id', roundId)
    .whereNull('round_measurands.id')
    .orderBy('test_items.position')
    .select('test_items.code');
  return {
    itemCount: await count(connection('test_items').where({ round_id: roundId })),
    itemsWithoutMeasurand: empty.map((row) => row.code),
    measurandCount: await count(connection('round_measurands').where({ round_id: roundId })),
    participantCount: await count(connection('enrolments').where({ round_id: roundId, state: 'enrolled' })),
    submittedCount: await count(currentSubmissions(connection, roundId)),
    measurandsWithoutResult: await listMeasurandsWithoutResult(connection, roundId),
    signedBy: await findSigner(connection, roundId),
  };
}
