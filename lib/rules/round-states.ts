export type RoundState = 'draft' | 'open' | 'closed' | 'evaluated' | 'published' | 'cancelled';
export type RoundStep = 'open' | 'close' | 'evaluate' | 'return' | 'publish' | 'cancel';

interface Step {
  from: readonly RoundState[];
  to: RoundState;
}

export const ROUND_STEPS: Record<RoundStep, Step> = {
  open: { from: ['draft'], to: 'open' },
  close: { from: ['open'], to: 'closed' },
  evaluate: { from: ['closed'], to: 'evaluated' },
  return: { from: ['evaluated'], to: 'closed' },
  publish: { from: ['evaluated'], to: 'published' },
  cancel: { from: ['draft', 'open', 'closed', 'evaluated'], to: 'cancelled' },
};

/** What a blocker needs to know of a round. */
export interface RoundFacts {
  slug: string;
  state: RoundState;
  isPast: boolean;
  closesAt: string;
  itemsWithoutMeasurand: readonly string[];
  itemCount: number;
  measurandCount: number;
  participantCount: number;
  submittedCount: number;
  /** Measurands of the plan without any numeric result, by their names. */
  measurandsWithoutResult: readonly string[];
  signedBy: string | null;
}

export interface Blocker {
  text: string;
  href: string;
}

const STATE_WORDS: Record<RoundState, string> = {
  draft: 'being planned',
  open: 'open for results',
  closed: 'closed and under review',
  evaluated: 'evaluated and waiting for sign-off',
  published: 'published',
  cancelled: 'cancelled',
};

export function roundStateWords(state: RoundState): string {
  return STATE_WORDS[state];
}

/** What still stands in the way of a step, each in a sentence with the place where it is mended. */
export function stepBlockers(step: RoundStep, facts: RoundFacts, now: string): Blocker[] {
  const at = (page: string) => `/rounds/${facts.slug}${page}`;
  const { from } = ROUND_STEPS[step];
  if (!from.includes(facts.state)) {
    return [
      { text: `The round is ${STATE_WORDS[facts.state]}; this step does not apply now.`, href: at('') },
    ];
  }
  const blockers: Blocker[] = [];
  const add = (isBlocked: boolean, text: string, page: string) => {
    if (isBlocked) blockers.push({ text, href: at(page) });
  };
  if (step === 'open') {
    add(facts.itemCount === 0, 'The plan has no test item yet.', '/plan');
    for (const item of facts.itemsWithoutMeasurand) add(true, `Item ${item} has no measurand yet.`, '/plan');
    add(!facts.isPast && facts.closesAt <= now, 'The closing date lies in the past.', '/plan');
  }
  if (step === 'close')
    add(facts.submittedCount === 0, 'No laboratory has sent results yet.', '/participants');
  if (step === 'evaluate') {
    const isEmpty = facts.measurandsWithoutResult.length === facts.measurandCount;
    add(isEmpty, 'No measurand has a numeric result, so there is nothing to evaluate.', '/results');
  }
  if (step === 'publish') {
    add(
      facts.signedBy === null,
      'A reviewer who did not prepare this evaluation has not signed it yet.',
      '/evaluation',
    );
  }
  return blockers;
}

export type NextStep = Exclude<RoundStep, 'cancel' | 'return'>;

/** The step that moves a round on from its state; null at the end of its life. */
export function nextStep(state: RoundState): NextStep | null {
  const steps: Partial<Record<RoundState, NextStep>> = {
    draft: 'open',
    open: 'close',
    closed: 'evaluate',
    evaluated: 'publish',
  };
  return steps[state] ?? null;
}
