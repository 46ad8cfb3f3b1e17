import { checkGroups, groupedData, sumOver, type Groups } from '../internal/grouped-data';
import { mean } from '../location-scale/mean';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { OUTLIER_CLAUSES } from './clauses';
import { mandelCritical, type MandelCritical } from './mandel-critical';
import { mostFrequent } from './most-frequent';
import { verdictAbove, type OutlierVerdict } from './verdict';

export interface MandelLaboratory {
  /** Between-laboratory consistency: the mean's distance from the mean of means in standard deviations. */
  readonly h: number;
  /** Within-laboratory consistency: the sd over the root mean square of all; null for a single result. */
  readonly k: number | null;
  readonly hVerdict: OutlierVerdict;
  readonly kVerdict: OutlierVerdict;
}

export interface MandelResult {
  readonly laboratories: readonly MandelLaboratory[];
  /** Limits for laboratories with the most frequent number of replicates. */
  readonly fivePercent: MandelCritical;
  readonly onePercent: MandelCritical;
  readonly replicates: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Mandel's h and k: how consistent each laboratory is with the others, in its mean and in its repeatability.
 *
 * Best seen as bars, laboratory by laboratory over several levels: a laboratory that is always high, or always
 * spreads, shows as a pattern long before a single bar crosses a limit. About one in twenty crosses the 5 percent
 * limit by chance.
 *
 * @param groups - the results of each laboratory at one level. Shape: p lists. Unit: unit of the data. Domain: finite;
 *   at least 3 laboratories, at least 1 result each.
 * @param options.working - keep the steps. Default false.
 * @returns h and k of each laboratory in the order given, with verdicts and limits at 5 and 1 percent
 * @throws StatsError too-few-values; not-finite; no-spread when all laboratory means are equal
 *
 * Ties and equal values: allowed. No spread within any laboratory: k is null. Order of input: kept.
 * Numerics: means unweighted; O(N log N).
 * Source: ISO 5725-2:2019, 7.3.1; Mandel 1985, Journal of Research NBS; ASTM E691.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts, tests/reference/interlaboratory.
 * @example mandelStatistics([[1, 2], [3, 4], [8, 9]]) // => h of the third 1.10940, k 1 for all
 */
export function mandelStatistics(groups: Groups, options: { readonly working?: boolean } = {}): MandelResult {
  checkGroups('mandelStatistics', groups, { groups: 3, each: 1 }, 'laboratory');
  const data = groupedData(groups);
  const p = groups.length;
  const centre = sumOver(data.groups, (group) => group.mean) / p;
  const spread = Math.sqrt(sumOver(data.groups, (group) => (group.mean - centre) ** 2) / (p - 1));
  if (spread === 0) {
    throw new StatsError(
      'no-spread',
      'mandelStatistics requires laboratory means that differ, found equal ones',
    );
  }
  const replicated = data.groups.filter(({ count }) => count > 1);
  const within = sumOver(replicated, varianceOf) / Math.max(1, replicated.length);
  const replicates = mostFrequent(data.groups.map(({ count }) => count));
  const limits = (alpha: number) => mandelCritical({ laboratories: p, replicates, alpha });
  const [fivePercent, onePercent] = [limits(0.05), limits(0.01)];
  const verdict = (value: number | null, five: number | null, one: number | null) =>
    value === null || five === null || one === null
      ? 'none'
      : verdictAbove(Math.abs(value), { fivePercent: five, onePercent: one });
  const laboratories = data.groups.map((group) => {
    const h = (group.mean - centre) / spread;
    const k = group.count > 1 && within > 0 ? Math.sqrt(varianceOf(group) / within) : null;
    return {
      h,
      k,
      hVerdict: verdict(h, fivePercent.h, onePercent.h),
      kVerdict: verdict(k, fivePercent.k, onePercent.k),
    };
  });
  const working = options.working ? workingOf(groups, laboratories) : null;
  return { laboratories, fivePercent, onePercent, replicates, working };
}

function varianceOf({ count, squares }: { readonly count: number; readonly squares: number }): number {
  return squares / (count - 1);
}

/** One step for h and one for k of each laboratory. */
function workingOf(groups: Groups, laboratories: readonly MandelLaboratory[]): readonly WorkingStep[] {
  const means = groups.map((group) => mean(group));
  const sds = groups.filter((group) => group.length > 1).map((group) => sd(group));
  return laboratories.flatMap(({ h, k }, i) => {
    const own = groups[i] ?? [];
    const hStep: WorkingStep = {
      name: `h of laboratory ${i + 1}`,
      formula: 'h = (own_mean - sum(means) / p) / sqrt(squares(means) / (p - 1))',
      clause: OUTLIER_CLAUSES.mandel,
      inputs: { own_mean: means[i] ?? null, means, p: means.length },
      value: h,
    };
    if (k === null) return [hStep];
    const kStep: WorkingStep = {
      name: `k of laboratory ${i + 1}`,
      formula: 'k = own_sd / sqrt(sum(sds^2) / p)',
      clause: OUTLIER_CLAUSES.mandel,
      inputs: { own_sd: sd(own), sds, p: sds.length },
      value: k,
    };
    return [hStep, kStep];
  });
}
