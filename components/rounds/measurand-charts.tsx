import { DistributionChart } from '@/components/charts/distribution-chart';
import { OrderedScoresChart } from '@/components/charts/ordered-scores-chart';
import type { MeasurandEvaluation } from '@/lib/stats/evaluation/types';
import { SCORE_NAMES } from './score-columns';

export type ChartedMeasurand = {
  itemCode: string;
  code: string;
  name: string;
  unit: string;
  decimals: number;
};

type ChartProps = { plan: ChartedMeasurand; evaluation: MeasurandEvaluation };

export function ScoresChart({ plan, evaluation }: ChartProps) {
  const { scoreKind, scores, censored } = evaluation;
  const name = SCORE_NAMES[scoreKind];
  return (
    <OrderedScoresChart
      title={`${name} of ${plan.name} in item ${plan.itemCode}`}
      points={[
        ...scores.map((entry) => ({
          code: entry.participant,
          score: entry.score,
          signal: entry.signal ?? ('not-scored' as const),
        })),
        ...censored.map((entry) => ({
          code: entry.participant,
          score: null,
          signal: 'not-scored' as const,
        })),
      ]}
      scoreName={name}
      scoreKind={scoreKind}
      fileName={`scores-${plan.itemCode}-${plan.code}`}
    />
  );
}

/** The curve needs an assigned value and sigma_pt to be drawn to; without them nothing is drawn. */
export function ResultsChart({ plan, evaluation }: ChartProps) {
  const { assigned, sigmaPt, scores, censored } = evaluation;
  if (assigned.value === null || sigmaPt.value === null) return null;
  return (
    <DistributionChart
      title={`Results for ${plan.name} in item ${plan.itemCode}`}
      results={scores.map((entry) => ({
        code: entry.participant,
        value: entry.value,
        signal: entry.signal ?? 'not-scored',
      }))}
      assigned={{ value: assigned.value, sigmaPt: sigmaPt.value }}
      unit={plan.unit}
      decimals={plan.decimals}
      leftOut={censored.length}
      fileName={`results-${plan.itemCode}-${plan.code}`}
    />
  );
}
