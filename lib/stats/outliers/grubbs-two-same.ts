import { OUTLIER_CLAUSES } from './clauses';
import type { OutlierOptions, OutlierTestResult } from './grubbs-one';
import { solveMonotone } from './solve-monotone';
import { momentsOfRange, standardise } from './standardised';
import { twoLargestDistribution } from './two-largest-distribution';
import { criticalPair, verdictBelow } from './verdict';

/**
 * Grubbs' test for two outliers on the same side: what is left of the sum of squares without them.
 *
 * For two results that hide each other. ISO 5725-2 asks for it where the single test finds nothing.
 *
 * @param values - the results or laboratory means. Shape: n values. Unit: unit of the data. Domain: finite; at least 4.
 * @param options.side - 'highest' two, 'lowest' two, or 'either' for the pair that leaves less. Default 'either'.
 * @param options.working - keep the steps. Default false.
 * @returns statistic (a ratio of sums of squares; small is suspicious), critical values, verdict, the two suspects, pValue
 *   (for 'either' twice that of one side: a bound), working
 * @throws StatsError too-few-values below 4; not-finite; no-spread when all values are equal
 *
 * Ties and equal values: of equal values those listed first (below) or last (above). Zero spread among the rest: the
 *   ratio is 0. Order of input: does not matter but for ties.
 * Numerics: O(n log n); the null distribution is exact to about 1e-7 and costs tens of milliseconds.
 * Source: ISO 5725-2:2019, 7.3.4; Grubbs and Beck 1972, Technometrics 14, 847.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts (simulation, tables).
 * @example grubbsTwoSame([10, 11, 12, 13, 14, 30, 31]) // => statistic 0.0201, verdict 'outlier', suspects [5, 6]
 */
export function grubbsTwoSame(values: readonly number[], options: OutlierOptions = {}): OutlierTestResult {
  const sample = standardise('grubbsTwoSame', values, 4);
  const n = values.length;
  const side = options.side ?? 'either';
  const withoutHighest = momentsOfRange(sample.values, 0, n - 2).squares / sample.squares;
  const withoutLowest = momentsOfRange(sample.values, 2, n).squares / sample.squares;
  const lowest = side === 'lowest' || (side === 'either' && withoutLowest < withoutHighest * (1 - 1e-12));
  const statistic = lowest ? withoutLowest : withoutHighest;
  const sides = side === 'either' ? 2 : 1;
  const probability = twoLargestDistribution(n);
  const critical = criticalPair((alpha) => solveMonotone(probability, alpha / sides, 0, 1));
  const places = lowest ? [0, 1] : [n - 2, n - 1];
  const suspects = places.map((place) => sample.index[place] as number).sort((a, b) => a - b);
  const kept = values.filter((_, i) => !suspects.includes(i));
  return {
    statistic,
    critical,
    verdict: verdictBelow(statistic, critical),
    suspects,
    pValue: Math.min(1, sides * probability(statistic)),
    working: options.working
      ? [
          {
            name: "Grubbs' ratio for two outliers",
            formula: 'G = squares(kept) / squares(x)',
            clause: OUTLIER_CLAUSES.grubbsTwo,
            inputs: { x: values, kept },
            value: statistic,
          },
        ]
      : null,
  };
}
