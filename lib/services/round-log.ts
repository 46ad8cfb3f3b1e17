import 'server-only';
import { db } from '@/db/connection';
import { listRoundLog, LOG_PAGE, type LogLine } from '@/db/views/round-log-view';
import { getRound } from './round-plan';

export type { LogLine } from '@/db/views/round-log-view';

/** A page of the round's log, and where the next page begins. */
export async function getRoundLog(
  slug: string,
  before?: number,
): Promise<{ lines: LogLine[]; olderThan: number | null }> {
  const round = await getRound(slug);
  const lines = await listRoundLog(db(), round.id, { before });
  return { lines, olderThan: lines.length === LOG_PAGE ? (lines.at(-1)?.id ?? null) : null };
}
