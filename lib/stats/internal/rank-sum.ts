import { normalSurvival } from '../distributions';
import { midranks } from './ranks';

export interface RankSumResult {
  /** Pairs with the first value above the second, halves for ties: U. */
  readonly statistic: number;
  readonly pValue: number;
  readonly exact: boolean;
}

/** Up to so many values without ties the distribution is counted out. */
const EXACT_UP_TO = 49;

/** Two-sided Wilcoxon-Mann-Whitney test of checked, non-empty samples. */
export function rankSum(first: readonly number[], second: readonly number[]): RankSumResult {
  const [m, n] = [first.length, second.length];
  const { ranks, ties } = midranks([...first, ...second]);
  const statistic = ranks.subarray(0, m).reduce((sum, rank) => sum + rank, 0) - (m * (m + 1)) / 2;
  if (ties === 0 && m <= EXACT_UP_TO && n <= EXACT_UP_TO) {
    return { statistic, pValue: exactPValue(statistic, m, n), exact: true };
  }
  const total = m + n;
  const variance = ((m * n) / 12) * (total + 1 - ties / (total * (total - 1)));
  // Half a step towards the middle, as the statistic is a count.
  const distance = Math.max(0, Math.abs(statistic - (m * n) / 2) - 0.5);
  const pValue = variance > 0 ? Math.min(1, 2 * normalSurvival(distance / Math.sqrt(variance))) : 1;
  return { statistic, pValue, exact: false };
}

/** Counts of the arrangements with each U, as the coefficients of a Gaussian binomial (kept as shares of all). */
function exactPValue(statistic: number, m: number, n: number): number {
  const largest = m * n;
  // The recursion over both sizes, in probabilities so that no count overflows.
  const table: Float64Array[] = Array.from({ length: n + 1 }, () => Float64Array.of(1));
  for (let i = 1; i <= m; i += 1) {
    for (let j = 1; j <= n; j += 1) {
      table[j] = merged(table[j] as Float64Array, table[j - 1] as Float64Array, i, j);
    }
  }
  const shares = table[n] as Float64Array;
  const low = Math.min(statistic, largest - statistic);
  let sum = 0;
  for (let u = 0; u <= low; u += 1) sum += shares[u] as number;
  return Math.min(1, 2 * sum);
}

/** P(u; i, j) = i / (i + j) P(u - j; i - 1, j) + j / (i + j) P(u; i, j - 1). */
function merged(lessFirst: Float64Array, lessSecond: Float64Array, i: number, j: number): Float64Array {
  const shares = new Float64Array(i * j + 1);
  const [a, b] = [i / (i + j), j / (i + j)];
  lessFirst.forEach((share, u) => (shares[u + j] = a * share));
  lessSecond.forEach((share, u) => (shares[u] = (shares[u] as number) + b * share));
  return shares;
}
