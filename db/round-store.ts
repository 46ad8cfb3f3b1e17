import 'server-only';
import { timestamp } from './clock';
import type { Db } from './connection';
import { fromRow, toRow } from './rows';

export type RoundState = 'draft' | 'open' | 'closed' | 'evaluated' | 'published' | 'cancelled';

export interface Round {
  id: number;
  slug: string;
  schemeId: number;
  name: string;
  state: RoundState;
  /** Loaded from a file after the event: no mail goes out, and its dates may lie in the past. */
  isPast: boolean;
  opensAt: string;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
  instructions: string;
  feeCents: number;
  feeCurrency: string;
  openedAt: string | null;
  closedAt: string | null;
  evaluatedAt: string | null;
  publishedAt: string | null;
  cancelledAt: string | null;
  cancelReason: string | null;
  createdBy: number | null;
  createdAt: string;
}

export type RoundPlan = Pick<
  Round,
  | 'name'
  | 'isPast'
  | 'opensAt'
  | 'dispatchAt'
  | 'closesAt'
  | 'publishAt'
  | 'instructions'
  | 'feeCents'
  | 'feeCurrency'
>;

export function roundFromRow(row: Record<string, unknown>): Round {
  return fromRow<Round>(row, ['isPast']);
}

export async function findRound(connection: Db, slug: string): Promise<Round | null> {
  const row = await connection('rounds').where({ slug }).first();
  return row ? roundFromRow(row) : null;
}

export async function getRoundById(connection: Db, id: number): Promise<Round> {
  const row = await connection('rounds').where({ id }).first();
  if (!row) throw new Error(`round ${id} is missing`);
  return roundFromRow(row);
}

export async function createRound(
  connection: Db,
  round: RoundPlan & Pick<Round, 'slug' | 'schemeId' | 'createdBy'>,
): Promise<number> {
  const [row] = await connection('rounds')
    .insert({ ...toRow(round), state: 'draft', created_at: timestamp() })
    .returning('id');
  return row.id;
}

export async function updateRoundPlan(connection: Db, id: number, plan: Partial<RoundPlan>): Promise<void> {
  await connection('rounds').where({ id }).update(toRow(plan));
}

/** Moves a round from one state to the next; false when another request was quicker. */
export async function moveRound(
  connection: Db,
  id: number,
  from: RoundState,
  change: Partial<Round> & Pick<Round, 'state'>,
): Promise<boolean> {
  const count = await connection('rounds').where({ id, state: from }).update(toRow(change));
  return count === 1;
}
