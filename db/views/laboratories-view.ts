import 'server-only';
import type { Db } from '../connection';
import { fromRow, type Row } from '../rows';
import { fetchPage, whereAnyContains, type Page } from './text-search';

export interface LaboratoryLine {
  id: number;
  name: string;
  kind: string;
  town: string;
  isActive: boolean;
  peopleCount: number;
  roundCount: number;
}

/** One page of the laboratories, by name, with how many people and rounds each has. */
export async function listLaboratoryLines(
  connection: Db,
  asked: { text: string; page: number },
): Promise<Page<LaboratoryLine>> {
  const page = await fetchPage<Row>({
    query: whereAnyContains(
      connection('laboratories'),
      ['laboratories.name', 'laboratories.town', 'laboratories.kind'],
      asked.text,
    ),
    page: asked.page,
    select: (query) =>
      query
        .orderByRaw('lower(laboratories.name)')
        .select('id', 'name', 'kind', 'town', 'is_active')
        .select({
          people_count: connection('memberships')
            .countDistinct('memberships.user_id')
            .whereRaw('memberships.laboratory_id = laboratories.id'),
          round_count: connection('enrolments')
            .count('*')
            .whereRaw('enrolments.laboratory_id = laboratories.id')
            .where('enrolments.state', 'enrolled'),
        }),
  });
  return { ...page, rows: page.rows.map((row) => fromRow<LaboratoryLine>(row, ['isActive'])) };
}

export interface EnrolmentLine {
  roundName: string;
  roundSlug: string;
  roundState: string;
  state: 'invited' | 'enrolled' | 'declined' | 'withdrawn';
  closesAt: string;
  hasSubmitted: boolean;
}

/** A laboratory's rounds, newest first. The participant codes stay out: looking at that key is logged elsewhere. */
export async function listEnrolmentsOfLaboratory(
  connection: Db,
  laboratoryId: number,
): Promise<EnrolmentLine[]> {
  const rows: Row[] = await connection('enrolments')
    .join('rounds', 'rounds.id', 'enrolments.round_id')
    .leftJoin('submissions', (join) => {
      join.on('submissions.enrolment_id', 'enrolments.id').andOnVal('submissions.state', 'submitted');
    })
    .where('enrolments.laboratory_id', laboratoryId)
    .orderBy([
      { column: 'rounds.closes_at', order: 'desc' },
      { column: 'rounds.id', order: 'desc' },
    ])
    .select({
      round_name: 'rounds.name',
      round_slug: 'rounds.slug',
      round_state: 'rounds.state',
      state: 'enrolments.state',
      closes_at: 'rounds.closes_at',
    })
    .select(connection.raw('submissions.id is not null as has_submitted'));
  return rows.map((row) => fromRow<EnrolmentLine>(row, ['hasSubmitted']));
}
