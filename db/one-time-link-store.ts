import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';

export type LinkPurpose = 'welcome' | 'reset';

export interface OneTimeLink {
  id: number;
  userId: number;
}

export async function createOneTimeLink(
  connection: Db,
  link: { userId: number; purpose: LinkPurpose; tokenHash: string; expiresAt: string },
): Promise<number> {
  const [id] = await connection('one_time_links').insert({
    user_id: link.userId,
    purpose: link.purpose,
    token_hash: link.tokenHash,
    created_at: timestamp(),
    expires_at: link.expiresAt,
  });
  if (id === undefined) throw new Error('the link was given no id');
  return id;
}

/** A link that is neither used nor expired. */
export async function findOpenLink(
  connection: Db,
  link: { tokenHash: string; purpose: LinkPurpose },
): Promise<OneTimeLink | null> {
  const row: { id: number; user_id: number } | undefined = await connection('one_time_links')
    .where({ token_hash: link.tokenHash, purpose: link.purpose })
    .whereNull('used_at')
    .where('expires_at', '>', timestamp())
    .first('id', 'user_id');
  return row ? { id: row.id, userId: row.user_id } : null;
}

/** Takes a link: true for the one caller who comes first. */
export async function takeLink(connection: Db, id: number): Promise<boolean> {
  const taken = await connection('one_time_links')
    .where({ id })
    .whereNull('used_at')
    .update({ used_at: timestamp() });
  return taken === 1;
}

/** Makes every other open link of a person worthless. */
export async function closeLinksOfUser(connection: Db, userId: number): Promise<void> {
  await connection('one_time_links')
    .where({ user_id: userId })
    .whereNull('used_at')
    .update({ used_at: timestamp() });
}

export async function countLinksSince(
  connection: Db,
  asked: { userId: number; purpose: LinkPurpose; since: string },
): Promise<number> {
  const row = await connection('one_time_links')
    .where({ user_id: asked.userId, purpose: asked.purpose })
    .where('created_at', '>=', asked.since)
    .count({ count: '*' })
    .first();
  return Number(row?.count ?? 0);
}
