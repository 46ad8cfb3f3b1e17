import { binomialCdf, chiSquareSurvival } from '../../distributions';
import { StatsError } from '../../stats-error';

export interface McNemarResult {
  /** Two-sided exact probability; 1 when no pair disagrees. */
  readonly exactProbability: number;
  /** (b - c)^2 / (b + c) and (|b - c| - 1)^2 / (b + c), with 1 degree of freedom; null when no pair disagrees. */
  readonly chiSquare: number | null;
  readonly chiSquareCorrected: number | null;
  readonly probability: number | null;
  readonly probabilityCorrected: number | null;
}

/**
 * McNemar test: of the items on which two methods disagree, does one decide one way more often?
 *
 * @param onlyFirst - b, items positive by the first method alone. Domain: whole; >= 0.
 * @param onlySecond - c, items positive by the second method alone. Domain: whole; >= 0.
 * @returns McNemarResult; below 25 disagreements take the exact probability
 * @throws StatsError out-of-domain for counts
 *
 * Numerics: O(1) to O(sqrt(b + c)). Source: McNemar 1947, Psychometrika 12, 153-157; exact: binomial with 1/2.
 * Checked by: tests/stats/method-comparison/decisions.test.ts (base R).
 * @example mcNemar(2, 10) // => exactProbability 0.0386, chiSquare 5.3333
 */
export function mcNemar(onlyFirst: number, onlySecond: number): McNemarResult {
  for (const count of [onlyFirst, onlySecond]) {
    if (!Number.isSafeInteger(count) || count < 0) {
      throw new StatsError('out-of-domain', `mcNemar requires whole counts of 0 or more, found ${count}`);
    }
  }
  const differ = onlyFirst + onlySecond;
  if (differ === 0) {
    return {
      exactProbability: 1,
      chiSquare: null,
      chiSquareCorrected: null,
      probability: null,
      probabilityCorrected: null,
    };
  }
  const gap = Math.abs(onlyFirst - onlySecond);
  const chiSquare = gap ** 2 / differ;
  const chiSquareCorrected = Math.max(0, gap - 1) ** 2 / differ;
  return {
    exactProbability: Math.min(1, 2 * binomialCdf(Math.min(onlyFirst, onlySecond), differ, 0.5)),
    chiSquare,
    chiSquareCorrected,
    probability: chiSquareSurvival(chiSquare, 1),
    probabilityCorrected: chiSquareSurvival(chiSquareCorrected, 1),
  };
}
