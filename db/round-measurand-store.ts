import 'server-only';
import type { Db } from './connection';
import type { SigmaRule } from './measurand-store';
import { fromRow, toRow } from './rows';

export type AssignedMethod = 'algorithm-a' | 'median' | 'mean' | 'stated';
export type ScoreKind = 'z' | 'z-prime' | 'zeta' | 'e-n';

/** How one measurand in one test item is to be evaluated. */
export interface RoundMeasurandPlan {
  replicates: number;
  assignedMethod: AssignedMethod;
  statedValue: number | null;
  statedUncertainty: number | null;
  statedSource: string | null;
  sigmaRule: SigmaRule;
  sigmaValue: number | null;
  sigmaPercent: number | null;
  scoreKind: ScoreKind;
  zPrimeWhenNeeded: boolean;
}

export interface RoundMeasurand extends RoundMeasurandPlan {
  id: number;
  roundId: number;
  testItemId: number;
  measurandId: number;
  position: number;
  itemCode: string;
  itemName: string;
  code: string;
  name: string;
  unit: string;
  decimals: number;
  decisionLimit: number | null;
  decisionLimitSource: string | null;
}

/** The measurands of a round with the names of their items, in the order of the plan. */
export async function listRoundMeasurands(connection: Db, roundId: number): Promise<RoundMeasurand[]> {
  const rows = await connection('round_measurands')
    .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
    .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
    .where('round_measurands.round_id', roundId)
    .orderBy(['test_items.position', 'measurands.position'])
    .select(
      'round_measurands.*',
      'test_items.code as item_code',
      'test_items.name as item_name',
      'measurands.code as code',
      'measurands.name as name',
      'measurands.unit as unit',
      'measurands.decimals as decimals',
      'measurands.decision_limit as decision_limit',
      'measurands.decision_limit_source as decision_limit_source',
    );
  return rows.map((row) => fromRow<RoundMeasurand>(row, ['zPrimeWhenNeeded']));
}

export async function createRoundMeasurand(
  connection: Db,
  entry: RoundMeasurandPlan & Pick<RoundMeasurand, 'roundId' | 'testItemId' | 'measurandId' | 'position'>,
): Promise<number> {
  const [row] = await connection('round_measurands').insert(toRow(entry)).returning('id');
  return row.id;
}

export async function updateRoundMeasurand(
  connection: Db,
  where: { id: number; roundId: number },
  change: RoundMeasurandPlan,
): Promise<number> {
  return connection('round_measurands').where(toRow(where)).update(toRow(change));
}

export async function removeRoundMeasurand(
  connection: Db,
  where: { id: number; roundId: number },
): Promise<number> {
  return connection('round_measurands').where(toRow(where)).delete();
}
