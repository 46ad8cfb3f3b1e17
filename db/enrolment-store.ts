import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export type EnrolmentState = 'invited' | 'enrolled' | 'declined' | 'withdrawn';

export interface Enrolment {
  id: number;
  roundId: number;
  laboratoryId: number;
  participantCode: string;
  state: EnrolmentState;
  reason: string;
  itemsReceivedAt: string | null;
  createdAt: string;
  decidedAt: string | null;
}

export async function listEnrolments(connection: Db, roundId: number): Promise<Enrolment[]> {
  const rows = await connection('enrolments').where({ round_id: roundId }).orderBy('participant_code');
  return rows.map((row) => fromRow<Enrolment>(row));
}

export async function findEnrolment(
  connection: Db,
  roundId: number,
  laboratoryId: number,
): Promise<Enrolment | null> {
  const row = await connection('enrolments')
    .where({ round_id: roundId, laboratory_id: laboratoryId })
    .first();
  return row ? fromRow<Enrolment>(row) : null;
}

export async function createEnrolment(
  connection: Db,
  enrolment: Pick<Enrolment, 'roundId' | 'laboratoryId' | 'participantCode' | 'state'>,
): Promise<number> {
  const now = timestamp();
  const [row] = await connection('enrolments')
    .insert({
      ...toRow(enrolment),
      created_at: now,
      decided_at: enrolment.state === 'enrolled' ? now : null,
    })
    .returning('id');
  return row.id;
}

export async function updateEnrolment(
  connection: Db,
  id: number,
  change: Partial<Pick<Enrolment, 'state' | 'reason' | 'itemsReceivedAt' | 'decidedAt'>>,
): Promise<void> {
  await connection('enrolments').where({ id }).update(toRow(change));
}
