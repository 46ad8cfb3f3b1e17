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
  for (const { participant, value, standardUncertainty, expandedUncertainty } of input.results) {
    requireFinite(`a finite result of ${participant}`, value);
    requireUncertainty(`standard uncertainty of ${participant}`, standardUncertainty);
    requireUncertainty(`expanded uncertainty of ${participant}`, expandedUncertainty ?? null);
  }
  for (const { participant, limit } of input.censored)
    requireFinite(`a finite limit of ${participant}`, limit);
}

function requireUncertainty(what: string, uncertainty: number | null): void {
  if (uncertainty === null) return;
  requireFinite(`a finite ${what}`, uncertainty);
  if (uncertainty < 0) {
    throw new StatsError(
      'out-of-domain',
      `evaluateMeasurand requires a ${what} of zero or more, found ${uncertainty}`,
    );
  }
}

function requireFinite(asked: string, value: number): void {
  if (!Number.isFinite(value)) {
    throw new StatsError('not-finite', `evaluateMeasurand requires ${asked}, found ${value}`);
  }
}
