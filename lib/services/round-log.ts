import 'server-only';
import { db } from '@/db/connection';
import { listRoundLog, LOG_PAGE, type LogLine } from '@/db/views/round-log-view';
import { can } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { getRound } from './round-plan';

export type { LogLine } from '@/db/views/round-log-view';

/**
 * A page of the round's log, and where the next page begins. Without the key there are no codes in it: the log of the
 * installation names the laboratory in the same line.
 */
export async function getRoundLog(
  actor: Actor,
  slug: string,
  before?: number,
): Promise<{ lines: LogLine[]; olderThan: number | null }> {
  const round = await getRound(slug);
  const found = await listRoundLog(db(), round.id, { before });
  const lines = can(actor, 'round:see-key')
    ? found
    : found.map((line) => ({ ...line, participantCode: null }));
  return { lines, olderThan: lines.length === LOG_PAGE ? (lines.at(-1)?.id ?? null) : null };
}
