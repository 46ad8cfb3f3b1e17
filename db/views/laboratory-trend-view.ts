import 'server-only';
import type { Db } from '../connection';
import type { ScoreKind } from '../round-measurand-store';

export interface TrendMeasurand {
  id: number;
  code: string;
  name: string;
  unit: string;
  decimals: number;
  schemeName: string;
  count: number;
}

export interface TrendPoint {
  roundSlug: string;
  roundName: string;
  closesAt: string;
  roundMeasurandId: number;
  item: string;
  value: number | null;
  assignedValue: number | null;
  sigmaPt: number | null;
  scoreKind: ScoreKind;
  score: number | null;
  signal: 'none' | 'warning' | 'action' | 'not-scored';
}

/** A laboratory's own scores in the newest evaluation of each published round. */
function ownScores(connection: Db, laboratoryId: number) {
  const newest = connection('evaluations as later')
    .whereRaw('later.round_id = evaluations.round_id')
    .max('later.version');
  return connection('scores')
    .join('enrolments', 'enrolments.id', 'scores.enrolment_id')
    .join('evaluations', 'evaluations.id', 'scores.evaluation_id')
    .join('rounds', 'rounds.id', 'evaluations.round_id')
    .join('round_measurands', 'round_measurands.id', 'scores.round_measurand_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .where({
      'enrolments.laboratory_id': laboratoryId,
      'enrolments.state': 'enrolled',
      'rounds.state': 'published',
    })
    .where('evaluations.version', newest);
}

/** The measurands a laboratory has been scored for, across the rounds of their schemes. */
export async function listTrendMeasurands(connection: Db, laboratoryId: number): Promise<TrendMeasurand[]> {
  const rows: TrendMeasurand[] = await ownScores(connection, laboratoryId)
    .join('schemes', 'schemes.id', 'measurands.scheme_id')
    .groupBy('measurands.id', 'schemes.name')
    .orderBy(['schemes.name', 'measurands.position'])
    .select(
      'measurands.id as id',
      'measurands.code as code',
      'measurands.name as name',
      'measurands.unit as unit',
      'measurands.decimals as decimals',
      'schemes.name as schemeName',
      connection.raw('count(*) as count'),
    );
  return rows.map((row) => ({ ...row, count: Number(row.count) }));
}

/** A laboratory's own scores for one measurand, in the order in which the rounds closed. */
export async function listTrendPoints(
  connection: Db,
  laboratoryId: number,
  measurandId: number,
): Promise<TrendPoint[]> {
  return ownScores(connection, laboratoryId)
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('evaluated_measurands', (join) => {
      join
        .on('evaluated_measurands.evaluation_id', 'scores.evaluation_id')
        .andOn('evaluated_measurands.round_measurand_id', 'scores.round_measurand_id');
    })
    .where('measurands.id', measurandId)
    .orderBy(['rounds.closes_at', 'rounds.id', 'test_items.position'])
    .select(
      'rounds.slug as roundSlug',
      'rounds.name as roundName',
      'rounds.closes_at as closesAt',
      'scores.round_measurand_id as roundMeasurandId',
      'test_items.code as item',
      'scores.value as value',
      'evaluated_measurands.assigned_value as assignedValue',
      'evaluated_measurands.sigma_pt as sigmaPt',
      'evaluated_measurands.score_kind as scoreKind',
      'scores.score as score',
      'scores.signal as signal',
    );
}
