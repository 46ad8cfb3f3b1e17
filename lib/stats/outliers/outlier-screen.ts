import { checkGroups, type Groups } from '../internal/grouped-data';
import { mean } from '../location-scale/mean';
import { StatsError } from '../stats-error';
import { cochranTest, type CochranResult } from './cochran';
import { grubbsOne, type OutlierTestResult } from './grubbs-one';
import { grubbsTwoSame } from './grubbs-two-same';
import { mandelStatistics, type MandelResult } from './mandel';
import type { OutlierVerdict } from './verdict';

export interface LaboratoryFlag {
  /** Position of the laboratory in the input, from 0. */
  readonly laboratory: number;
  readonly test: 'cochran' | 'grubbs-one' | 'grubbs-two';
  readonly verdict: Exclude<OutlierVerdict, 'none'>;
}

export interface OutlierScreenResult {
  /** Each null where it cannot be made; `reasons` says why. */
  readonly mandel: MandelResult | null;
  readonly cochran: CochranResult | null;
  readonly grubbsOne: OutlierTestResult | null;
  /** Made only where the single test finds nothing, as the standard has it. */
  readonly grubbsTwo: OutlierTestResult | null;
  readonly flags: readonly LaboratoryFlag[];
  readonly reasons: readonly string[];
}

/**
 * Outlier screen of ISO 5725-2 for one level: Mandel's h and k, Cochran on the spreads, Grubbs on the means.
 *
 * It flags stragglers and outliers and excludes nobody. After a person has left out a laboratory, call it again.
 *
 * @param groups - the results of each laboratory. Shape: p lists. Unit: unit of the data. Domain: finite; at least 3
 *   laboratories, at least 1 result each.
 * @returns the results of the tests, flags and reasons
 * @throws StatsError too-few-values; not-finite
 *
 * Ties and equal values: allowed; a test without spread is left out with its reason. Order of input: kept.
 * Numerics: O(N log N) and tens of milliseconds for the pair test.
 * Source: ISO 5725-2:2019, 7.3.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts.
 * @example outlierScreen([[1, 1.1], [1.2, 1.1], [1, 1.2], [9, 9.1]]).flags
 *   // => [{ laboratory: 3, test: 'grubbs-one', verdict: 'outlier' }]
 */
export function outlierScreen(groups: Groups): OutlierScreenResult {
  checkGroups('outlierScreen', groups, { groups: 3, each: 1 }, 'laboratory');
  const reasons: string[] = [];
  const keep = <T>(compute: () => T): T | null => {
    try {
      return compute();
    } catch (error) {
      if (!(error instanceof StatsError)) throw error;
      reasons.push(error.message);
      return null;
    }
  };
  const means = groups.map((group) => mean(group));
  const single = keep(() => grubbsOne(means));
  const found = {
    mandel: keep(() => mandelStatistics(groups)),
    cochran: keep(() => cochranTest(groups)),
    grubbsOne: single,
    grubbsTwo: single?.verdict === 'none' && means.length > 3 ? keep(() => grubbsTwoSame(means)) : null,
  };
  return { ...found, flags: flagsOf(found), reasons };
}

function flagsOf(found: Pick<OutlierScreenResult, 'cochran' | 'grubbsOne' | 'grubbsTwo'>): LaboratoryFlag[] {
  const flags: LaboratoryFlag[] = [];
  const add = (test: LaboratoryFlag['test'], verdict: OutlierVerdict, laboratories: readonly number[]) => {
    if (verdict === 'none') return;
    for (const laboratory of laboratories) flags.push({ laboratory, test, verdict });
  };
  if (found.cochran) add('cochran', found.cochran.verdict, [found.cochran.suspect]);
  if (found.grubbsOne) add('grubbs-one', found.grubbsOne.verdict, found.grubbsOne.suspects);
  if (found.grubbsTwo) add('grubbs-two', found.grubbsTwo.verdict, found.grubbsTwo.suspects);
  return flags;
}
