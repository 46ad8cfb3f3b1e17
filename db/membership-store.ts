import 'server-only';
import { timestamp } from './clock';
import type { Role } from '@/lib/rules/roles';
import type { Db } from './connection';
import { fromRow, type Row } from './rows';

export interface StoredMembership {
  id: number;
  userId: number;
  laboratoryId: number | null;
  role: Role;
}

interface NewMembership {
  userId: number;
  laboratoryId: number | null;
  role: Role;
}

const COLUMNS = ['id', 'user_id', 'laboratory_id', 'role'];

export async function listMembershipsOfUser(connection: Db, userId: number): Promise<StoredMembership[]> {
  const rows: Row[] = await connection('memberships')
    .where({ user_id: userId })
    .orderBy('id')
    .select(COLUMNS);
  return rows.map((row) => fromRow<StoredMembership>(row));
}

/** Returns false when the person already holds the role there. SQLite counts two nulls as different, so we ask first. */
export async function addMembership(connection: Db, membership: NewMembership): Promise<boolean> {
  const row = {
    user_id: membership.userId,
    laboratory_id: membership.laboratoryId,
    role: membership.role,
  };
  if (await connection('memberships').where(row).first('id')) return false;
  await connection('memberships').insert({ ...row, created_at: timestamp() });
  return true;
}

export async function removeMembership(connection: Db, membership: NewMembership): Promise<boolean> {
  const removed = await connection('memberships')
    .where({
      user_id: membership.userId,
      laboratory_id: membership.laboratoryId,
      role: membership.role,
    })
    .delete();
  return removed > 0;
}

/** People who hold a role, can sign in and are not the one left out; for the rules on last holders. */
export async function countOtherHolders(
  connection: Db,
  holding: { role: Role; laboratoryId: number | null; exceptUserId: number },
): Promise<number> {
  const row = await connection('memberships')
    .join('users', 'users.id', 'memberships.user_id')
    .where({
      'memberships.role': holding.role,
      'memberships.laboratory_id': holding.laboratoryId,
      'users.is_disabled': 0,
    })
    .whereNotNull('users.password_hash')
    .whereNot('users.id', holding.exceptUserId)
    .count({ count: '*' })
    .first();
  return Number(row?.count ?? 0);
}
