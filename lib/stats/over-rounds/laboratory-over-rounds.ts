import {
  chiSquareCdf,
  chiSquareQuantile,
  chiSquareSurvival,
  chiSquareUpperQuantile,
  studentTSurvival,
  studentTUpperQuantile,
} from '../distributions';
import { checkValues, representable } from '../internal/check-values';
import { mean } from '../location-scale/mean';
import { median } from '../location-scale/median';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ROUND_CLAUSES } from './clauses';

export interface LaboratoryOverRoundsResult {
  readonly rounds: number;
  /** Mean of z: the bias in units of sigma_pt. */
  readonly bias: number;
  readonly biasLower: number;
  readonly biasUpper: number;
  /** Two-sided, bias against 0; null when all z are equal. */
  readonly biasPValue: number | null;
  readonly sd: number;
  readonly sdLower: number;
  readonly sdUpper: number;
  /** Two-sided, sd against 1: does sigma_pt describe this laboratory's spread. */
  readonly sdPValue: number;
  readonly median: number;
  /** Sum of z over the root of n: near standard normal without bias. Does not replace the single scores. */
  readonly rescaledSum: number;
  /** Sum of z squared: near chi-square with n degrees of freedom. */
  readonly sumOfSquares: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * One laboratory over rounds: bias and standard deviation of its z, with intervals.
 *
 * A laboratory with a bias of -0.8 may never get a signal and yet report low every time. Intervals take z as normal
 * and independent from round to round.
 *
 * @param z - scores. Shape: n values. Unit: none. Domain: finite; at least 2.
 * @param options.confidence - of both intervals. Domain: between 0 and 1. Default 0.95.
 * @param options.working - keep the steps. Default false.
 * @returns see LaboratoryOverRoundsResult, no unit
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for a confidence outside (0, 1) or scores too
 *   large
 *
 * Ties and equal values: allowed. Zero spread: sd 0 with interval 0 to 0, biasPValue null. Order of input: does not
 *   matter. Numerics: O(n log n).
 * Source: t interval of a mean, chi-square interval of a variance: NIST/SEMATECH e-Handbook 7.2.2.1 and 7.2.3; combined
 *   scores with their caution: ISO 13528:2022, 9.8 and AMC Technical Brief 74.
 * Checked by: tests/stats/over-rounds/over-rounds.test.ts (R t.test), tests/reference/interlaboratory (allergen).
 * @example laboratoryOverRounds([0.5, -0.2, 1.1, 0.4]) // => bias 0.45, sd 0.53229, rescaledSum 0.9
 */
export function laboratoryOverRounds(
  z: readonly number[],
  options: { readonly confidence?: number; readonly working?: boolean } = {},
): LaboratoryOverRoundsResult {
  const { confidence = 0.95 } = options;
  checkValues('laboratoryOverRounds', z, 2);
  if (!(confidence > 0 && confidence < 1)) {
    const message = `laboratoryOverRounds requires a confidence between 0 and 1, found ${confidence}`;
    throw new StatsError('out-of-domain', message);
  }
  const n = z.length;
  const tail = (1 - confidence) / 2;
  const [bias, spread] = [mean(z), sd(z)];
  const error = spread / Math.sqrt(n);
  const reach = studentTUpperQuantile(tail, n - 1) * error;
  const finite = (value: number) => representable('laboratoryOverRounds', value);
  const squares = finite((n - 1) * spread * spread);
  const facts = {
    rounds: n,
    bias,
    biasLower: finite(bias - reach),
    biasUpper: finite(bias + reach),
    biasPValue: error > 0 ? Math.min(1, 2 * studentTSurvival(Math.abs(bias) / error, n - 1)) : null,
    sd: spread,
    sdLower: spread * Math.sqrt((n - 1) / chiSquareUpperQuantile(tail, n - 1)),
    sdUpper: finite(spread * Math.sqrt((n - 1) / chiSquareQuantile(tail, n - 1))),
    sdPValue: Math.min(1, 2 * Math.min(chiSquareCdf(squares, n - 1), chiSquareSurvival(squares, n - 1))),
    median: median(z),
    rescaledSum: finite(bias * Math.sqrt(n)),
    sumOfSquares: finite(squares + n * bias * bias),
  };
  return { ...facts, working: options.working ? workingOf(z, facts, tail) : null };
}

function workingOf(
  z: readonly number[],
  facts: Omit<LaboratoryOverRoundsResult, 'working'>,
  tail: number,
): readonly WorkingStep[] {
  const clause = ROUND_CLAUSES.summary;
  const n = z.length;
  const { bias, sd: s } = facts;
  const t = studentTUpperQuantile(tail, n - 1);
  const [low, high] = [chiSquareQuantile(tail, n - 1), chiSquareUpperQuantile(tail, n - 1)];
  const step = (name: string, formula: string, inputs: WorkingStep['inputs'], value: number) => ({
    name,
    formula,
    clause,
    inputs,
    value,
  });
  return [
    step('Bias', 'bias = sum(z) / n', { z, n }, bias),
    step('Standard deviation', 's = sqrt(squares(z) / (n - 1))', { z, n }, s),
    step('Lower limit of the bias', 'lower = bias - t * s / sqrt(n)', { bias, t, s, n }, facts.biasLower),
    step('Upper limit of the bias', 'upper = bias + t * s / sqrt(n)', { bias, t, s, n }, facts.biasUpper),
    step('Lower limit of the sd', 'lower = s * sqrt((n - 1) / chi2)', { s, n, chi2: high }, facts.sdLower),
    step('Upper limit of the sd', 'upper = s * sqrt((n - 1) / chi2)', { s, n, chi2: low }, facts.sdUpper),
    step('Rescaled sum of z', 'RSZ = sum(z) / sqrt(n)', { z, n }, facts.rescaledSum),
    step('Sum of squared z', 'SSZ = sum(z^2)', { z }, facts.sumOfSquares),
  ];
}
