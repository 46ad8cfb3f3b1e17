import { chiSquareSurvival } from '../distributions/chi-square';
import { checkFinite, checkPositive, representable } from '../internal/check-values';
import { compensatedSum } from '../internal/sums';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import type { Measured, ReferenceValue } from './formulation-value';

export interface ExpertWeightedMean extends ReferenceValue {
  /** From the stated uncertainties alone. */
  readonly internalUncertainty: number;
  /** From the spread of the results about the mean, with the same weights. */
  readonly externalUncertainty: number;
  /** external / internal; well above 1 says that the stated uncertainties are too small for how the results differ. */
  readonly birgeRatio: number;
  /** Weighted sum of squares about the mean, p - 1 degrees of freedom, and how likely one as large is. */
  readonly chiSquare: number;
  readonly probability: number;
  readonly weights: readonly number[];
}

/**
 * Assigned value from expert laboratories with stated uncertainties: the mean weighted by 1 / u^2.
 *
 * One laboratory with a far too small uncertainty decides it; look at the weights. The larger of the internal and the
 * external uncertainty is given. Where the results do not agree (a small probability) take expertConsensus instead.
 *
 * @param results - Shape: p pairs. value - Unit: unit of the data. Domain: finite. standardUncertainty - Domain: finite; > 0. At
 *   least 2.
 * @returns { value, standardUncertainty, internalUncertainty, externalUncertainty, birgeRatio, chiSquare, probability,
 *   weights: summing to 1, working }
 * @throws StatsError too-few-values below 2; not-finite; no-spread for an uncertainty of 0; out-of-domain for a negative one
 *
 * Order of input: kept in the weights. Numerics: scaled by the smallest uncertainty, compensated sums, O(p).
 * Source: ISO 13528:2022, 7.6; Birge 1932, Phys. Rev. 40, 207-227.
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example expertWeightedMean([{ value: 9, standardUncertainty: 1 }, { value: 11, standardUncertainty: 1 }]).value // => 10
 */
export function expertWeightedMean(results: readonly Measured[]): ExpertWeightedMean {
  const p = results.length;
  if (p < 2)
    throw new StatsError('too-few-values', `expertWeightedMean requires at least 2 results, found ${p}`);
  for (const { value, standardUncertainty } of results) {
    checkFinite('expertWeightedMean', 'result', value);
    checkPositive('expertWeightedMean', 'standard uncertainty', standardUncertainty);
  }
  const uncertainties = results.map((result) => result.standardUncertainty);
  const values = results.map((result) => result.value);
  const smallest = Math.min(...uncertainties);
  const raw = uncertainties.map((u) => (smallest / u) ** 2);
  const total = compensatedSum(p, (i) => raw[i] as number);
  const weights = raw.map((weight) => weight / total);
  // About the first value, so that a large common part costs no digits.
  const origin = values[0] as number;
  const shift = compensatedSum(p, (i) => (weights[i] as number) * ((values[i] as number) - origin));
  const value = representable('expertWeightedMean', origin + shift);
  const internal = smallest / Math.sqrt(total);
  const off = (i: number) => ((values[i] as number) - value) / (uncertainties[i] as number);
  const chiSquare = representable(
    'expertWeightedMean',
    compensatedSum(p, (i) => off(i) ** 2),
  );
  const birgeRatio = Math.sqrt(chiSquare / (p - 1));
  const external = internal * birgeRatio;
  const standardUncertainty = Math.max(internal, external);
  const inputs = { values, uncertainties };
  return {
    value,
    standardUncertainty,
    internalUncertainty: internal,
    externalUncertainty: external,
    birgeRatio,
    chiSquare,
    probability: chiSquareSurvival(chiSquare, p - 1),
    weights,
    working: steps({ inputs, value, internal, chiSquare, external, p, standardUncertainty }),
  };
}

function steps(found: {
  inputs: { values: number[]; uncertainties: number[] };
  value: number;
  internal: number;
  chiSquare: number;
  external: number;
  p: number;
  standardUncertainty: number;
}): WorkingStep[] {
  const { inputs, value, internal, chiSquare, external, p, standardUncertainty } = found;
  const step = (
    name: string,
    formula: string,
    given: WorkingStep['inputs'],
    result: number,
  ): WorkingStep => ({
    name,
    formula,
    clause: 'ISO 13528, 7.6',
    inputs: given,
    value: result,
  });
  return [
    step('Weighted mean', 'x_pt = sum of x / u^2 over sum of 1 / u^2', inputs, value),
    step('Internal standard uncertainty', '1 over root of sum of 1 / u^2', inputs, internal),
    step('Chi-square of the results', 'sum of ((x - mean) / u)^2', { ...inputs, mean: value }, chiSquare),
    step(
      'External standard uncertainty',
      'u = internal * sqrt(chiSquare / (p - 1))',
      { internal, chiSquare, p },
      external,
    ),
    step(
      'Standard uncertainty of the assigned value',
      'the larger of the two',
      { internal, external },
      standardUncertainty,
    ),
  ];
}
