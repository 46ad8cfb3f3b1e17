import type { Blocker, NextStep, RoundState } from '@/lib/rules/round-states';
import type { RoundStage, StageState } from './round-line';

export interface StagedRound {
  slug: string;
  state: RoundState;
  isPast: boolean;
  opensAt: string;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
  openedAt: string | null;
  closedAt: string | null;
  evaluatedAt: string | null;
  publishedAt: string | null;
}

export interface StageInput {
  round: StagedRound;
  next: NextStep | null;
  blockers: readonly Blocker[];
  signedAt: string | null;
  now: string;
}

interface Milestone {
  key: string;
  label: string;
  page: string;
  doneAt: string | null;
  isDone: boolean;
  plannedAt: string | null;
  /** The step that completes it, whose blockers stand here. */
  step: NextStep | null;
}

const ORDER: readonly RoundState[] = ['draft', 'open', 'closed', 'evaluated', 'published'];

function milestones({ round, signedAt, now }: StageInput): Milestone[] {
  // A cancelled round has no place in the order; what it reached is told by its stamps.
  const reached = (state: RoundState, stamp: string | null) =>
    round.state === 'cancelled' ? stamp !== null : ORDER.indexOf(round.state) >= ORDER.indexOf(state);
  const isOpened = reached('open', round.openedAt);
  const isEvaluated = reached('evaluated', round.evaluatedAt);
  const isSigned = isEvaluated && signedAt !== null;
  // A past round is loaded long after its days; the days it was held on are what its line shows.
  const asPlanned = (stamp: string | null, planned: string) => (round.isPast ? planned : stamp);
  return [
    {
      key: 'planned',
      label: 'Planned',
      page: 'plan',
      doneAt: null,
      isDone: isOpened,
      plannedAt: null,
      step: null,
    },
    {
      key: 'open',
      label: 'Open',
      page: 'participants',
      doneAt: asPlanned(round.openedAt, round.opensAt),
      isDone: isOpened,
      plannedAt: round.opensAt,
      step: 'open',
    },
    {
      key: 'dispatched',
      label: 'Dispatched',
      page: 'items',
      // Closed before the planned day: when the items went out is then not known.
      doneAt: round.dispatchAt <= now ? round.dispatchAt : null,
      isDone: isOpened && (round.dispatchAt <= now || reached('closed', round.closedAt)),
      plannedAt: round.dispatchAt,
      step: null,
    },
    {
      key: 'due',
      label: 'Results due',
      page: 'results',
      doneAt: asPlanned(round.closedAt, round.closesAt),
      isDone: reached('closed', round.closedAt),
      plannedAt: round.closesAt,
      step: 'close',
    },
    {
      key: 'evaluated',
      label: 'Evaluated',
      page: 'evaluation',
      doneAt: round.isPast ? null : round.evaluatedAt,
      isDone: isEvaluated,
      plannedAt: null,
      step: 'evaluate',
    },
    {
      key: 'signed',
      label: 'Signed',
      page: 'evaluation',
      doneAt: round.isPast ? null : signedAt,
      isDone: isSigned,
      plannedAt: null,
      step: isSigned ? null : 'publish',
    },
    {
      key: 'published',
      label: 'Published',
      page: 'report',
      doneAt: asPlanned(round.publishedAt, round.publishAt),
      isDone: reached('published', round.publishedAt),
      plannedAt: round.publishAt,
      step: isSigned ? 'publish' : null,
    },
  ];
}

/** The stages of the round line: what is done, what is due and what blocks the next step. */
export function roundStages(input: StageInput): RoundStage[] {
  const { round, next, blockers, now } = input;
  const all = milestones(input);
  const firstOpen = all.findIndex((entry) => !entry.isDone);
  return all.map((entry, index) => ({
    key: entry.key,
    label: entry.label,
    href: `/rounds/${round.slug}/${entry.page}`,
    at: entry.isDone ? entry.doneAt : entry.plannedAt,
    state: stateOf(entry, index === firstOpen, round, now),
    blockedBy:
      entry.step !== null && entry.step === next ? blockersNow(next, blockers, round, now) : undefined,
  }));
}

/** That nobody has sent results yet holds nothing up before the results are due. */
function blockersNow(
  next: NextStep,
  blockers: readonly Blocker[],
  round: StagedRound,
  now: string,
): readonly Blocker[] {
  return next === 'close' && !round.isPast && round.closesAt > now ? [] : blockers;
}

function stateOf(entry: Milestone, isFirst: boolean, round: StagedRound, now: string): StageState {
  if (entry.isDone) return 'done';
  if (round.state === 'cancelled') return 'cancelled';
  if (!isFirst) return 'later';
  if (round.isPast || entry.plannedAt === null) return 'current';
  return entry.plannedAt < now ? 'overdue' : 'due';
}

const PAGES_OF_LINE: Record<string, string> = {
  plan: 'planned',
  participants: 'open',
  items: 'dispatched',
  results: 'due',
  report: 'published',
};

/** Which stage a page of the round stands for; the evaluation page serves two. */
export function placeOf(page: string | null, signedAt: string | null): string {
  if (page === 'evaluation') return signedAt ? 'signed' : 'evaluated';
  return PAGES_OF_LINE[page ?? ''] ?? '';
}
