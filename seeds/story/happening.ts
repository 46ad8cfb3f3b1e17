import type { Db } from '@/db/connection';
import { atMoment } from '@/db/clock';

/** Something that happened at a moment of the story, and how it is written down. */
export interface Happening {
  moment: string;
  tell: (trx: Db) => Promise<void>;
}

/** Writes down what happened in the order in which it happened, so that ids and times run together. */
export async function tellInOrder(trx: Db, happenings: readonly Happening[]): Promise<void> {
  const inOrder = [...happenings].sort((a, b) => (a.moment < b.moment ? -1 : a.moment > b.moment ? 1 : 0));
  for (const { moment, tell } of inOrder) await atMoment(moment, () => tell(trx));
}
