import 'server-only';
import type { Db } from '../connection';

const CHUNK = 500;

/** Those of the given ids that are active laboratories. */
export async function listKnownLaboratoryIds(connection: Db, ids: readonly number[]): Promise<number[]> {
  const found: number[] = [];
  for (let start = 0; start < ids.length; start += CHUNK) {
    const rows = await connection('laboratories')
      .whereIn('id', ids.slice(start, start + CHUNK))
      .where({ is_active: true })
      .select('id');
    found.push(...rows.map((row) => row.id));
  }
  return found;
}
