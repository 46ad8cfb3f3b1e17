import 'server-only';
import { db } from '@/db/connection';
import { findLatestEvaluation, listSignOffs, type Evaluation, type SignOff } from '@/db/evaluation-store';
import type { Round } from '@/db/round-store';
import { getSchemeById, type Scheme } from '@/db/scheme-store';
import {
  nextStep,
  stepBlockers,
  type Blocker,
  type NextStep,
  type RoundFacts,
} from '@/lib/rules/round-states';
import { getRound } from './round-plan';
import { getRoundFacts } from './round-steps';

export type { Round } from '@/db/round-store';

export interface RoundOverview {
  round: Round;
  scheme: Scheme;
  facts: RoundFacts;
  next: NextStep | null;
  blockers: Blocker[];
  evaluation: Evaluation | null;
  signOffs: SignOff[];
  now: string;
}

/** What every page of a round shows of it: where it stands, what comes next and what stands in the way. */
export async function getRoundOverview(slug: string): Promise<RoundOverview> {
  const round = await getRound(slug);
  const now = new Date().toISOString();
  const facts = await getRoundFacts(db(), round);
  const next = nextStep(round.state);
  const evaluation = await findLatestEvaluation(db(), round.id);
  return {
    round,
    scheme: await getSchemeById(db(), round.schemeId),
    facts,
    next,
    blockers: next ? stepBlockers(next, facts, now) : [],
    evaluation,
    signOffs: evaluation ? await listSignOffs(db(), evaluation.id) : [],
    now,
  };
}

/** The signature that stands on the newest evaluation; a later return takes it away. */
export function signatureOf({ signOffs }: Pick<RoundOverview, 'signOffs'>): SignOff | null {
  const last = signOffs.at(-1);
  return last?.decision === 'signed' ? last : null;
}
