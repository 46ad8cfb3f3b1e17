import type {
  AssignedValue,
  EvaluationCounts,
  JudgedScore,
  MeasurandEvaluation,
  NegligibleUncertainty,
  RobustSummary,
  SigmaPtValue,
} from './types';

/** Fewer results than this make an unreliable consensus (the caution of ISO 13528, from memory). */
export const FEW_RESULTS = 12;

interface NoteFacts {
  readonly assigned: AssignedValue;
  readonly robust: RobustSummary;
  readonly sigmaPt: SigmaPtValue;
  readonly negligibleUncertainty: NegligibleUncertainty;
  readonly scoreKind: JudgedScore;
  readonly counts: EvaluationCounts;
}

/** What a reader has to know beside the figures, in plain sentences. */
export function writeNotes(facts: NoteFacts): MeasurandEvaluation['notes'] {
  return [
    ...notesOnResults(facts),
    ...notesOnAssignedValue(facts),
    ...notesOnAlgorithmA(facts),
    ...notesOnScores(facts),
  ];
}

function notesOnResults({ counts }: NoteFacts): string[] {
  const notes: string[] = [];
  const { censoredLow, censoredHigh, excluded } = counts;
  if (censoredLow > 0)
    notes.push(`${resultsAre(censoredLow, 'less-than')} left out of the consensus and not scored.`);
  if (censoredHigh > 0) {
    notes.push(`${resultsAre(censoredHigh, 'greater-than')} left out of the consensus and not scored.`);
  }
  if (excluded > 0)
    notes.push(`${resultsAre(excluded, 'excluded')} left out of the consensus but still scored.`);
  return notes;
}

function resultsAre(count: number, kind: string): string {
  return count === 1 ? `1 ${kind} result is` : `${count} ${kind} results are`;
}

function notesOnAssignedValue({ assigned, robust, sigmaPt }: NoteFacts): string[] {
  const notes: string[] = [];
  if (assigned.value === null) notes.push(`There is no assigned value: ${assigned.reason}.`);
  else if (assigned.reason !== null) notes.push(`u(x_pt) is missing: ${assigned.reason}.`);
  const consensus = assigned.method !== 'stated';
  if (consensus && assigned.value !== null && robust.count < FEW_RESULTS) {
    notes.push(
      `The consensus rests on ${robust.count} results. ISO 13528 cautions that a consensus of fewer than ` +
        `${FEW_RESULTS} participants is unreliable.`,
    );
  }
  if (consensus && assigned.value !== null && assigned.standardUncertainty === 0) {
    notes.push('The results give no spread, so u(x_pt) is 0. It does not show how well the value is known.');
  }
  if (sigmaPt.value === null) notes.push(`There is no sigma_pt: ${sigmaPt.reason}.`);
  else if (sigmaPt.rule === 'robust-sd') {
    notes.push(
      'sigma_pt is the robust standard deviation of this round: z compares participants with each other.',
    );
  }
  return notes;
}

function notesOnAlgorithmA({ robust: { algorithmA } }: NoteFacts): string[] {
  if (algorithmA === null) return [];
  if (algorithmA.startScaleFrom === 'all-equal') return ['All results are equal, so every scale is 0.'];
  const notes: string[] = [];
  if (algorithmA.startScaleFrom !== 'made') {
    const start = algorithmA.startScaleFrom === 'niqr' ? 'nIQR' : 'the mean absolute deviation';
    notes.push(
      `MADe is 0 because at least half of the results are equal. Algorithm A started from ${start}.`,
    );
  }
  if (algorithmA.zeroScale) notes.push('So many results are equal that the robust standard deviation is 0.');
  return notes;
}

function notesOnScores({ negligibleUncertainty, scoreKind, assigned }: NoteFacts): string[] {
  const notes: string[] = [];
  if (negligibleUncertainty.negligible === false) {
    notes.push(
      scoreKind === 'z'
        ? "u(x_pt) is above 0.3 sigma_pt and not negligible. z' or a larger sigma_pt would take it into account."
        : 'u(x_pt) is above 0.3 sigma_pt and not negligible.',
    );
  }
  if (assigned.method !== 'stated' && (scoreKind === 'zeta' || scoreKind === 'e-n')) {
    notes.push(
      'The consensus holds the scored results themselves, so this score comes out a little too small.',
    );
  }
  return notes;
}
