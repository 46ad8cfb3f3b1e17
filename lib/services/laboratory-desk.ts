import 'server-only';
import { db } from '@/db/connection';
import {
  listLaboratoryRounds,
  listSignalCounts,
  type LaboratoryRound,
  type SignalCount,
} from '@/db/views/laboratory-rounds-view';

export type SignalTally = Record<SignalCount['signal'], number>;

export interface ScoredRound extends LaboratoryRound {
  signals: SignalTally;
}

export interface Desk {
  /** Invitations without an answer, in rounds that can still be answered. */
  invitations: LaboratoryRound[];
  /** Items that are on their way or here, without proof of receipt. */
  toReceive: LaboratoryRound[];
  /** Open rounds without results from this laboratory. */
  due: LaboratoryRound[];
  /** Everything else that is under way: sent and amendable, under review, planned. */
  underWay: LaboratoryRound[];
  newlyPublished: ScoredRound[];
  past: ScoredRound[];
}

/** How long published scores stand under "new". */
const NEW_FOR_DAYS = 45;
const DAY_MS = 86_400_000;

/** What waits for a laboratory today, and what is behind it. */
export async function getDesk(laboratoryId: number, now: string): Promise<Desk> {
  const [rounds, counts] = await Promise.all([
    listLaboratoryRounds(db(), laboratoryId),
    listSignalCounts(db(), laboratoryId),
  ]);
  return sortDesk(rounds, counts, now);
}

/** Exported for tests: which heading each round stands under. */
export function sortDesk(
  rounds: readonly LaboratoryRound[],
  counts: readonly SignalCount[],
  now: string,
): Desk {
  const desk: Desk = {
    invitations: [],
    toReceive: [],
    due: [],
    underWay: [],
    newlyPublished: [],
    past: [],
  };
  const newSince = new Date(Date.parse(now) - NEW_FOR_DAYS * DAY_MS).toISOString();
  for (const round of rounds) {
    if (round.state === 'published' && round.enrolmentState === 'enrolled') {
      const isNew = !round.isPast && (round.publishedAt ?? '') >= newSince;
      (isNew ? desk.newlyPublished : desk.past).push({ ...round, signals: tally(counts, round.id) });
    } else if (isOver(round)) {
      desk.past.push({ ...round, signals: tally([], round.id) });
    } else if (round.enrolmentState === 'invited') {
      (isAnswerable(round, now) ? desk.invitations : desk.underWay).push(round);
    } else placeOwn(desk, round, now);
  }
  // What comes first is what is due first.
  for (const list of [desk.invitations, desk.toReceive, desk.due, desk.underWay]) list.reverse();
  return desk;
}

function placeOwn(desk: Desk, round: LaboratoryRound, now: string): void {
  const isOpen = round.state === 'open';
  const isDue = isOpen && round.receiptCode === null && round.closesAt > now;
  const isToReceive =
    isOpen && round.itemsReceivedAt === null && round.dispatchAt <= now && round.closesAt > now;
  if (isToReceive) desk.toReceive.push(round);
  if (isDue) desk.due.push(round);
  if (!isToReceive && !isDue) desk.underWay.push(round);
}

function isOver(round: LaboratoryRound): boolean {
  const hasNoPart = round.enrolmentState === 'declined' || round.enrolmentState === 'withdrawn';
  return round.state === 'published' || round.state === 'cancelled' || hasNoPart;
}

function isAnswerable(round: LaboratoryRound, now: string): boolean {
  return (round.state === 'draft' || round.state === 'open') && round.closesAt > now;
}

function tally(counts: readonly SignalCount[], roundId: number): SignalTally {
  const sum: SignalTally = { none: 0, warning: 0, action: 0, 'not-scored': 0 };
  for (const entry of counts) if (entry.roundId === roundId) sum[entry.signal] += entry.count;
  return sum;
}
