import type { ReactNode } from 'react';
import { Facts, type Fact } from '@/components/ui/facts';
import { Signal } from '@/components/ui/signal';
import { formatCount, formatNumber, formatScore } from '@/lib/format';
import type { OwnEntry } from './own-score-row';
import { censoredText, whyNotScored } from './own-score-row';
import { FINER } from './own-scores-table';
import { SCORE_NAMES } from './score-names';

const METHODS = {
  'algorithm-a': 'robust mean of the participants (Algorithm A)',
  median: 'median of the participants',
  mean: 'mean of the participants',
  stated: 'stated beforehand',
};
const RULES = {
  prescribed: 'prescribed',
  percent: 'a percentage of the assigned value',
  horwitz: 'Horwitz function',
  'horwitz-thompson': 'Horwitz function, modified by Thompson',
  'robust-sd': 'robust standard deviation of this round',
};

export type OwnScoreFactsProps = {
  entry: OwnEntry;
  /** A way to the working of each figure, beside it. */
  workings: Record<'assigned' | 'uncertainty' | 'sigma', ReactNode>;
};

/** The own result against the round: every figure that goes into the score. */
export function OwnScoreFacts({ entry, workings }: OwnScoreFactsProps) {
  const { plan, evaluation, scored, censored } = entry;
  const { assigned, sigmaPt, scoreKind } = evaluation;
  const inUnit = (value: number | null, finer: number) =>
    value === null ? '\u2013' : `${formatNumber(value, plan.decimals + finer)} ${plan.unit}`;
  const own = scored
    ? inUnit(scored.value, 0)
    : censored
      ? `${censoredText(censored, plan.decimals)} ${plan.unit}`
      : 'nothing reported';
  const facts: Fact[] = [
    { label: 'Your result', value: own },
    {
      label: 'Assigned value x_pt',
      value: withWorking(inUnit(assigned.value, FINER.assigned), workings.assigned),
      hint: assigned.reason ?? `${METHODS[assigned.method]}${countWords(assigned.count)}`,
    },
    {
      label: 'Standard uncertainty u(x_pt)',
      value: withWorking(inUnit(assigned.standardUncertainty, FINER.spread), workings.uncertainty),
    },
    {
      label: 'sigma_pt',
      value: withWorking(inUnit(sigmaPt.value, FINER.spread), workings.sigma),
      hint: sigmaPt.reason ?? RULES[sigmaPt.rule],
    },
    {
      label: `Score ${SCORE_NAMES[scoreKind]}`,
      value: (
        <Signal
          score={scored?.score ?? null}
          signal={scored?.signal ?? 'not-scored'}
          kind={scoreKind}
          why={whyNotScored(scored, censored)}
        />
      ),
      hint: scored?.score === null || !scored ? whyNotScored(scored, censored) : evaluation.scoreKindReason,
    },
    { label: 'Difference D', value: inUnit(scored?.D ?? null, 0) },
    {
      label: 'Difference D%',
      value: typeof scored?.dPercent !== 'number' ? '\u2013' : `${formatNumber(scored.dPercent, 1)} %`,
    },
    ...otherScores(entry),
  ];
  return <Facts items={facts} columns={2} />;
}

function withWorking(figure: string, working: ReactNode): ReactNode {
  return (
    <span className="inline-flex flex-wrap items-baseline justify-end gap-x-2">
      {working}
      {figure}
    </span>
  );
}

/** Scores that were computed beside the judged one. */
function otherScores({ evaluation, scored }: OwnEntry): Fact[] {
  if (!scored) return [];
  const all = { z: scored.z, 'z-prime': scored.zPrime, zeta: scored.zeta, 'e-n': scored.eN };
  const facts: Fact[] = [];
  for (const kind of ['z', 'z-prime', 'zeta', 'e-n'] as const) {
    const value = all[kind];
    if (kind === evaluation.scoreKind || value === null) continue;
    facts.push({ label: `Beside it: ${SCORE_NAMES[kind]}`, value: formatScore(value, kind) });
  }
  if (scored.uncertaintyClass) {
    facts.push({ label: 'Your stated uncertainty', value: UNCERTAINTY[scored.uncertaintyClass] });
  }
  return facts;
}

const UNCERTAINTY: Record<NonNullable<NonNullable<OwnEntry['scored']>['uncertaintyClass']>, string> = {
  low: 'may be too small',
  plausible: 'plausible',
  high: 'may be too large',
};

function countWords(count: number): string {
  return count > 0 ? `, ${formatCount(count, 'result')}` : '';
}
