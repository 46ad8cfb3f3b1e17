import { fSurvival } from '../distributions';
import { checkPositive, representable } from '../internal/check-values';
import {
  checkGroups,
  commonCount,
  grandMean,
  groupedData,
  sdOfMeans,
  sumOver,
  type Groups,
} from '../internal/grouped-data';
import { midranks } from '../internal/ranks';
import { simpleTrend, type SimpleTrend } from '../internal/simple-trend';
import { mean } from '../location-scale/mean';
import { cochranTest, type CochranResult } from '../outliers/cochran';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { homogeneityFactors } from './homogeneity-factors';
import { homogeneityRemedies, type HomogeneityRemedy } from './homogeneity-remedies';
import { homogeneityWorking } from './homogeneity-working';

export interface HomogeneityInput {
  /** Replicates of each item. */
  readonly items: Groups;
  readonly sigmaPt: number;
  /** Place of each item in the filling order; any increasing numbers. Default: as listed. */
  readonly fillingOrder?: readonly number[];
  /** Place of each single result in the order of measurement, in the shape of `items`. */
  readonly measurementOrder?: Groups;
}

export interface HomogeneityResult {
  readonly items: number;
  readonly replicates: number;
  readonly mean: number;
  readonly itemMeans: readonly number[];
  /** s_x, sd of the item means. */
  readonly meansSd: number;
  /** s_w, within-item sd. */
  readonly withinSd: number;
  /** s_s, between-item sd; 0 when its variance comes out negative. */
  readonly betweenSd: number;
  readonly betweenSetToZero: boolean;
  /** Null when no item has any spread. */
  readonly cochran: CochranResult | null;
  /** Item means along the filling order; null below 3 items. */
  readonly fillingTrend: SimpleTrend | null;
  /** Results along the order of measurement; null when that was not given. */
  readonly measurementTrend: SimpleTrend | null;
  /** True when all replicates of every item were measured one after the other: not a random order. Null if not given. */
  readonly replicatesTogether: boolean | null;
  /** F test of the between-item variance; null without spread within items. */
  readonly pValue: number | null;
  /** s_s <= 0.3 sigma_pt. */
  readonly criterion: { readonly limit: number; readonly met: boolean };
  /** s_s^2 <= F1 (0.3 sigma_pt)^2 + F2 s_w^2; sufficient on its own, since s_s is an estimate. */
  readonly expanded: {
    readonly f1: number;
    readonly f2: number;
    readonly limit: number;
    readonly met: boolean;
  };
  /** s_w < 0.5 sigma_pt: below, the measurement can see what it is to judge. */
  readonly method: { readonly ratio: number; readonly limit: number; readonly goodEnough: boolean };
  readonly verdict: 'homogeneous' | 'homogeneous-by-expanded' | 'not-homogeneous';
  /** What may be done, when the criterion fails. */
  readonly remedies: readonly HomogeneityRemedy[];
  readonly working: readonly WorkingStep[] | null;
}

/** Share of sigma_pt that the spread between items may have. */
export const ITEM_SHARE = 0.3;
/** Share of sigma_pt below which the repeatability of the check should lie. */
export const METHOD_SHARE = 0.5;
/** Bears the last digits of binary rounding, so that 0.03 against 0.3 times 0.1 is at the limit and passes. */
const SLACK = 1 + 16 * Number.EPSILON;

/**
 * Homogeneity of the items of a round, by ISO 13528 Annex B and IUPAC 2006.
 *
 * g items drawn at random, m replicates each, all measured in random order under repeatability. An item flagged by
 * Cochran's test is looked into; it is left out by a person or not at all, and then the check is made anew.
 *
 * @param input.items - replicates of each item. Shape: g lists of m. Unit: unit of the data. Domain: finite; at least
 *   2 items (10 are usual, 7 the least advised) and 2 replicates.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.fillingOrder - place of each item in the filling order. Shape: g numbers. Default: as listed.
 * @param input.measurementOrder - place of each result in the order of measurement. Shape: as items. Default: none.
 * @param options.working - keep the steps. Default false.
 * @returns see HomogeneityResult; means and sds in the unit of the data, expanded.limit in its square
 * @throws StatsError too-few-values; unequal-lengths when items differ in replicates or an order in its shape;
 *   not-finite; no-spread for sigma_pt 0 or an order that does not advance; out-of-domain
 *
 * Ties and equal values: allowed. Zero spread: s_w = s_s = 0, homogeneous. Order of input: only as filling order.
 * Numerics: s_s^2 = s_x^2 - s_w^2 / m; sums as oneWayAnova. O(N log N).
 * Source: ISO 13528:2022, Annex B; Thompson, Ellison, Wood 2006, Pure Appl. Chem. 78, 145, Appendix 1.
 * Checked by: tests/stats/items/items.test.ts, tests/reference/interlaboratory (copper in soya, StRD).
 * @example homogeneity({ items: [[10.1, 10.2], [9.8, 9.9], [10.0, 10.1]], sigmaPt: 1 })
 *   // => withinSd 0.070711, betweenSd 0.14434, verdict 'homogeneous'
 */
export function homogeneity(
  input: HomogeneityInput,
  options: { readonly working?: boolean } = {},
): HomogeneityResult {
  const { items, sigmaPt } = input;
  checkGroups('homogeneity', items, { groups: 2, each: 2 }, 'item');
  const replicates = commonCount('homogeneity', items, 'item');
  checkPositive('homogeneity', 'sigma_pt', sigmaPt);
  const data = groupedData(items);
  const g = items.length;
  const within = sumOver(data.groups, (group) => group.squares) / (g * (replicates - 1));
  const betweenMeans = sdOfMeans(data) ** 2;
  const between = betweenMeans - within / replicates;
  const length = (value: number) => representable('homogeneity', Math.sqrt(Math.max(0, value)) / data.factor);
  const [meansSd, withinSd, betweenSd] = [betweenMeans, within, between].map(length) as [
    number,
    number,
    number,
  ];
  const itemMeans = items.map((item) => mean(item));
  const criterion = { limit: ITEM_SHARE * sigmaPt, met: betweenSd <= ITEM_SHARE * sigmaPt * SLACK };
  const expanded = expandedCriterion({ items: g, replicates, sigmaPt, withinSd, betweenSd });
  const ratio = representable('homogeneity', withinSd / sigmaPt);
  const verdict = criterion.met
    ? 'homogeneous'
    : expanded.met
      ? 'homogeneous-by-expanded'
      : 'not-homogeneous';
  const facts = {
    items: g,
    replicates,
    mean: representable('homogeneity', data.centre + grandMean(data) / data.factor),
    itemMeans,
    meansSd,
    withinSd,
    betweenSd,
    betweenSetToZero: between < 0,
    cochran: withinSd > 0 ? cochranTest(items) : null,
    fillingTrend: fillingTrend(itemMeans, input.fillingOrder),
    ...measurementFacts(input),
    pValue: within > 0 ? fSurvival((replicates * betweenMeans) / within, g - 1, g * (replicates - 1)) : null,
    criterion,
    expanded,
    method: { ratio, limit: METHOD_SHARE, goodEnough: ratio < METHOD_SHARE },
    verdict,
    remedies: verdict === 'not-homogeneous' ? homogeneityRemedies({ betweenSd, sigmaPt }) : [],
  } as const;
  return { ...facts, working: options.working ? homogeneityWorking(input, facts) : null };
}

interface ExpandedInput {
  readonly items: number;
  readonly replicates: number;
  readonly sigmaPt: number;
  readonly withinSd: number;
  readonly betweenSd: number;
}

function expandedCriterion({ items, replicates, sigmaPt, withinSd, betweenSd }: ExpandedInput) {
  const { f1, f2 } = homogeneityFactors({ items, replicates });
  // Compared in units of sigma_pt, where no square overflows.
  const allowed = f1 * ITEM_SHARE ** 2 + f2 * (withinSd / sigmaPt) ** 2;
  const limit = representable('homogeneity', allowed * sigmaPt * sigmaPt);
  return { f1, f2, limit, met: (betweenSd / sigmaPt) ** 2 <= allowed * SLACK };
}

function fillingTrend(
  itemMeans: readonly number[],
  order: readonly number[] | undefined,
): SimpleTrend | null {
  const places = order ?? itemMeans.map((_, i) => i + 1);
  checkOrder('filling', places, itemMeans.length);
  return itemMeans.length < 3 ? null : simpleTrend('homogeneity', places, itemMeans);
}

function measurementFacts({ items, measurementOrder: order }: HomogeneityInput) {
  if (order === undefined) return { measurementTrend: null, replicatesTogether: null };
  const shaped = order.length === items.length && order.every((runs, i) => runs.length === items[i]?.length);
  if (!shaped) {
    throw new StatsError(
      'unequal-lengths',
      'homogeneity requires an order of measurement with one place for each result of each item',
    );
  }
  const places = order.flat();
  checkOrder('measurement', places, places.length);
  // All replicates of an item lie together when their ranks span no more than their number.
  const { ranks } = midranks(places);
  let start = 0;
  const replicatesTogether = order.every((runs) => {
    const own = ranks.subarray(start, (start += runs.length));
    return Math.max(...own) - Math.min(...own) < runs.length;
  });
  return { measurementTrend: simpleTrend('homogeneity', places, items.flat()), replicatesTogether };
}

function checkOrder(name: string, places: readonly number[], count: number): void {
  if (places.length !== count) {
    throw new StatsError(
      'unequal-lengths',
      `homogeneity requires a ${name} order of ${count} places, found ${places.length}`,
    );
  }
  const wrong = places.find((place) => !Number.isFinite(place));
  if (wrong !== undefined) {
    throw new StatsError(
      'not-finite',
      `homogeneity requires a ${name} order of finite numbers, found ${wrong}`,
    );
  }
  if (places.every((place) => place === places[0])) {
    throw new StatsError(
      'no-spread',
      `homogeneity requires a ${name} order that advances, found equal places`,
    );
  }
}
