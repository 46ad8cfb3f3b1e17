import { checkNotNegative, checkValues, representable } from '../internal/check-values';
import { algorithmA } from '../location-scale/algorithm-a';
import type { WorkingStep } from '../working';
import { CONSENSUS_FACTOR, consensusUncertainty } from './consensus-uncertainty';
import type { ReferenceValue } from './formulation-value';

export interface ExpertResult {
  readonly value: number;
  readonly standardUncertainty?: number;
}

export interface ExpertConsensus extends ReferenceValue {
  readonly robustSd: number;
  /** Whether u(x_pt) comes from the stated uncertainties or from the spread of the results. */
  readonly uncertaintyFrom: 'stated' | 'spread';
}

/**
 * Assigned value from expert laboratories by consensus: x* of Algorithm A, each laboratory with the same weight.
 *
 * When all state an uncertainty, u(x_pt) comes from these, 1.25 / p times the root of their sum of squares; else from the
 * spread, 1.25 s* / sqrt(p). If the two differ much, something is wrong with one of them.
 *
 * @param results - Shape: p results. value - Unit: unit of the data. Domain: finite. standardUncertainty - Domain: finite; >= 0. At
 *   least 2.
 * @returns { value, standardUncertainty, robustSd: s*, uncertaintyFrom, working }
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for a negative uncertainty; as algorithmA
 *
 * Zero spread: allowed. Order of input: does not matter. Numerics: algorithmA, O(p log p).
 * Source: ISO 13528:2022, 7.6 (with stated uncertainties) and 7.7.3.
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example expertConsensus([{ value: 9 }, { value: 10 }, { value: 11 }]).value // => 10
 */
export function expertConsensus(results: readonly ExpertResult[]): ExpertConsensus {
  const values = results.map(({ value }) => value);
  checkValues('expertConsensus', values, 2);
  const { location, scale } = algorithmA(values);
  const stated = results.flatMap(({ standardUncertainty: u }) => (u === undefined ? [] : [u]));
  for (const u of stated) checkNotNegative('expertConsensus', 'standard uncertainty', u);
  const p = values.length;
  const fromStated = stated.length === p;
  const u = fromStated
    ? (CONSENSUS_FACTOR / p) * Math.hypot(...stated)
    : consensusUncertainty({ robustSd: scale, count: p });
  const standardUncertainty = representable('expertConsensus', u);
  const step: WorkingStep = {
    name: 'Standard uncertainty of the assigned value',
    formula: fromStated ? 'u = 1.25 / p times the root of the sum of u_i^2' : 'u = 1.25 * s / sqrt(p)',
    clause: fromStated ? 'ISO 13528, 7.6' : 'ISO 13528, 7.7.3',
    inputs: fromStated ? { p, uncertainties: stated } : { s: scale, p },
    value: standardUncertainty,
  };
  return {
    value: location,
    standardUncertainty,
    robustSd: scale,
    uncertaintyFrom: fromStated ? 'stated' : 'spread',
    working: [step],
  };
}
