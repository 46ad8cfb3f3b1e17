import 'server-only';
import { db } from '@/db/connection';
import { getProgress, type Progress } from '@/db/views/participants-view';
import { getRound } from './round-plan';

export async function getRoundProgress(slug: string): Promise<Progress & { state: string }> {
  const round = await getRound(slug);
  return { state: round.state, ...(await getProgress(db(), round.id)) };
}
