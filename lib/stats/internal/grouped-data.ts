import { StatsError } from '../stats-error';
import { checkValues } from './check-values';
import { subtract, toDecimal, type Decimal } from './decimal';
import { sortedCopy } from './sorted';
import { compensatedSum, safeFactor, scaledMean } from './sums';

/** Results by laboratory, item or method: one list each. */
export type Groups = readonly (readonly number[])[];

/** One group, in the common unit and from the common centre. */
export interface GroupMoments {
  readonly count: number;
  readonly mean: number;
  /** Sum of squared deviations from the mean of the group. */
  readonly squares: number;
}

/**
 * Groups brought to a common centre (a value of the data) and unit (a power of two), in which sums of squares
 * neither overflow nor lose digits. A length L of these is L / factor in the data, a place P is centre + P / factor.
 */
export interface GroupedData {
  readonly groups: readonly GroupMoments[];
  readonly centre: number;
  readonly factor: number;
  readonly count: number;
}

interface Minimum {
  readonly groups: number;
  /** Results that every group must have. */
  readonly each: number;
}

/** Throws unless there are enough groups with enough finite results each. `what` names a group for the message. */
export function checkGroups(caller: string, groups: Groups, minimum: Minimum, what: string): void {
  if (groups.length < minimum.groups) {
    const found = `found ${groups.length}`;
    throw new StatsError(
      'too-few-values',
      `${caller} requires at least ${minimum.groups} ${what}s, ${found}`,
    );
  }
  groups.forEach((group, i) => checkValues(`${caller}, ${what} ${i + 1},`, group, minimum.each));
}

/** The common number of results of all groups; throws `unequal-lengths` when they differ. */
export function commonCount(caller: string, groups: Groups, what: string): number {
  const count = groups[0]?.length ?? 0;
  const other = groups.findIndex((group) => group.length !== count);
  if (other >= 0) {
    throw new StatsError(
      'unequal-lengths',
      `${caller} requires the same number of results for every ${what}, found ${count} for ${what} 1 and ` +
        `${groups[other]?.length} for ${what} ${other + 1}`,
    );
  }
  return count;
}

/** Moments of checked groups. */
export function groupedData(groups: Groups): GroupedData {
  const all = groups.flat();
  const sorted = sortedCopy(all);
  const shrink = safeFactor(all);
  const centre = sorted[sorted.length >> 1] as number;
  const [low, high] = [sorted[0] as number, sorted[sorted.length - 1] as number];
  const reach = Math.max(high * shrink - centre * shrink, centre * shrink - low * shrink);
  const factor = shrink * unitFactor(reach);
  const offset = offsetFrom(centre, { tight: isTight(low, high), shrink });
  const rest = factor / shrink;
  const moments = groups.map((group) => {
    const offsets = Float64Array.from(group, (value) => offset(value) * rest);
    return { count: group.length, ...momentsOf(offsets) };
  });
  return { groups: moments, centre, factor, count: all.length };
}

/** A power of two that brings the largest deviation near 1; at most 2^1000, so that it is a number itself. */
function unitFactor(reach: number): number {
  return reach === 0 ? 1 : 2 ** Math.min(1000, -Math.floor(Math.log2(reach)));
}

/** Values that share their first five digits; binary rounding would then take digits from the differences. */
function isTight(low: number, high: number): boolean {
  const size = Math.max(Math.abs(low), Math.abs(high));
  return size < 1e30 && high - low < 1e-5 * size;
}

/** x - centre; of tight values as the difference of the decimal figures, which is exact. */
function offsetFrom(centre: number, { tight, shrink }: { tight: boolean; shrink: number }) {
  if (!tight) return (value: number) => value * shrink - centre * shrink;
  const origin = toDecimal(centre);
  return (value: number) => toNumber(subtract(toDecimal(value), origin));
}

function toNumber({ digits, exponent }: Decimal): number {
  return Number(`${digits}e${exponent}`);
}

function momentsOf(values: Float64Array): { mean: number; squares: number } {
  const mean = scaledMean(values, 1);
  const deviation = (i: number) => (values[i] as number) - mean;
  const rest = compensatedSum(values.length, deviation);
  const squares = compensatedSum(values.length, (i) => deviation(i) ** 2) - (rest * rest) / values.length;
  return { mean, squares: Math.max(0, squares) };
}

/** Sum over the groups of a figure made of each. */
export function sumOver(groups: readonly GroupMoments[], term: (group: GroupMoments) => number): number {
  return compensatedSum(groups.length, (i) => term(groups[i] as GroupMoments));
}

/** Mean of all results, from the centre and in the unit of the grouped data. */
export function grandMean({ groups, count }: GroupedData): number {
  return sumOver(groups, (group) => group.count * group.mean) / count;
}

/** Sum of squares of the group means about the grand mean, each weighted by its count. */
export function squaresBetween(data: GroupedData): number {
  const grand = grandMean(data);
  return sumOver(data.groups, (group) => group.count * (group.mean - grand) ** 2);
}

/** Standard deviation of the group means, unweighted, divisor p - 1. */
export function sdOfMeans({ groups }: GroupedData): number {
  const p = groups.length;
  const centre = sumOver(groups, (group) => group.mean) / p;
  return Math.sqrt(sumOver(groups, (group) => (group.mean - centre) ** 2) / (p - 1));
}
