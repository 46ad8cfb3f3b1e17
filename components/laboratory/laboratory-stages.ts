import type { RoundStage, StageState } from '@/components/rounds/round-line';
import type { RoundState } from '@/lib/rules/round-states';

/** What the stages need to know of a round and of the laboratory's own part in it. */
export interface OwnPart {
  slug: string;
  state: RoundState;
  isPast: boolean;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
  closedAt: string | null;
  publishedAt: string | null;
  cancelledAt: string | null;
  enrolmentState: 'invited' | 'enrolled' | 'declined' | 'withdrawn';
  enrolledAt: string;
  decidedAt: string | null;
  itemsReceivedAt: string | null;
  submittedAt: string | null;
}

export type LaboratoryPlace = 'invitation' | 'items' | 'results' | 'review' | 'scores';

/** The stages of a round as a laboratory lives through them; each leads to its part of the round's page. */
export function laboratoryStages(part: OwnPart, now: string): RoundStage[] {
  const stages = [invitation(part), items(part, now), results(part, now), review(part), scores(part, now)];
  if (part.state !== 'cancelled') return stages;
  return stages.map((stage) => (stage.state === 'done' ? stage : { ...stage, state: 'cancelled', at: null }));
}

function stage(
  part: OwnPart,
  key: LaboratoryPlace,
  label: string,
  state: StageState,
  at: string | null,
): RoundStage {
  const isReachable = key !== 'review' && state !== 'later';
  return { key, label, state, at, href: isReachable ? `/laboratory/rounds/${part.slug}#${key}` : null };
}

function invitation(part: OwnPart): RoundStage {
  const isAnswered = part.enrolmentState === 'enrolled' || !isRunning(part);
  const at = part.decidedAt ?? part.enrolledAt;
  return stage(part, 'invitation', 'Invitation', isAnswered ? 'done' : 'due', isAnswered ? at : null);
}

function items(part: OwnPart, now: string): RoundStage {
  if (part.itemsReceivedAt) return stage(part, 'items', 'Items received', 'done', part.itemsReceivedAt);
  if (!isRunning(part)) return stage(part, 'items', 'Items sent', 'done', part.dispatchAt);
  const isOnTheWay = part.state === 'open' && part.enrolmentState === 'enrolled' && part.dispatchAt <= now;
  return isOnTheWay
    ? stage(part, 'items', 'Items', 'due', null)
    : stage(part, 'items', 'Items', 'later', part.dispatchAt);
}

function results(part: OwnPart, now: string): RoundStage {
  if (part.submittedAt) return stage(part, 'results', 'Results sent', 'done', part.submittedAt);
  if (!isRunning(part)) return stage(part, 'results', 'No results sent', 'done', part.closedAt);
  if (part.state === 'draft' || part.enrolmentState !== 'enrolled') {
    return stage(part, 'results', 'Results', 'later', part.closesAt);
  }
  return stage(part, 'results', 'Results', part.closesAt <= now ? 'overdue' : 'due', part.closesAt);
}

function review(part: OwnPart): RoundStage {
  if (part.state === 'published') return stage(part, 'review', 'Review', 'done', part.closedAt);
  const isUnderReview = part.state === 'closed' || part.state === 'evaluated';
  return stage(part, 'review', 'Review', isUnderReview ? 'current' : 'later', null);
}

function scores(part: OwnPart, now: string): RoundStage {
  if (part.state === 'published') return stage(part, 'scores', 'Scores', 'done', part.publishedAt);
  const isWaited = part.state === 'closed' || part.state === 'evaluated';
  const isLate = isWaited && part.publishAt <= now;
  return { ...stage(part, 'scores', 'Scores', isLate ? 'overdue' : 'later', part.publishAt), href: null };
}

function isRunning({ state }: OwnPart): boolean {
  return state === 'draft' || state === 'open';
}

/** Where the round's page stands on the line: at what there is to do or to read now. */
export function currentPlace(part: OwnPart): LaboratoryPlace {
  if (part.state === 'published') return 'scores';
  if (part.state === 'closed' || part.state === 'evaluated') return 'review';
  if (part.enrolmentState !== 'enrolled') return 'invitation';
  return part.itemsReceivedAt || part.submittedAt ? 'results' : 'items';
}
