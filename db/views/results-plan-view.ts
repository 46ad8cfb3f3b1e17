import 'server-only';
import type { Db } from '../connection';

export interface PlanRow {
  roundMeasurandId: number;
  item: string;
  itemName: string;
  measurand: string;
  name: string;
  unit: string;
  replicates: number;
}

/** The rows a results file of this round is checked against, in the order of the plan. */
export async function listPlanRows(connection: Db, roundId: number): Promise<PlanRow[]> {
  return connection('round_measurands')
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .where('round_measurands.round_id', roundId)
    .orderBy(['test_items.position', 'measurands.position'])
    .select(
      'round_measurands.id as roundMeasurandId',
      'test_items.code as item',
      'test_items.name as itemName',
      'measurands.code as measurand',
      'measurands.name as name',
      'measurands.unit as unit',
      'round_measurands.replicates as replicates',
    );
}
