import 'server-only';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export type SigmaRule = 'prescribed' | 'percent' | 'horwitz' | 'horwitz-thompson' | 'robust-sd';

export interface Measurand {
  id: number;
  schemeId: number;
  code: string;
  name: string;
  unit: string;
  decimals: number;
  decisionLimit: number | null;
  decisionLimitSource: string | null;
  sigmaRule: SigmaRule;
  sigmaValue: number | null;
  sigmaPercent: number | null;
  position: number;
}

export async function listMeasurands(connection: Db, schemeId: number): Promise<Measurand[]> {
  const rows = await connection('measurands').where({ scheme_id: schemeId }).orderBy('position');
  return rows.map((row) => fromRow<Measurand>(row));
}

export async function createMeasurand(
  connection: Db,
  measurand: Omit<Measurand, 'id' | 'position'>,
): Promise<number> {
  const last = await connection('measurands')
    .where({ scheme_id: measurand.schemeId })
    .max<{ position: number | null }>('position as position')
    .first();
  const [row] = await connection('measurands')
    .insert({ ...toRow(measurand), position: (last?.position ?? 0) + 1 })
    .returning('id');
  return row.id;
}

export async function updateMeasurand(
  connection: Db,
  id: number,
  change: Omit<Measurand, 'id' | 'schemeId' | 'position'>,
): Promise<void> {
  await connection('measurands').where({ id }).update(toRow(change));
}

/** True when a round already uses the measurand, so that its code and unit must stay. */
export async function isMeasurandInUse(connection: Db, id: number): Promise<boolean> {
  return Boolean(await connection('round_measurands').where({ measurand_id: id }).first('id'));
}
