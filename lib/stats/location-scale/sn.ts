import { checkValues, representable } from '../internal/check-values';
import { selectKth } from '../internal/select-kth';
import { sortedCopy } from '../internal/sorted';
import { safeFactor } from '../internal/sums';

export interface SnOptions {
  readonly finiteSample?: boolean;
}

/** Makes Sn estimate the standard deviation of normal data. */
export const SN_CONSTANT = 1.1926;

/** For 2 to 9 values (Croux and Rousseeuw 1992). */
const SMALL = [0.743, 1.851, 0.954, 1.351, 0.993, 1.198, 1.005, 1.131] as const;

/**
 * Sn: a robust standard deviation, the typical distance of a result from its fellows; no centre is needed.
 *
 * For each value the high median of its distances to all values, and of these the low median. Bears nearly half of wild
 * results; 58 % efficient at the normal distribution, and less moved by outliers than Qn.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.finiteSample - apply the factor for n. Default true, as the R package robustbase.
 * @returns Sn, unit of the data
 * @throws StatsError too-few-values below 2 values; not-finite when one is not a finite number; out-of-domain when the
 *   result is too large to represent
 *
 * Ties and equal values: allowed; 0 when more than half of the values are equal. Order of input: does not matter.
 * Numerics: after one sort the nearest half of the values is a stretch that only moves to the right with the value, so
 *   that all medians together are O(n); no search is needed. O(n log n) for the sort.
 * Source: Rousseeuw and Croux 1993, JASA 88, 1273-1283; factors of Croux and Rousseeuw 1992, COMPSTAT 1, 411-428.
 * Checked by: tests/stats/location-scale/qn-sn.test.ts, tests/reference/proficiency (estimators).
 * @example sn([1, 2, 3, 4, 100]) // => 3.2224
 */
export function sn(values: readonly number[], options: SnOptions = {}): number {
  checkValues('sn', values, 2);
  const sorted = sortedCopy(values);
  const factor = safeFactor([sorted[0] as number, sorted[sorted.length - 1] as number]);
  if (factor !== 1) sorted.forEach((value, i) => (sorted[i] = value * factor));
  const n = sorted.length;
  const inner = highMedians(sorted);
  const typical = selectKth(inner, Math.floor((n + 1) / 2) - 1) / factor;
  const small = options.finiteSample === false ? 1 : finiteSampleFactor(n);
  return representable('sn', SN_CONSTANT * small * typical);
}

/** For each value the ([n / 2] + 1)-th smallest distance to all values, its own 0 among them. */
function highMedians(sorted: Float64Array): Float64Array {
  const n = sorted.length;
  const h = Math.floor(n / 2) + 1;
  const medians = new Float64Array(n);
  let left = 0;
  let low = sorted[0] as number;
  let high = sorted[h - 1] as number;
  let next = h < n ? (sorted[h] as number) : Infinity;
  for (let i = 0; i < n; i += 1) {
    const x = sorted[i] as number;
    while (next - x < x - low) {
      left += 1;
      low = sorted[left] as number;
      high = next;
      next = left + h < n ? (sorted[left + h] as number) : Infinity;
    }
    medians[i] = x - low > high - x ? x - low : high - x;
  }
  return medians;
}

function finiteSampleFactor(n: number): number {
  if (n <= 9) return SMALL[n - 2] as number;
  return n % 2 === 1 ? n / (n - 0.9) : 1;
}
