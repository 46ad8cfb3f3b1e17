import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, toRow, type Row } from './rows';

export interface Laboratory {
  id: number;
  name: string;
  kind: string;
  town: string;
  contactEmail: string | null;
  isActive: boolean;
  createdAt: string;
}

export type LaboratoryFields = Omit<Laboratory, 'id' | 'createdAt'>;

function toLaboratory(row: Row): Laboratory {
  return fromRow<Laboratory>(row, ['isActive']);
}

/** Whatever but the name is left out keeps the table's default. */
export async function createLaboratory(
  connection: Db,
  fields: Pick<LaboratoryFields, 'name'> & Partial<LaboratoryFields>,
): Promise<number> {
  const [id] = await connection('laboratories').insert({
    ...toRow(fields),
    created_at: timestamp(),
  });
  if (id === undefined) throw new Error('the laboratory was given no id');
  return id;
}

export async function updateLaboratory(
  connection: Db,
  id: number,
  fields: LaboratoryFields,
): Promise<boolean> {
  return (await connection('laboratories').where({ id }).update(toRow(fields))) > 0;
}

export async function findLaboratory(connection: Db, id: number): Promise<Laboratory | null> {
  const row: Row | undefined = await connection('laboratories').where({ id }).first();
  return row ? toLaboratory(row) : null;
}

export async function findLaboratoryByName(connection: Db, name: string): Promise<Laboratory | null> {
  const row: Row | undefined = await connection('laboratories')
    .whereRaw('lower(name) = lower(?)', [name])
    .first();
  return row ? toLaboratory(row) : null;
}

export async function listLaboratories(connection: Db): Promise<Laboratory[]> {
  const rows: Row[] = await connection('laboratories').orderByRaw('lower(name)').select();
  return rows.map(toLaboratory);
}

/** Every laboratory's id and name, for recognising names in a file. */
export async function listLaboratoryNames(connection: Db): Promise<{ id: number; name: string }[]> {
  return connection('laboratories').orderBy('id').select('id', 'name');
}
