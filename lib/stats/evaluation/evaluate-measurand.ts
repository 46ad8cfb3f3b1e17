import { sortedCopy } from '../internal/sorted';
import { LIBRARY_VERSION } from '../version';
import { assignValue } from './assign-value';
import { checkInput } from './check-input';
import { checkNegligible, chooseScore } from './choose-score';
import { chooseSigmaPt } from './choose-sigma-pt';
import { evaluationWorking } from './evaluation-working';
import { summarise } from './robust-summary';
import { judgeParticipant, scoreParticipant, type ScoringBasis } from './score-participant';
import type {
  CensoredScore,
  EvaluateOptions,
  EvaluationCounts,
  MeasurandEvaluation,
  EvaluateMeasurandInput,
  ParticipantScore,
} from './types';
import { writeNotes } from './write-notes';

/** Expanded uncertainties in E_n are taken with k = 2, about 95 percent (common practice). */
const COVERAGE_FACTOR = 2;

/**
 * Evaluation of one measurand of a round: assigned value, sigma_pt and the scores of all participants.
 *
 * Puts the single functions of this library together as the plan of the round asks. Less-than and greater-than
 * results are judged, never scored as numbers; excluded participants are scored but do not make the consensus. What
 * cannot be computed is null with a reason, so that one poor measurand does not stop a round.
 *
 * @param input.results - one figure a participant. Shape: n results. Unit: unit of the plan. Domain: finite;
 *   standard uncertainty finite and >= 0, or null when none was reported.
 * @param input.censored - less-than and greater-than results. Unit: unit of the plan. Domain: finite limits.
 * @param input.excluded - participants left out of the consensus. Default none.
 * @param input.assignedValue - method, and for 'stated' the value and its standard uncertainty, unit of the plan
 * @param input.sigmaPt - rule and its figure: value (unit of the plan), percent, or massFractionPerUnit (g/g of one
 *   unit; also gives HorRat)
 * @param input.score - the score that is judged; zPrimeWhenNeeded changes z to z' when u(x_pt) > 0.3 sigma_pt
 * @param options.working - also give the steps and the iterations. Default false, which costs nothing.
 * @returns MeasurandEvaluation, safe for JSON: figures unrounded, in the unit of the plan; scores in the order of
 *   the results
 * @throws StatsError not-finite when a figure is not a finite number; out-of-domain for a negative uncertainty or a
 *   participant with two results
 *
 * Ties and equal values: allowed. Zero spread: no sigma_pt by robust-sd, and the notes say so; other rules score.
 * Order of input: the estimates do not depend on it.
 * Numerics: one sort for all robust estimates, O(n log n). For the median u(x_pt) uses MADe, or nIQR if MADe is 0.
 * Source: ISO 13528:2022, clauses 7 to 9 and Annex C.
 * Checked by: tests/stats/evaluation, tests/reference/proficiency.
 * @example evaluateMeasurand({ results, censored: [], assignedValue: { method: 'algorithm-a' },
 *   sigmaPt: { rule: 'percent', percent: 20 }, score: { kind: 'z', zPrimeWhenNeeded: true } })
 */
export function evaluateMeasurand(
  input: EvaluateMeasurandInput,
  options: EvaluateOptions = {},
): MeasurandEvaluation {
  checkInput(input);
  const working = options.working === true;
  const excluded = new Set(input.excluded ?? []);
  const values = input.results
    .filter(({ participant }) => !excluded.has(participant))
    .map(({ value }) => value);
  const sorted = sortedCopy(values);
  const robust = summarise(values, sorted, working);
  const assigned = assignValue(input.assignedValue, robust);
  const sigmaPt = chooseSigmaPt(input.sigmaPt, assigned.value, robust);
  const negligibleUncertainty = checkNegligible(assigned, sigmaPt);
  const chosen = chooseScore(input.score, negligibleUncertainty);
  const basis: ScoringBasis = {
    assignedValue: assigned.value,
    assignedUncertainty: assigned.standardUncertainty,
    sigmaPt: sigmaPt.value,
    robustSd: robust.algorithmA?.scale ?? null,
    coverageFactor: COVERAGE_FACTOR,
    scoreKind: chosen.scoreKind,
  };
  const scores = input.results.map((result) =>
    scoreParticipant(result, excluded.has(result.participant), basis),
  );
  const censored = input.censored.map((result) =>
    judgeParticipant(result, excluded.has(result.participant), basis),
  );
  const counts = countResults(scores, censored);
  const facts = { assigned, robust, sigmaPt, negligibleUncertainty, ...chosen, counts };
  return {
    libraryVersion: LIBRARY_VERSION,
    ...facts,
    coverageFactor: COVERAGE_FACTOR,
    scores,
    censored,
    notes: writeNotes(facts),
    working: working
      ? evaluationWorking(
          input,
          Array.from(sorted, (value) => value + 0),
          facts,
        )
      : null,
  };
}

function countResults(
  scores: readonly ParticipantScore[],
  censored: readonly CensoredScore[],
): EvaluationCounts {
  const excluded = scores.filter((entry) => entry.excluded).length;
  const censoredLow = censored.filter((entry) => entry.comparator === '<').length;
  return {
    scored: scores.filter((entry) => entry.score !== null).length,
    used: scores.length - excluded,
    censoredLow,
    censoredHigh: censored.length - censoredLow,
    excluded,
  };
}
