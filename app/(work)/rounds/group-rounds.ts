import type { RoundListEntry } from '@/db/views/round-list-view';

export interface RoundGroup {
  title: string;
  explanation: string;
  rounds: RoundListEntry[];
}

interface Kind {
  title: string;
  explanation: string;
  has: (round: RoundListEntry, now: string) => boolean;
  /** Which of two rounds comes first; the list comes newest first. */
  soonestFirst?: boolean;
}

const isDue = (round: RoundListEntry, now: string): boolean =>
  round.state === 'open' && (round.isPast || round.closesAt <= now);

const KINDS: Kind[] = [
  {
    title: 'Needs you now',
    explanation: 'To be closed, reviewed, evaluated, signed or published.',
    has: (round, now) => isDue(round, now) || round.state === 'closed' || round.state === 'evaluated',
    soonestFirst: true,
  },
  {
    title: 'Open',
    explanation: 'Laboratories are sending results.',
    has: (round, now) => round.state === 'open' && !isDue(round, now),
    soonestFirst: true,
  },
  {
    title: 'Being planned',
    explanation: 'Not yet open; nothing has gone out.',
    has: (round) => round.state === 'draft',
    soonestFirst: true,
  },
  {
    title: 'Published',
    explanation: 'Scores are out.',
    has: (round) => round.state === 'published',
  },
  {
    title: 'Cancelled',
    explanation: 'Ended before publication.',
    has: (round) => round.state === 'cancelled',
  },
];

/** Rounds by what they need, the most urgent first; groups without a round are left out. */
export function groupRounds(rounds: readonly RoundListEntry[], now: string): RoundGroup[] {
  return KINDS.flatMap(({ title, explanation, has, soonestFirst }) => {
    const members = rounds.filter((round) => has(round, now));
    if (soonestFirst) members.sort((a, b) => a.closesAt.localeCompare(b.closesAt));
    return members.length > 0 ? [{ title, explanation, rounds: members }] : [];
  });
}
