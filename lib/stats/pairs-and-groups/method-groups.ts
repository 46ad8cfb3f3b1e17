import { studentTSurvival, studentTUpperQuantile } from '../distributions';
import { consensusUncertainty } from '../consensus/consensus-uncertainty';
import { checkFinite, representable } from '../internal/check-values';
import { kruskalWallis, type KruskalWallisResult } from '../internal/kruskal-wallis';
import { rankSum } from '../internal/rank-sum';
import { algorithmA } from '../location-scale/algorithm-a';
import { mean } from '../location-scale/mean';
import { median } from '../location-scale/median';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { holm } from './holm';
import { methodGroupsWorking } from './method-groups-working';

export interface GroupedResult {
  readonly group: string;
  readonly value: number;
}

export interface MethodGroup {
  readonly group: string;
  readonly count: number;
  readonly median: number;
  readonly mean: number;
  /** Null for a single result. */
  readonly sd: number | null;
  /** x* and s* of algorithm A; null for a single result. */
  readonly robustMean: number | null;
  readonly robustSd: number | null;
  /** 1.25 s* / sqrt(n). */
  readonly standardUncertainty: number | null;
  /** Fewer than 5 results: no consensus to lean on. */
  readonly tooFew: boolean;
}

export interface GroupDifference {
  readonly first: string;
  readonly second: string;
  /** Robust mean of the first minus that of the second, with its 95 percent interval. */
  readonly robustDifference: number;
  readonly robustLower: number;
  readonly robustUpper: number;
  readonly robustPValue: number | null;
  /** Difference of means by Welch, unequal spreads; p null when neither group has any spread. */
  readonly meanDifference: number;
  readonly degreesOfFreedom: number;
  readonly lower: number;
  readonly upper: number;
  readonly welchPValue: number | null;
  readonly rankPValue: number;
  readonly rankExact: boolean;
  /** Holm, over all comparisons of this call. */
  readonly welchAdjusted: number | null;
  readonly rankAdjusted: number;
}

export interface MethodGroupsResult {
  readonly groups: readonly MethodGroup[];
  /** Pairs of groups with at least 2 results each, in order of first appearance. */
  readonly differences: readonly GroupDifference[];
  readonly comparisons: number;
  /** Chance that at least one unadjusted p falls below 0.05 when no groups differ, were the tests independent. */
  readonly chanceOfOne: number;
  /** All groups together by ranks; null with a single group or when all results are equal. */
  readonly overall: KruskalWallisResult | null;
  readonly working: readonly WorkingStep[] | null;
}

const FEW = 5;

/**
 * Method groups: the consensus of each and how the groups differ.
 *
 * Two methods that measure different things give two populations and no common consensus. Look at size as well as at p:
 * a difference that matters against sigma_pt is one, whatever its p, if the interval is narrow.
 *
 * @param results - group and result of each participant. Shape: n entries. Unit: unit of the data. Domain: finite; at
 *   least 1.
 * @param options.working - keep the steps. Default false.
 * @returns groups in order of first appearance, pairwise differences, multiplicity, overall test
 * @throws StatsError too-few-values; not-finite; no-convergence; out-of-domain
 *
 * Ties and equal values: mean ranks. Groups of one are listed but not compared. Groups without robust scale: the robust
 *   interval has no width and its p is null. Order of input: does not matter but for the order of the groups.
 * Numerics: O(n log n + k^2 n); rank test exact without ties up to 49 in a group. Robust interval: t with Welch's degrees
 *   of freedom on 1.25 s* / sqrt(n) of both, an approximation.
 * Source: Welch 1947, Biometrika 34, 28; Mann and Whitney 1947; Kruskal and Wallis 1952; Holm 1979.
 * Checked by: tests/stats/pairs-and-groups/pairs-and-groups.test.ts (R t.test, wilcox.test, kruskal.test, p.adjust).
 * @example methodGroups([1, 2, 3, 5, 6, 7].map((value, i) => ({ value, group: i < 3 ? 'A' : 'B' }))).differences[0]
 *   // => meanDifference -4, welchPValue 0.0080
 */
export function methodGroups(
  results: readonly GroupedResult[],
  options: { readonly working?: boolean } = {},
): MethodGroupsResult {
  if (results.length === 0) {
    throw new StatsError('too-few-values', 'methodGroups requires at least 1 result, found 0');
  }
  const byGroup = new Map<string, number[]>();
  for (const { group, value } of results) {
    checkFinite('methodGroups', `result of group ${group}`, value);
    const own = byGroup.get(group);
    if (own) own.push(value);
    else byGroup.set(group, [value]);
  }
  const groups = [...byGroup].map(([group, values]) => summarise(group, values));
  const entries = [...byGroup].map(([, values], i) => ({ summary: groups[i] as MethodGroup, values }));
  const compared = entries.filter(({ values }) => values.length > 1);
  const pairs = compared.flatMap((first, i) => compared.slice(i + 1).map((second) => compare(first, second)));
  const differences = adjusted(pairs);
  const all = results.map(({ value }) => value);
  const some = byGroup.size > 1 && all.some((value) => value !== all[0]);
  return {
    groups,
    differences,
    comparisons: differences.length,
    chanceOfOne: 1 - 0.95 ** differences.length,
    overall: some ? kruskalWallis('methodGroups', [...byGroup.values()]) : null,
    working: options.working ? methodGroupsWorking(byGroup, groups, differences) : null,
  };
}

function summarise(group: string, values: readonly number[]): MethodGroup {
  const count = values.length;
  const shared = { group, count, median: median(values), mean: mean(values), tooFew: count < FEW };
  if (count < 2) return { ...shared, sd: null, robustMean: null, robustSd: null, standardUncertainty: null };
  const { location, scale } = algorithmA(values);
  return {
    ...shared,
    sd: sd(values),
    robustMean: location,
    robustSd: scale,
    standardUncertainty: consensusUncertainty({ robustSd: scale, count }),
  };
}

interface Entry {
  readonly summary: MethodGroup;
  readonly values: readonly number[];
}

type Unadjusted = Omit<GroupDifference, 'welchAdjusted' | 'rankAdjusted'>;

function compare({ summary: a, values: x }: Entry, { summary: b, values: y }: Entry): Unadjusted {
  const classical = interval(
    a.mean - b.mean,
    [(a.sd as number) / Math.sqrt(a.count), a.count],
    [(b.sd as number) / Math.sqrt(b.count), b.count],
  );
  const robust = interval(
    (a.robustMean as number) - (b.robustMean as number),
    [a.standardUncertainty as number, a.count],
    [b.standardUncertainty as number, b.count],
  );
  const ranks = rankSum(x, y);
  return {
    first: a.group,
    second: b.group,
    robustDifference: robust.difference,
    robustLower: robust.lower,
    robustUpper: robust.upper,
    robustPValue: robust.pValue,
    meanDifference: classical.difference,
    degreesOfFreedom: classical.degreesOfFreedom,
    lower: classical.lower,
    upper: classical.upper,
    welchPValue: classical.pValue,
    rankPValue: ranks.pValue,
    rankExact: ranks.exact,
  };
}

/** t interval of a difference whose two parts have these standard errors and counts (Welch and Satterthwaite). */
function interval(difference: number, [u, m]: readonly [number, number], [v, n]: readonly [number, number]) {
  const finite = (value: number) => representable('methodGroups', value);
  const error = Math.hypot(u, v);
  const [shareU, shareV] = error > 0 ? [(u / error) ** 2, (v / error) ** 2] : [0.5, 0.5];
  const degreesOfFreedom = 1 / (shareU ** 2 / (m - 1) + shareV ** 2 / (n - 1));
  const reach = studentTUpperQuantile(0.025, degreesOfFreedom) * error;
  return {
    difference: finite(difference),
    degreesOfFreedom,
    lower: finite(difference - reach),
    upper: finite(difference + reach),
    pValue:
      error > 0 ? Math.min(1, 2 * studentTSurvival(Math.abs(difference) / error, degreesOfFreedom)) : null,
  };
}

function adjusted(pairs: readonly Unadjusted[]): GroupDifference[] {
  const ranks = holm(pairs.map(({ rankPValue }) => rankPValue));
  const tested = pairs.flatMap(({ welchPValue }, i) => (welchPValue === null ? [] : [{ p: welchPValue, i }]));
  const welch = holm(tested.map(({ p }) => p));
  return pairs.map((pair, i) => {
    const at = tested.findIndex((entry) => entry.i === i);
    return {
      ...pair,
      welchAdjusted: at < 0 ? null : (welch[at] as number),
      rankAdjusted: ranks[i] as number,
    };
  });
}
