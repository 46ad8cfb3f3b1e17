import 'server-only';
import type { Db } from '../connection';
import type { EnrolmentState } from '../enrolment-store';

export interface Recipient {
  userId: number;
  name: string;
  email: string;
  laboratoryId: number;
  laboratoryName: string;
}

/** The people of the laboratories whose part in a round is one of `states`, or of one laboratory. */
export async function listRoundRecipients(
  connection: Db,
  roundId: number,
  only: { states: readonly EnrolmentState[]; laboratoryId?: number },
): Promise<Recipient[]> {
  const query = connection('enrolments')
    .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
    .join('memberships', 'memberships.laboratory_id', 'laboratories.id')
    .join('users', 'users.id', 'memberships.user_id')
    .where({ 'enrolments.round_id': roundId, 'users.is_disabled': false })
    .whereIn('enrolments.state', only.states)
    .distinct(
      'users.id as userId',
      'users.name as name',
      'users.email as email',
      'laboratories.id as laboratoryId',
      'laboratories.name as laboratoryName',
    );
  if (only.laboratoryId !== undefined) query.where('laboratories.id', only.laboratoryId);
  return query;
}
