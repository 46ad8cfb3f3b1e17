import { classifyUncertainty } from '../scores/classify-uncertainty';
import { difference } from '../scores/difference';
import { eNScore } from '../scores/e-n-score';
import { judgeCensored } from '../scores/judge-censored';
import { percentDifference } from '../scores/percent-difference';
import { signalOf } from '../scores/signal-of';
import { zPrimeScore } from '../scores/z-prime-score';
import { zScore } from '../scores/z-score';
import { zetaScore } from '../scores/zeta-score';
import { attempt, missing, type Attempt } from './attempt';
import type { CensoredResult, CensoredScore, JudgedScore, MeasurandResult, ParticipantScore } from './types';

/** What scores of one measurand have in common; null where it could not be had. */
export interface ScoringBasis {
  readonly assignedValue: number | null;
  readonly assignedUncertainty: number | null;
  readonly sigmaPt: number | null;
  readonly robustSd: number | null;
  readonly coverageFactor: number;
  readonly scoreKind: JudgedScore;
}

export const NO_ASSIGNED_VALUE = 'there is no assigned value';
export const NO_SIGMA = 'there is no sigma_pt';
export const NO_ASSIGNED_UNCERTAINTY = 'the assigned value has no standard uncertainty';
export const NO_UNCERTAINTY = 'the participant reported no uncertainty';

export function scoreParticipant(
  result: MeasurandResult,
  excluded: boolean,
  basis: ScoringBasis,
): ParticipantScore {
  const { participant, value, standardUncertainty } = result;
  const scores = allScores(result, basis);
  const judged = scores[basis.scoreKind];
  const D = withAssigned(basis, (assignedValue) => difference({ value, assignedValue }));
  const dPercent = withAssigned(basis, (assignedValue) => percentDifference({ value, assignedValue }));
  return {
    participant,
    value: value + 0, // a negative zero would not survive JSON
    standardUncertainty: standardUncertainty === null ? null : standardUncertainty + 0,
    expandedUncertainty: expandedUncertaintyOf(result, basis.coverageFactor),
    excluded,
    D: D.value,
    dPercent: dPercent.value,
    z: scores.z.value,
    zPrime: scores['z-prime'].value,
    zeta: scores.zeta.value,
    eN: scores['e-n'].value,
    score: judged.value,
    signal: judged.value === null ? null : signalOf(basis.scoreKind, judged.value),
    uncertaintyClass: uncertaintyClassOf(standardUncertainty, basis),
    reason: judged.reason,
  };
}

function expandedUncertaintyOf(
  { standardUncertainty, expandedUncertainty }: MeasurandResult,
  coverageFactor: number,
): number | null {
  if (standardUncertainty === null) return null;
  return (expandedUncertainty ?? coverageFactor * standardUncertainty) + 0;
}

function withAssigned(basis: ScoringBasis, compute: (assignedValue: number) => number): Attempt<number> {
  const { assignedValue } = basis;
  return assignedValue === null ? missing(NO_ASSIGNED_VALUE) : attempt(() => compute(assignedValue));
}

function allScores(result: MeasurandResult, basis: ScoringBasis): Record<JudgedScore, Attempt<number>> {
  const { value, standardUncertainty } = result;
  const { assignedValue, assignedUncertainty, sigmaPt, coverageFactor } = basis;
  if (assignedValue === null) {
    const none = missing(NO_ASSIGNED_VALUE);
    return { z: none, 'z-prime': none, zeta: none, 'e-n': none };
  }
  const z = sigmaPt === null ? missing(NO_SIGMA) : attempt(() => zScore({ value, assignedValue, sigmaPt }));
  if (assignedUncertainty === null) {
    const none = missing(NO_ASSIGNED_UNCERTAINTY);
    return { z, 'z-prime': none, zeta: none, 'e-n': none };
  }
  const zPrime =
    sigmaPt === null
      ? missing(NO_SIGMA)
      : attempt(() => zPrimeScore({ value, assignedValue, sigmaPt, assignedUncertainty }));
  const expandedUncertainty = expandedUncertaintyOf(result, coverageFactor);
  if (standardUncertainty === null || expandedUncertainty === null) {
    const none = missing(NO_UNCERTAINTY);
    return { z, 'z-prime': zPrime, zeta: none, 'e-n': none };
  }
  const zeta = attempt(() => zetaScore({ value, assignedValue, standardUncertainty, assignedUncertainty }));
  const eN = attempt(() =>
    eNScore({
      value,
      assignedValue,
      expandedUncertainty,
      assignedExpandedUncertainty: coverageFactor * assignedUncertainty,
    }),
  );
  return { z, 'z-prime': zPrime, zeta, 'e-n': eN };
}

function uncertaintyClassOf(standardUncertainty: number | null, basis: ScoringBasis) {
  const { assignedUncertainty, robustSd } = basis;
  if (standardUncertainty === null || assignedUncertainty === null || robustSd === null) return null;
  return classifyUncertainty({ standardUncertainty, assignedUncertainty, robustSd });
}

export function judgeParticipant(
  result: CensoredResult,
  excluded: boolean,
  basis: ScoringBasis,
): CensoredScore {
  const { participant, comparator, limit } = result;
  const { assignedValue, sigmaPt } = basis;
  const found = judged();
  return {
    participant,
    comparator,
    limit: limit + 0,
    excluded,
    judgement: found.value,
    reason: found.reason,
  };

  function judged() {
    if (assignedValue === null) return missing(NO_ASSIGNED_VALUE);
    if (sigmaPt === null) return missing(NO_SIGMA);
    return attempt(() => judgeCensored({ comparator, limit, assignedValue, sigmaPt }));
  }
}
