import 'server-only';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export interface TestItem {
  id: number;
  roundId: number;
  code: string;
  name: string;
  matrix: string;
  handling: string;
  position: number;
}

export async function listTestItems(connection: Db, roundId: number): Promise<TestItem[]> {
  const rows = await connection('test_items').where({ round_id: roundId }).orderBy('position');
  return rows.map((row) => fromRow<TestItem>(row));
}

export async function createTestItem(
  connection: Db,
  item: Omit<TestItem, 'id' | 'position'>,
): Promise<number> {
  const last = await connection('test_items')
    .where({ round_id: item.roundId })
    .max<{ position: number | null }>('position as position')
    .first();
  const [row] = await connection('test_items')
    .insert({ ...toRow(item), position: (last?.position ?? 0) + 1 })
    .returning('id');
  return row.id;
}

export async function updateTestItem(
  connection: Db,
  where: { id: number; roundId: number },
  change: Pick<TestItem, 'code' | 'name' | 'matrix' | 'handling'>,
): Promise<number> {
  return connection('test_items').where(toRow(where)).update(toRow(change));
}

export async function removeTestItem(
  connection: Db,
  where: { id: number; roundId: number },
): Promise<number> {
  return connection('test_items').where(toRow(where)).delete();
}
