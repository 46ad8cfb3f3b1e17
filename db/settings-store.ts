import 'server-only';
import type { Db } from './connection';

export async function findSetting(connection: Db, key: string): Promise<string | null> {
  const row: { value: string } | undefined = await connection('settings').where({ key }).first('value');
  return row?.value ?? null;
}

export async function setSetting(connection: Db, key: string, value: string): Promise<void> {
  await connection('settings').insert({ key, value }).onConflict('key').merge();
}
