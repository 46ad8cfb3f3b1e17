import { CLAUSES } from '../clauses';
import { StatsError } from '../stats-error';
import type { WorkingInput, WorkingStep } from '../working';
import type { CensoredScore, MeasurandEvaluation, ParticipantScore } from './types';

/**
 * The steps of one participant's scores, built from a stored evaluation without computing anything anew.
 *
 * @param evaluation - what evaluateMeasurand gave, also after a way through JSON
 * @param participant - whose steps
 * @returns the steps: D, D%, the scores that could be had, the signal, the judgement of a less-than result
 * @throws StatsError out-of-domain when the evaluation holds no such participant
 *
 * Numerics: none; formulas can be worked out from the inputs shown. A score within 1e-9 of a limit was compared on
 *   decimal figures and may differ from binary arithmetic in its last digit.
 * Source: ISO 13528:2022, clause 9.
 * Checked by: tests/stats/evaluation/working.test.ts.
 * @example participantWorking(evaluation, '17') // => [{ name: 'Difference D', ... }, ...]
 */
export function participantWorking(
  evaluation: MeasurandEvaluation,
  participant: string,
): readonly WorkingStep[] {
  const scored = evaluation.scores.find((entry) => entry.participant === participant);
  if (scored) return scoreSteps(evaluation, scored);
  const censored = evaluation.censored.find((entry) => entry.participant === participant);
  if (censored) return censoredSteps(evaluation, censored);
  throw new StatsError(
    'out-of-domain',
    `participantWorking finds no result of ${participant} in this evaluation`,
  );
}

function scoreSteps(evaluation: MeasurandEvaluation, entry: ParticipantScore): WorkingStep[] {
  const x_i = entry.value;
  const u_x_i = entry.standardUncertainty;
  const x_pt = evaluation.assigned.value;
  const u_x_pt = evaluation.assigned.standardUncertainty;
  const sigma_pt = evaluation.sigmaPt.value;
  const k = evaluation.coverageFactor;
  const steps: WorkingStep[] = [];
  const push = (
    name: string,
    formula: string,
    clause: string,
    inputs: Record<string, WorkingInput>,
    value: number | null,
  ) => {
    if (value !== null) steps.push({ name, formula, clause, inputs, value });
  };
  push('Difference D', 'D = x_i - x_pt', CLAUSES.difference, { x_i, x_pt }, entry.D);
  push(
    'Difference in percent D%',
    'D% = 100 * (x_i - x_pt) / x_pt',
    CLAUSES.difference,
    { x_i, x_pt },
    entry.dPercent,
  );
  push('z', 'z = (x_i - x_pt) / sigma_pt', CLAUSES.z, { x_i, x_pt, sigma_pt }, entry.z);
  const zPrime = "z' = (x_i - x_pt) / sqrt(sigma_pt^2 + u_x_pt^2)";
  push("z'", zPrime, CLAUSES.zPrime, { x_i, x_pt, sigma_pt, u_x_pt }, entry.zPrime);
  const zeta = 'zeta = (x_i - x_pt) / sqrt(u_x_i^2 + u_x_pt^2)';
  push('zeta', zeta, CLAUSES.zeta, { x_i, x_pt, u_x_i, u_x_pt }, entry.zeta);
  const eN = 'E_n = (x_i - x_pt) / sqrt(U_x_i^2 + (k * u_x_pt)^2)';
  const U_x_i = entry.expandedUncertainty;
  push('E_n', eN, CLAUSES.eN, { x_i, x_pt, U_x_i, u_x_pt, k }, entry.eN);
  steps.push(signalStep(evaluation, entry));
  if (entry.uncertaintyClass !== null) steps.push(uncertaintyStep(evaluation, entry));
  return steps;
}

const SCORE_NAMES = { z: 'z', 'z-prime': "z'", zeta: 'zeta', 'e-n': 'E_n' } as const;
const SCORE_CLAUSES = {
  z: CLAUSES.z,
  'z-prime': CLAUSES.zPrime,
  zeta: CLAUSES.zeta,
  'e-n': CLAUSES.eN,
} as const;

function signalStep(evaluation: MeasurandEvaluation, entry: ParticipantScore): WorkingStep {
  const { scoreKind, scoreKindReason } = evaluation;
  const rule =
    scoreKind === 'e-n'
      ? 'above 1 in size: action signal; else no signal'
      : 'up to 2 in size: no signal; above 2 and below 3: warning signal; from 3: action signal';
  const inputs: Record<string, WorkingInput> = {
    score: entry.score,
    kind: SCORE_NAMES[scoreKind],
    why: scoreKindReason,
  };
  if (entry.reason !== null) inputs.reason = entry.reason;
  return { name: 'Signal', formula: rule, clause: SCORE_CLAUSES[scoreKind], inputs, value: entry.signal };
}

function uncertaintyStep(evaluation: MeasurandEvaluation, entry: ParticipantScore): WorkingStep {
  return {
    name: 'Plausibility of the stated uncertainty',
    formula: 'plausible from u_x_pt to 1.5 * s_star; low below, high above',
    clause: CLAUSES.uncertaintyClass,
    inputs: {
      u_x_i: entry.standardUncertainty,
      u_x_pt: evaluation.assigned.standardUncertainty,
      s_star: evaluation.robust.algorithmA?.scale ?? null,
    },
    value: entry.uncertaintyClass,
  };
}

function censoredSteps(evaluation: MeasurandEvaluation, entry: CensoredScore): WorkingStep[] {
  const { comparator, limit } = entry;
  const inputs: Record<string, WorkingInput> = {
    comparator,
    limit,
    x_pt: evaluation.assigned.value,
    sigma_pt: evaluation.sigmaPt.value,
  };
  if (entry.reason !== null) inputs.reason = entry.reason;
  const [against, beyond] = comparator === '<' ? ['below', 'above'] : ['above', 'below'];
  const formula =
    `limit ${against} the range x_pt - 2 * sigma_pt to x_pt + 2 * sigma_pt: inconsistent; inside: consistent; ` +
    `${beyond}: uninformative`;
  const clause = 'common practice, no clause; the range is that of a z without signal';
  return [
    { name: 'Judgement of a result without a number', formula, clause, inputs, value: entry.judgement },
  ];
}
