import type { EvaluateMeasurandInput, MeasurandResult } from '@/lib/stats';

/** Invented results of 15 laboratories, in micrograms per kilogram, one of them far off. */
export const VALUES = [9.8, 10.4, 11.1, 8.9, 10, 10.2, 9.5, 12.3, 10.7, 9.1, 10.1, 9.9, 10.6, 9.3, 31];

export function resultsOf(
  values: readonly number[],
  standardUncertainty: number | null = null,
): MeasurandResult[] {
  return values.map((value, i) => ({ participant: `P${i + 1}`, value, standardUncertainty }));
}

export function inputOf(changes: Partial<EvaluateMeasurandInput> = {}): EvaluateMeasurandInput {
  return {
    results: resultsOf(VALUES),
    censored: [],
    assignedValue: { method: 'algorithm-a' },
    sigmaPt: { rule: 'percent', percent: 20 },
    score: { kind: 'z', zPrimeWhenNeeded: true },
    ...changes,
  };
}

/** Freezes an object and everything in it, so that a function that changes its input fails. */
export function deepFreeze<T>(value: T): T {
  if (typeof value === 'object' && value !== null) {
    Object.values(value).forEach(deepFreeze);
    Object.freeze(value);
  }
  return value;
}
