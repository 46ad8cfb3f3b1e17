import { StatsError } from '../stats-error';
import type { EvaluateMeasurandInput } from './types';

/** Refuses input that no reading can make sense of; a missing setting or too few results are no fault here. */
export function checkInput(input: EvaluateMeasurandInput): void {
  const seen = new Set<string>();
  for (const { participant } of [...input.results, ...input.censored]) {
    if (seen.has(participant)) {
      throw new StatsError(
        'out-of-domain',
        `evaluateMeasurand takes one result a participant, found two of ${participant}`,
      );
    }
    seen.add(participant);
  }
  for (const { participant, value, standardUncertainty } of input.results) {
    requireFinite(`a finite result of ${participant}`, value);
    if (standardUncertainty === null) continue;
    requireFinite(`a finite standard uncertainty of ${participant}`, standardUncertainty);
    if (standardUncertainty < 0) {
      const asked = `a standard uncertainty of zero or more of ${participant}`;
      throw new StatsError(
        'out-of-domain',
        `evaluateMeasurand requires ${asked}, found ${standardUncertainty}`,
      );
    }
  }
  for (const { participant, limit } of input.censored)
    requireFinite(`a finite limit of ${participant}`, limit);
}

function requireFinite(asked: string, value: number): void {
  if (!Number.isFinite(value)) {
    throw new StatsError('not-finite', `evaluateMeasurand requires ${asked}, found ${value}`);
  }
}
