import 'server-only';
import { createHash } from 'node:crypto';
import type { RoundMeasurand } from '@/db/round-measurand-store';
import type { MeasuredResult } from '@/db/views/round-results-view';
import { mean, type CensoredResult, type EvaluateMeasurandInput, type MeasurandResult } from '@/lib/stats';
import { massFractionPerUnit } from '@/lib/units';

interface Figures {
  results: MeasurandResult[];
  censored: CensoredResult[];
}

function groupByCode(results: readonly MeasuredResult[]): Map<string, MeasuredResult[]> {
  const groups = new Map<string, MeasuredResult[]>();
  for (const result of results) {
    const group = groups.get(result.participantCode);
    if (group) group.push(result);
    else groups.set(result.participantCode, [result]);
  }
  return groups;
}

/** The largest standard uncertainty that was stated, with its expanded one as stated. */
function statedUncertainty(
  replicates: readonly MeasuredResult[],
): Pick<MeasurandResult, 'standardUncertainty' | 'expandedUncertainty'> {
  let largest: { standardUncertainty: number | null; expandedUncertainty: number | null } = {
    standardUncertainty: null,
    expandedUncertainty: null,
  };
  for (const { expandedUncertainty, coverageFactor } of replicates) {
    if (expandedUncertainty === null || coverageFactor === null) continue;
    const standardUncertainty = expandedUncertainty / coverageFactor;
    if (standardUncertainty > (largest.standardUncertainty ?? -1)) {
      largest = { standardUncertainty, expandedUncertainty };
    }
  }
  return largest;
}

/**
 * One figure for each participant: the mean of the replicates with the largest stated standard uncertainty. A
 * participant with a less-than or greater-than replicate has no number; the limit that says least is judged instead.
 */
export function figuresOf(results: readonly MeasuredResult[]): Figures {
  const figures: Figures = { results: [], censored: [] };
  for (const [participant, measured] of groupByCode(results)) {
    const replicates = measured.filter((result) => result.kind !== 'not-measured');
    const limits = (kind: 'below' | 'above') =>
      replicates.flatMap((result) => (result.kind === kind && result.value !== null ? [result.value] : []));
    const [below, above] = [limits('below'), limits('above')];
    const values = replicates.flatMap((result) => (result.value === null ? [] : [result.value]));
    if (below.length > 0) {
      figures.censored.push({ participant, comparator: '<', limit: Math.max(...below) });
    } else if (above.length > 0) {
      figures.censored.push({ participant, comparator: '>', limit: Math.min(...above) });
    } else if (values.length > 0) {
      figures.results.push({
        participant,
        value: values.length === 1 && values[0] !== undefined ? values[0] : mean(values),
        ...statedUncertainty(replicates),
      });
    }
  }
  return figures;
}

/** What the library is told about one measurand: the plan's choices and the participants' figures. */
export function evaluationInput(
  plan: RoundMeasurand,
  results: readonly MeasuredResult[],
): EvaluateMeasurandInput {
  return {
    ...figuresOf(results),
    assignedValue: {
      method: plan.assignedMethod,
      value: plan.statedValue ?? undefined,
      standardUncertainty: plan.statedUncertainty ?? undefined,
    },
    sigmaPt: {
      rule: plan.sigmaRule,
      value: plan.sigmaValue ?? undefined,
      percent: plan.sigmaPercent ?? undefined,
      massFractionPerUnit: massFractionPerUnit(plan.unit) ?? undefined,
    },
    score: { kind: plan.scoreKind, zPrimeWhenNeeded: plan.zPrimeWhenNeeded },
  };
}

/** The same inputs give the same text and so the same hash, whatever order the rows came in. */
export function inputsText(
  inputs: readonly { roundMeasurandId: number; input: EvaluateMeasurandInput }[],
): string {
  return JSON.stringify([...inputs].sort((a, b) => a.roundMeasurandId - b.roundMeasurandId));
}

export function hashText(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}
