import { chiSquareSurvival } from '../distributions/chi-square';
import { normalSurvival } from '../distributions/normal';
import { checkValues, representable } from '../internal/check-values';
import { compensatedSum } from '../internal/sums';
import { ACTION_LIMIT, WARNING_LIMIT } from './limits';

export interface CombinedScores {
  /** Sum of z over sqrt(n): standard normal when all is well. Shows bias of one sign. */
  readonly rsz: number;
  /** Sum of z^2: chi-square with n degrees of freedom when all is well. Shows large scores of either sign. */
  readonly ssz: number;
  readonly count: number;
  /** How likely an |RSZ|, and an SSZ, at least as large is, were all z standard normal and independent. */
  readonly rszProbability: number;
  readonly sszProbability: number;
  /** How many of the scores have |z| > 2, and |z| >= 3. */
  readonly beyondWarning: number;
  readonly beyondAction: number;
  /** To stand beside the figures wherever they are shown. */
  readonly caution: string;
}

export const COMBINED_SCORES_CAUTION =
  'A combined score can hide one poor result among good ones, and it takes for independent what may share one cause. ' +
  'Read it only beside the single scores; it is no signal of its own.';

/**
 * Combined scores of one laboratory over measurands or rounds: RSZ, the rescaled sum, and SSZ, the sum of squares.
 *
 * The standards advise against them as a verdict: scores of opposite sign cancel in RSZ, one large score decides SSZ, and
 * scores of related measurands are not independent, so that the probabilities are a rough guide only.
 *
 * @param scores - z scores (or z', zeta) of one laboratory. Shape: n values. Unit: none. Domain: finite; at least 1.
 * @returns { rsz, ssz, count, rszProbability, sszProbability, beyondWarning, beyondAction, caution }
 * @throws StatsError too-few-values when there are none; not-finite; out-of-domain when a sum is too large to represent
 *
 * Order of input: does not matter but for the last digit. Numerics: compensated sums, O(n).
 * Source: IUPAC/ISO/AOAC Harmonized Protocol 2006, Pure Appl. Chem. 78, 145, 3.11; ISO 13528:2022, 9.11 (cautions).
 * Checked by: tests/stats/scores/combined-scores.test.ts, tests/reference/proficiency (allergen RSZ and SSZ).
 * @example combinedScores([1, 2, 3]).ssz // => 14
 */
export function combinedScores(scores: readonly number[]): CombinedScores {
  checkValues('combinedScores', scores, 1);
  const n = scores.length;
  const at = (i: number) => scores[i] as number;
  const rsz = representable('combinedScores', compensatedSum(n, at) / Math.sqrt(n));
  const ssz = representable(
    'combinedScores',
    compensatedSum(n, (i) => at(i) ** 2),
  );
  return {
    rsz,
    ssz,
    count: n,
    rszProbability: 2 * normalSurvival(Math.abs(rsz)),
    sszProbability: chiSquareSurvival(ssz, n),
    beyondWarning: scores.filter((z) => Math.abs(z) > WARNING_LIMIT).length,
    beyondAction: scores.filter((z) => Math.abs(z) >= ACTION_LIMIT).length,
    caution: COMBINED_SCORES_CAUTION,
  };
}
