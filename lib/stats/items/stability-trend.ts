import { checkPositive, checkValues, representable } from '../internal/check-values';
import { sortedCopy } from '../internal/sorted';
import { simpleTrend, type SimpleTrend } from '../internal/simple-trend';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ITEM_CLAUSES } from './clauses';
import { ITEM_SHARE } from './homogeneity';

export interface StabilityTrendInput {
  /** Time of each result; any unit, counted from the start. */
  readonly times: readonly number[];
  readonly values: readonly number[];
  readonly sigmaPt: number;
  /** Time over which the items must hold, in the unit of `times`. Default: from the first to the last. */
  readonly period?: number;
}

export interface StabilityTrendResult {
  readonly trend: SimpleTrend;
  /** The slope differs from zero at 5 percent. */
  readonly significant: boolean;
  readonly period: number;
  /** Change over the period by the line, with its 95 percent interval, unit of the data. */
  readonly change: number;
  readonly changeLower: number;
  readonly changeUpper: number;
  readonly limit: number;
  /** The change itself within 0.3 sigma_pt. */
  readonly withinLimit: boolean;
  /** The whole interval within 0.3 sigma_pt: shown stable, not merely not shown unstable. */
  readonly shownStable: boolean;
  readonly verdict: 'shown-stable' | 'no-trend-seen' | 'trend-negligible' | 'undecided' | 'not-stable';
  /** Standard uncertainty of stability for u(x_pt): standard error of the slope times the period. */
  readonly standardUncertainty: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Stability over several time points: the slope against time, tested against zero and held against 0.3 sigma_pt.
 *
 * Results should differ in nothing but their age (best measured together after storage). Several results at one time
 * count singly; if they share an error of that day, give their mean instead.
 *
 * @param input.times - time of each result. Shape: n values. Unit: of time. Domain: finite; at least 2 different.
 * @param input.values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.period - time to hold. Unit: of time. Domain: finite; > 0. Default: last minus first.
 * @param options.working - keep the steps. Default false.
 * @returns see StabilityTrendResult
 * @throws StatsError too-few-values below 3; unequal-lengths; not-finite; no-spread when all times are equal or
 *   sigma_pt is 0; out-of-domain
 *
 * Ties and equal values: allowed; results exactly on a line give no test, and any slope counts. Zero spread: slope 0,
 *   shown stable. Order of input: does not matter. Numerics: O(n log n).
 * Source: ISO Guide 35:2017, 8; ISO 13528:2022, Annex B.5.
 * Checked by: tests/stats/items/items.test.ts (R lm).
 * @example stabilityTrend({ times: [0, 1, 2, 3], values: [10, 9.9, 10.1, 10], sigmaPt: 1 })
 *   // => trend.slope 0.02, significant false
 */
export function stabilityTrend(
  input: StabilityTrendInput,
  options: { readonly working?: boolean } = {},
): StabilityTrendResult {
  const { times, values, sigmaPt } = input;
  checkValues('stabilityTrend', values, 3);
  if (times.length !== values.length) {
    const found = `found ${times.length} times and ${values.length} results`;
    throw new StatsError('unequal-lengths', `stabilityTrend requires one time for each result, ${found}`);
  }
  checkValues('stabilityTrend', times, 3);
  checkPositive('stabilityTrend', 'sigma_pt', sigmaPt);
  const ordered = sortedCopy(times);
  const [first, last] = [ordered[0] as number, ordered[ordered.length - 1] as number];
  if (first === last) {
    throw new StatsError('no-spread', `stabilityTrend requires times that differ, found ${first} throughout`);
  }
  const period = input.period ?? last - first;
  checkPositive('stabilityTrend', 'period', period);
  const trend = simpleTrend('stabilityTrend', times, values);
  const over = (slope: number) => representable('stabilityTrend', slope * period);
  const [change, changeLower, changeUpper] = [over(trend.slope), over(trend.lower), over(trend.upper)];
  const limit = ITEM_SHARE * sigmaPt;
  const significant = trend.pValue === null ? trend.slope !== 0 : trend.pValue < 0.05;
  const withinLimit = Math.abs(change) <= limit * (1 + 16 * Number.EPSILON);
  const shownStable = changeLower >= -limit && changeUpper <= limit;
  const facts = {
    trend,
    significant,
    period,
    change,
    changeLower,
    changeUpper,
    limit,
    withinLimit,
    shownStable,
    verdict: verdictOf({ significant, withinLimit, shownStable }),
    standardUncertainty: over(trend.standardError),
  };
  return { ...facts, working: options.working ? workingOf(input, facts) : null };
}

function verdictOf(found: {
  readonly significant: boolean;
  readonly withinLimit: boolean;
  readonly shownStable: boolean;
}): StabilityTrendResult['verdict'] {
  if (found.shownStable) return 'shown-stable';
  if (found.withinLimit) return found.significant ? 'trend-negligible' : 'no-trend-seen';
  return found.significant ? 'not-stable' : 'undecided';
}

function workingOf(
  { times, values, sigmaPt }: StabilityTrendInput,
  facts: Omit<StabilityTrendResult, 'working'>,
): readonly WorkingStep[] {
  const clause = ITEM_CLAUSES.stabilityTrend;
  const { trend, period } = facts;
  const n = values.length;
  return [
    {
      name: 'Slope',
      formula: 'slope = products(times, values) / squares(times)',
      clause,
      inputs: { times, values },
      value: trend.slope,
    },
    {
      name: 'Standard error of the slope',
      formula:
        trend.t === null
          ? 'se = 0 (all results lie on the line)'
          : 'se = sqrt((squares(values) - slope^2 * squares(times)) / (n - 2) / squares(times))',
      clause,
      inputs: { times, values, slope: trend.slope, n },
      value: trend.standardError,
    },
    {
      name: 'Change over the period',
      formula: 'change = slope * period',
      clause,
      inputs: { slope: trend.slope, period },
      value: facts.change,
    },
    {
      name: 'Limit',
      formula: 'limit = 0.3 * sigma_pt',
      clause: ITEM_CLAUSES.stability,
      inputs: { sigma_pt: sigmaPt },
      value: facts.limit,
    },
  ];
}
