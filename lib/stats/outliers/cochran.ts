import { fSurvival } from '../distributions';
import { checkGroups, groupedData, type Groups } from '../internal/grouped-data';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { OUTLIER_CLAUSES } from './clauses';
import { cochranCritical } from './cochran-critical';
import { mostFrequent } from './most-frequent';
import { criticalPair, verdictAbove, type CriticalPair, type OutlierVerdict } from './verdict';

export interface CochranResult {
  /** Largest variance over the sum of all. */
  readonly statistic: number;
  readonly critical: CriticalPair;
  readonly verdict: OutlierVerdict;
  /** Position of the group in the input, from 0. */
  readonly suspect: number;
  /** An upper bound, exact where the statistic is above 0.5. */
  readonly pValue: number;
  /** Groups with a variance: those of one result are left out. */
  readonly groups: number;
  /** Replicates a group, for the critical value: the most frequent number where they differ. */
  readonly replicates: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Cochran's test: is the largest of several variances too large to belong to the others.
 *
 * One-sided: a laboratory, or an item, whose replicates agree badly. It flags; a person decides. For unequal numbers
 * of replicates the most frequent number is used, as ISO 5725-2 advises; say so where they differ much.
 *
 * @param groups - the replicates. Shape: p lists. Unit: unit of the data. Domain: finite; at least 2 lists with 2 or
 *   more values.
 * @param options.working - keep the steps. Default false.
 * @returns statistic, critical values at 5 and 1 percent, verdict, suspect, pValue, groups, replicates, working
 * @throws StatsError too-few-values; not-finite; no-spread when no group has any spread
 *
 * Ties and equal values: of equal variances the first. Order of input: does not matter but for ties.
 * Numerics: O(N log N).
 * Source: ISO 5725-2:2019, 7.3.3; Cochran 1941, Annals of Eugenics 11, 47.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts, tests/reference/interlaboratory.
 * @example cochranTest([[1, 1.2], [2, 2.1], [3, 4]]) // => statistic 0.95238, suspect 2
 */
export function cochranTest(groups: Groups, options: { readonly working?: boolean } = {}): CochranResult {
  checkGroups('cochranTest', groups, { groups: 2, each: 1 }, 'group');
  const data = groupedData(groups);
  const variances = data.groups.map(({ count, squares }) => (count > 1 ? squares / (count - 1) : 0));
  const counted = data.groups.filter(({ count }) => count > 1);
  if (counted.length < 2) {
    throw new StatsError(
      'too-few-values',
      `cochranTest requires at least 2 groups with replicates, found ${counted.length}`,
    );
  }
  const sum = variances.reduce((total, variance) => total + variance, 0);
  const largest = variances.reduce((most, variance) => Math.max(most, variance), 0);
  if (sum === 0) throw new StatsError('no-spread', 'cochranTest requires replicates that differ, found none');
  const replicates = mostFrequent(counted.map(({ count }) => count));
  const statistic = largest / sum;
  const p = counted.length;
  const critical = criticalPair((alpha) => cochranCritical({ groups: p, replicates, alpha }));
  const suspect = variances.indexOf(largest);
  return {
    statistic,
    critical,
    verdict: verdictAbove(statistic, critical),
    suspect,
    pValue: Math.min(1, p * tailOf(statistic, p, replicates)),
    groups: p,
    replicates,
    working: options.working
      ? [
          {
            name: "Cochran's statistic C",
            formula: 'C = max(s)^2 / sum(s^2)',
            clause: OUTLIER_CLAUSES.cochran,
            inputs: { s: groups.filter((group) => group.length > 1).map((group) => sd(group)) },
            value: statistic,
          },
        ]
      : null,
  };
}

function tailOf(statistic: number, p: number, n: number): number {
  if (statistic >= 1) return 0;
  return fSurvival(((p - 1) * statistic) / (1 - statistic), n - 1, (p - 1) * (n - 1));
}
