import 'server-only';
import type { Db } from '../connection';
import { fromRow } from '../rows';
import type { Scheme } from '../scheme-store';

export interface SchemeListEntry extends Scheme {
  measurandCount: number;
  roundCount: number;
  openCount: number;
}

/** All schemes by name, with how much is in them. */
export async function listSchemesWithCounts(connection: Db): Promise<SchemeListEntry[]> {
  const measurands = connection('measurands')
    .whereRaw('measurands.scheme_id = schemes.id')
    .count('*')
    .as('measurand_count');
  const rounds = connection('rounds').whereRaw('rounds.scheme_id = schemes.id').count('*').as('round_count');
  const open = connection('rounds')
    .whereRaw('rounds.scheme_id = schemes.id')
    .where('rounds.state', 'open')
    .count('*')
    .as('open_count');
  const rows: Record<string, unknown>[] = await connection('schemes')
    .orderBy('schemes.name')
    .select('schemes.*', measurands, rounds, open);
  return rows.map((row) => fromRow<SchemeListEntry>(row));
}
