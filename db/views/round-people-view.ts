import 'server-only';
import type { Role } from '@/lib/rules/roles';
import type { Db } from '../connection';

export interface Person {
  id: number;
  name: string;
}

/** People of the provider who hold a role and can sign in. */
export async function listRoleHolders(connection: Db, role: Role): Promise<Person[]> {
  return connection('memberships')
    .join('users', 'users.id', 'memberships.user_id')
    .where({ 'memberships.role': role, 'users.is_disabled': false })
    .whereNull('memberships.laboratory_id')
    .orderBy('users.name')
    .distinct('users.id as id', 'users.name as name');
}

export async function findUserName(connection: Db, id: number | null): Promise<string | null> {
  if (id === null) return null;
  const row = await connection('users').where({ id }).first('name');
  return row?.name ?? null;
}
