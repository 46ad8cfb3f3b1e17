import { studentTSurvival } from '../distributions';
import { OUTLIER_CLAUSES } from './clauses';
import type { OutlierTestResult } from './grubbs-one';
import { grubbsTwoOppositeCritical } from './grubbs-two-opposite-critical';
import { standardise } from './standardised';
import { criticalPair, verdictAbove } from './verdict';

/**
 * Test for two outliers on opposite sides: the range of the values over their standard deviation.
 *
 * @param values - the results or laboratory means. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param options.working - keep the steps. Default false.
 * @returns statistic (max - min) / s, critical values at 5 and 1 percent, verdict, the two suspects, pValue (an upper
 *   bound), working
 * @throws StatsError too-few-values below 3; not-finite; no-spread when all values are equal
 *
 * Ties and equal values: allowed. Zero spread: an error. Order of input: does not matter but for ties.
 * Numerics: O(n log n).
 * Source: David, Hartley and Pearson 1954, Biometrika 41, 482; Grubbs 1969, Technometrics 11, 1.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts.
 * @example grubbsTwoOpposite([1, 10, 11, 12, 13, 22]) // => statistic 3.12702, suspects [0, 5]
 */
export function grubbsTwoOpposite(
  values: readonly number[],
  options: { readonly working?: boolean } = {},
): OutlierTestResult {
  const { values: sorted, index, squares } = standardise('grubbsTwoOpposite', values, 3);
  const n = values.length;
  const range = (sorted[n - 1] as number) - (sorted[0] as number);
  const statistic = range / Math.sqrt(squares / (n - 1));
  const critical = criticalPair((alpha) => grubbsTwoOppositeCritical({ count: n, alpha }));
  const suspects = [index[0] as number, index[n - 1] as number].sort((a, b) => a - b);
  const share = (range * range) / 2 / squares;
  const tail = share >= 1 ? 0 : studentTSurvival(Math.sqrt(((n - 2) * share) / (1 - share)), n - 2);
  return {
    statistic,
    critical,
    verdict: verdictAbove(statistic, critical),
    suspects,
    pValue: Math.min(1, n * (n - 1) * tail),
    working: options.working
      ? [
          {
            name: 'Range over standard deviation',
            formula: 'q = (max(x) - min(x)) / sqrt(squares(x) / (n - 1))',
            clause: OUTLIER_CLAUSES.grubbsOpposite,
            inputs: { x: values, n },
            value: statistic,
          },
        ]
      : null,
  };
}
