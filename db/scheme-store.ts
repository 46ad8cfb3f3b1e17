import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export interface Scheme {
  id: number;
  slug: string;
  name: string;
  description: string;
  createdBy: number | null;
  createdAt: string;
}

export async function listSchemes(connection: Db): Promise<Scheme[]> {
  const rows = await connection('schemes').orderBy('name');
  return rows.map((row) => fromRow<Scheme>(row));
}

export async function findScheme(connection: Db, slug: string): Promise<Scheme | null> {
  const row = await connection('schemes').where({ slug }).first();
  return row ? fromRow<Scheme>(row) : null;
}

export async function getSchemeById(connection: Db, id: number): Promise<Scheme> {
  const row = await connection('schemes').where({ id }).first();
  if (!row) throw new Error(`scheme ${id} is missing`);
  return fromRow<Scheme>(row);
}

export async function createScheme(
  connection: Db,
  scheme: Omit<Scheme, 'id' | 'createdAt'>,
): Promise<number> {
  const [row] = await connection('schemes')
    .insert({ ...toRow(scheme), created_at: timestamp() })
    .returning('id');
  return row.id;
}

export async function updateScheme(
  connection: Db,
  id: number,
  change: Pick<Scheme, 'name' | 'description'>,
): Promise<void> {
  await connection('schemes').where({ id }).update(toRow(change));
}

export async function listSlugsLike(
  connection: Db,
  table: 'schemes' | 'rounds',
  start: string,
): Promise<string[]> {
  const rows = await connection(table).where('slug', 'like', `${start}%`).select('slug');
  return rows.map((row) => row.slug);
}
