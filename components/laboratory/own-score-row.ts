import { formatNumber } from '@/lib/format';
import type { CensoredScore, MeasurandEvaluation, ParticipantScore } from '@/lib/stats';
import type { OwnScoreRow } from './own-scores-table';

interface Plan {
  id: number;
  itemCode: string;
  code: string;
  name: string;
  unit: string;
  decimals: number;
}

export interface OwnEntry {
  plan: Plan;
  evaluation: MeasurandEvaluation;
  scored: ParticipantScore | null;
  censored: CensoredScore | null;
}

const JUDGEMENTS = {
  consistent: 'in keeping with the assigned value',
  inconsistent: 'at odds with the assigned value',
  uninformative: 'saying nothing about the assigned value',
};

export function ownScoreRow({ plan, evaluation, scored, censored }: OwnEntry): OwnScoreRow {
  return {
    roundMeasurandId: plan.id,
    item: plan.itemCode,
    code: plan.code,
    name: plan.name,
    unit: plan.unit,
    decimals: plan.decimals,
    result: scored?.value ?? (censored && censoredText(censored, plan.decimals)),
    assigned: evaluation.assigned.value,
    assignedUncertainty: evaluation.assigned.standardUncertainty,
    sigmaPt: evaluation.sigmaPt.value,
    scoreKind: evaluation.scoreKind,
    score: scored?.score ?? null,
    signal: scored?.signal ?? 'not-scored',
    dPercent: scored?.dPercent ?? null,
    why: whyNotScored(scored, censored),
  };
}

export function censoredText({ comparator, limit }: CensoredScore, decimals: number): string {
  return `${comparator}${formatNumber(limit, decimals)}`;
}

/** Undefined for a score; else why there is none, in words. */
export function whyNotScored(
  scored: ParticipantScore | null,
  censored: CensoredScore | null,
): string | undefined {
  if (scored) return scored.reason ?? undefined;
  if (!censored) return 'no figure was reported';
  if (censored.judgement === null) return censored.reason ?? 'a limit is not scored';
  return `a limit is not scored; it is ${JUDGEMENTS[censored.judgement]}`;
}
