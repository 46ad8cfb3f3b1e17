import 'server-only';
import type { LaboratoryRole, Membership, Role } from '@/lib/rules/roles';
import type { Db } from '../connection';
import { fetchPage, whereAnyContains, type Page } from './text-search';

export interface PersonLine {
  id: number;
  name: string;
  email: string;
  isDisabled: boolean;
  hasPassword: boolean;
  memberships: Membership[];
}

interface UserRow {
  id: number;
  name: string;
  email: string;
  is_disabled: number;
  has_password: number;
}

interface MembershipRow {
  user_id: number;
  role: Role;
  laboratory_id: number | null;
  laboratory_name: string | null;
}

function selectUsers(connection: Db, query = connection('users')) {
  return query.select(
    'users.id',
    'users.name',
    'users.email',
    'users.is_disabled',
    connection.raw('users.password_hash is not null as has_password'),
  );
}

/** One page of everyone with an account, by name, with every role held. */
export async function listPeople(
  connection: Db,
  asked: { text: string; page: number },
): Promise<Page<PersonLine>> {
  const page = await fetchPage<UserRow>({
    query: whereAnyContains(connection('users'), ['users.name', 'users.email'], asked.text),
    page: asked.page,
    select: (query) => selectUsers(connection, query).orderByRaw('lower(users.name), users.id'),
  });
  return { ...page, rows: await withMemberships(connection, page.rows) };
}

export async function findPerson(connection: Db, userId: number): Promise<PersonLine | null> {
  const rows: UserRow[] = await selectUsers(connection).where('users.id', userId);
  return (await withMemberships(connection, rows))[0] ?? null;
}

async function withMemberships(connection: Db, users: readonly UserRow[]): Promise<PersonLine[]> {
  const rows: MembershipRow[] = await connection('memberships')
    .leftJoin('laboratories', 'laboratories.id', 'memberships.laboratory_id')
    .whereIn(
      'memberships.user_id',
      users.map((user) => user.id),
    )
    .orderBy(['laboratories.name', 'memberships.id'])
    .select({
      user_id: 'memberships.user_id',
      role: 'memberships.role',
      laboratory_id: 'memberships.laboratory_id',
      laboratory_name: 'laboratories.name',
    });
  return users.map((user) => ({
    id: user.id,
    name: user.name,
    email: user.email,
    isDisabled: Boolean(user.is_disabled),
    hasPassword: Boolean(user.has_password),
    memberships: rows
      .filter((row) => row.user_id === user.id)
      .map((row) => ({
        role: row.role,
        laboratoryId: row.laboratory_id,
        laboratoryName: row.laboratory_name,
      })),
  }));
}

export interface ColleagueLine {
  userId: number;
  name: string;
  email: string;
  isDisabled: boolean;
  hasPassword: boolean;
  roles: LaboratoryRole[];
}

/** The people of one laboratory, by name; nothing of what they are elsewhere. */
export async function listColleagues(connection: Db, laboratoryId: number): Promise<ColleagueLine[]> {
  const rows: (UserRow & { role: LaboratoryRole })[] = await selectUsers(connection)
    .join('memberships', 'memberships.user_id', 'users.id')
    .where('memberships.laboratory_id', laboratoryId)
    .orderByRaw('lower(users.name), users.id, memberships.id')
    .select('memberships.role');
  const people = new Map<number, ColleagueLine>();
  for (const row of rows) {
    const known = people.get(row.id);
    if (known) known.roles.push(row.role);
    else {
      people.set(row.id, {
        userId: row.id,
        name: row.name,
        email: row.email,
        isDisabled: Boolean(row.is_disabled),
        hasPassword: Boolean(row.has_password),
        roles: [row.role],
      });
    }
  }
  return [...people.values()];
}
