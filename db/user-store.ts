import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, type Row } from './rows';

export interface User {
  id: number;
  email: string;
  name: string;
  isDisabled: boolean;
  /** False until the person has opened the invitation and chosen a password. */
  hasPassword: boolean;
  createdAt: string;
}

const COLUMNS = ['id', 'email', 'name', 'is_disabled', 'created_at'];

function toUser(row: Row): User {
  return fromRow<User>(row, ['isDisabled', 'hasPassword']);
}

function selectUsers(connection: Db) {
  return connection('users').select(...COLUMNS, connection.raw('password_hash is not null as has_password'));
}

export async function createUser(
  connection: Db,
  user: { email: string; name: string; passwordHash?: string },
): Promise<number> {
  const [id] = await connection('users').insert({
    email: user.email.toLowerCase(),
    name: user.name,
    password_hash: user.passwordHash ?? null,
    created_at: timestamp(),
  });
  if (id === undefined) throw new Error('the user was given no id');
  return id;
}

export async function findUser(connection: Db, id: number): Promise<User | null> {
  const row: Row | undefined = await selectUsers(connection).where({ id }).first();
  return row ? toUser(row) : null;
}

export async function findUserByEmail(connection: Db, email: string): Promise<User | null> {
  const row: Row | undefined = await selectUsers(connection).where({ email: email.toLowerCase() }).first();
  return row ? toUser(row) : null;
}

/** Null for someone without a password; no other function gives the hash out. */
export async function findPasswordHash(connection: Db, userId: number): Promise<string | null> {
  const row: { password_hash: string | null } | undefined = await connection('users')
    .where({ id: userId })
    .first('password_hash');
  return row?.password_hash ?? null;
}

export async function setPasswordHash(connection: Db, userId: number, passwordHash: string): Promise<void> {
  await connection('users').where({ id: userId }).update({ password_hash: passwordHash });
}

export async function renameUser(connection: Db, userId: number, name: string): Promise<void> {
  await connection('users').where({ id: userId }).update({ name });
}

export async function setUserDisabled(connection: Db, userId: number, isDisabled: boolean): Promise<void> {
  await connection('users').where({ id: userId }).update({ is_disabled: isDisabled });
}

export async function hasUsers(connection: Db): Promise<boolean> {
  return (await connection('users').first('id')) !== undefined;
}
