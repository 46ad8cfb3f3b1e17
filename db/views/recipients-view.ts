import 'server-only';
import type { Db } from '../connection';

export interface Recipient {
  userId: number;
  name: string;
  email: string;
  laboratoryId: number;
  laboratoryName: string;
}

/** The people of the laboratories that are invited to a round or take part in it. */
export async function listRoundRecipients(
  connection: Db,
  roundId: number,
  laboratoryId?: number,
): Promise<Recipient[]> {
  const query = connection('enrolments')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .join('memberships', 'memberships.laboratory_id', 'laboratories.id')
    .join('users', 'users.id', 'memberships.user_id')
    .where({ 'enrolments.round_id': roundId, 'users.is_disabled': false })
    .whereIn('enrolments.state', ['invited', 'enrolled'])
    .distinct(
      'users.id as userId',
      'users.name as name',
      'users.email as email',
      'laboratories.id as laboratoryId',
      'laboratories.name as laboratoryName',
    );
  if (laboratoryId !== undefined) query.where('laboratories.id', laboratoryId);
  return query;
}
