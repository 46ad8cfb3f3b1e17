import { StatsError } from '../stats-error';
import { checkCount } from './check-alpha';
import { momentsOfRange, standardise } from './standardised';

export interface TietjenMooreResult {
  /** What is left of the sum of squares without the suspects; small is suspicious. */
  readonly statistic: number;
  /** Positions in the input, from 0, ascending. */
  readonly suspects: readonly number[];
}

/**
 * Tietjen-Moore statistic for exactly k outliers on either side: E_k.
 *
 * The values furthest from the mean are the suspects, all at once. Its critical values are known by simulation only and
 * are not given here; generalisedEsd answers the same question with a test.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param count - k, the number of suspects. Domain: whole; 1 to n - 2.
 * @returns { statistic, suspects }
 * @throws StatsError too-few-values; not-finite; no-spread when all values are equal; out-of-domain for k
 *
 * Ties and equal values: of equal distances (to 1e-12) the value listed later is the suspect. Order of input: does not
 *   matter but for ties. Numerics: O(n log n).
 * Source: Tietjen and Moore 1972, Technometrics 14, 583; NIST/SEMATECH e-Handbook 1.3.5.17.2.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts.
 * @example tietjenMoore([1, 2, 3, 4, 30], 1) // => statistic 0.00820, suspects [4]
 */
export function tietjenMoore(values: readonly number[], count: number): TietjenMooreResult {
  const sample = standardise('tietjenMoore', values, 3);
  const n = values.length;
  checkCount('tietjenMoore', 'suspects', count, 1);
  if (count > n - 2) {
    const message = `tietjenMoore can look for at most ${n - 2} outliers in ${n} values, found ${count}`;
    throw new StatsError('out-of-domain', message);
  }
  // The furthest values lie at both ends of the sorted sample.
  let [from, to] = [0, n];
  while (to - from > n - count) {
    const below = sample.mean - (sample.values[from] as number);
    const above = (sample.values[to - 1] as number) - sample.mean;
    const tied = Math.abs(below - above) <= 1e-12 * Math.max(below, above);
    const later = (sample.index[from] as number) > (sample.index[to - 1] as number);
    if (tied ? later : below > above) from += 1;
    else to -= 1;
  }
  const statistic = momentsOfRange(sample.values, from, to).squares / sample.squares;
  const suspects = [...sample.index.subarray(0, from), ...sample.index.subarray(to)].sort((a, b) => a - b);
  return { statistic, suspects };
}
