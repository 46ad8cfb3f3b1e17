import type { ReactNode } from 'react';
import { Facts, type Fact } from '@/components/ui/facts';
import { formatNumber } from '@/lib/format';
import { SIGMA_RULE_NAMES } from '@/lib/schemas/schemes';
import { ASSIGNED_METHOD_NAMES } from '@/lib/schemas/rounds';
import type { MeasurandEvaluation } from '@/lib/stats/evaluation/types';
import { SCORE_NAMES, statisticDecimals } from './score-columns';

export type FactFigure = 'assigned' | 'uncertainty' | 'sigma' | 'negligible';
export type EvaluationFactsProps = {
  evaluation: MeasurandEvaluation;
  plan: { unit: string; decimals: number; statedSource: string | null };
  working?: (figure: FactFigure, name: string) => ReactNode;
};

const RATIO_DECIMALS = 3;
const HORRAT_DECIMALS = 2;

/** What the scores of a measurand rest on. */
export function EvaluationFacts({ evaluation, plan, working }: EvaluationFactsProps) {
  const { assigned, sigmaPt, negligibleUncertainty: check, counts } = evaluation;
  const digits = statisticDecimals(plan.decimals);
  const withUnit = (value: number | null) =>
    value === null ? 'not available' : `${formatNumber(value, digits)} ${plan.unit}`;
  const figure = (
    key: FactFigure,
    name: string,
    value: ReactNode,
    isThere: boolean,
    hint?: ReactNode,
  ): Fact => ({
    label: name,
    value: (
      <>
        {value}
        {isThere && working && <span className="ml-1 font-normal">{working(key, name)}</span>}
      </>
    ),
    hint,
  });
  const negligibleWords =
    check.negligible === null
      ? check.reason
      : check.negligible
        ? 'negligible: at most 0.3'
        : 'not negligible: above 0.3';
  return (
    <Facts
      columns={2}
      items={[
        figure(
          'assigned',
          'x_pt',
          withUnit(assigned.value),
          assigned.value !== null,
          assigned.value === null ? assigned.reason : methodWords(assigned.method, plan.statedSource),
        ),
        figure(
          'uncertainty',
          'u(x_pt)',
          withUnit(assigned.standardUncertainty),
          assigned.standardUncertainty !== null,
          assigned.standardUncertainty === null ? assigned.reason : undefined,
        ),
        figure(
          'sigma',
          'sigma_pt',
          withUnit(sigmaPt.value),
          sigmaPt.value !== null,
          sigmaPt.reason ?? SIGMA_RULE_NAMES[sigmaPt.rule],
        ),
        figure(
          'negligible',
          'u(x_pt) / sigma_pt',
          formatNumber(check.ratio, RATIO_DECIMALS),
          check.ratio !== null,
          negligibleWords,
        ),
        { label: 'Score', value: SCORE_NAMES[evaluation.scoreKind], hint: evaluation.scoreKindReason },
        { label: 'Results', value: countWords(counts) },
        ...(sigmaPt.horRat === null
          ? []
          : [
              {
                label: 'HorRat of sigma_pt',
                value: formatNumber(sigmaPt.horRat, HORRAT_DECIMALS),
                hint: 'sigma_pt divided by the Horwitz value at x_pt',
              },
            ]),
      ]}
    />
  );
}

function methodWords(method: keyof typeof ASSIGNED_METHOD_NAMES, source: string | null): string {
  return method === 'stated' && source ? `Stated: ${source}` : ASSIGNED_METHOD_NAMES[method];
}

function countWords({
  scored,
  used,
  censoredLow,
  censoredHigh,
  excluded,
}: MeasurandEvaluation['counts']): string {
  const parts = [`${used} used`, `${scored} scored`];
  if (censoredLow > 0) parts.push(`${censoredLow} less-than left out`);
  if (censoredHigh > 0) parts.push(`${censoredHigh} greater-than left out`);
  if (excluded > 0) parts.push(`${excluded} excluded`);
  return parts.join(', ');
}
