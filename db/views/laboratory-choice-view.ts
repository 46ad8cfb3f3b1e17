import 'server-only';
import type { Db } from '../connection';

export interface LaboratoryChoice {
  id: number;
  name: string;
  town: string;
}

/** Active laboratories that the round does not have yet. */
export async function listLaboratoriesOutside(connection: Db, roundId: number): Promise<LaboratoryChoice[]> {
  return connection('laboratories')
    .where({ is_active: true })
    .whereNotIn('id', connection('enrolments').where({ round_id: roundId }).select('laboratory_id'))
    .orderBy('name')
    .select('id', 'name', 'town');
}
