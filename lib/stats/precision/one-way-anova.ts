import { fSurvival } from '../distributions';
import { representable } from '../internal/check-values';
import { checkGroups, groupedData, squaresBetween, sumOver, type Groups } from '../internal/grouped-data';
import { StatsError } from '../stats-error';

export interface OneWayAnovaResult {
  readonly betweenSquares: number;
  readonly withinSquares: number;
  readonly betweenDegrees: number;
  readonly withinDegrees: number;
  readonly betweenMeanSquare: number;
  readonly withinMeanSquare: number;
  /** Null when there is no spread within the groups. */
  readonly fRatio: number | null;
  readonly pValue: number | null;
  /** Share of the sum of squares that lies between the groups; null when all results are equal. */
  readonly rSquared: number | null;
  /** Root of the mean square within, unit of the data. */
  readonly residualSd: number;
  /** Square root of (MS between - MS within) / n0, 0 when that is negative; n0 as for unequal groups. */
  readonly betweenSd: number;
}

/**
 * One-way analysis of variance: the spread between groups against the spread within.
 *
 * Groups are laboratories, items or methods. Groups may differ in size; groups of one result tell of the spread
 * between only.
 *
 * @param groups - the results, one list a group. Shape: p groups. Unit: unit of the data. Domain: finite; at least 2
 *   groups, at least 1 result each, and one group with 2 or more.
 * @returns sums of squares (unit squared), degrees of freedom, mean squares, fRatio, pValue, rSquared, residualSd
 *   and betweenSd (unit of the data)
 * @throws StatsError too-few-values; not-finite; out-of-domain when a square is too large to represent
 *
 * Ties and equal values: allowed. Zero spread within: fRatio and pValue null. Order of input: does not matter.
 * Numerics: sums about a central value in units near 1, compensated; where the results share their first five digits
 *   the differences are taken of the decimal figures, which is exact. O(N log N).
 * Source: NIST/SEMATECH e-Handbook 7.4.3; n0 as ISO 5725-2:2019, 7.4. NIST StRD sets reproduced.
 * Checked by: tests/stats/precision/precision.test.ts, tests/reference/interlaboratory (strd_*, atmwtag).
 * @example oneWayAnova([[1, 2], [3, 4], [8, 9]]) // => fRatio 52, residualSd 0.70711, betweenSd 3.57071
 */
export function oneWayAnova(groups: Groups): OneWayAnovaResult {
  checkGroups('oneWayAnova', groups, { groups: 2, each: 1 }, 'group');
  const data = groupedData(groups);
  const withinDegrees = data.count - groups.length;
  if (withinDegrees === 0) {
    throw new StatsError(
      'too-few-values',
      'oneWayAnova requires one group with at least 2 results, found none',
    );
  }
  const betweenDegrees = groups.length - 1;
  const [between, within] = [squaresBetween(data), sumOver(data.groups, (group) => group.squares)];
  const [msBetween, msWithin] = [between / betweenDegrees, within / withinDegrees];
  const n0 = (data.count - sumOver(data.groups, (group) => group.count ** 2) / data.count) / betweenDegrees;
  const square = (value: number) => representable('oneWayAnova', value / data.factor / data.factor);
  const fRatio = msWithin > 0 ? msBetween / msWithin : null;
  return {
    betweenSquares: square(between),
    withinSquares: square(within),
    betweenDegrees,
    withinDegrees,
    betweenMeanSquare: square(msBetween),
    withinMeanSquare: square(msWithin),
    fRatio: fRatio === null ? null : representable('oneWayAnova', fRatio),
    pValue: fRatio === null ? null : fSurvival(fRatio, betweenDegrees, withinDegrees),
    rSquared: between + within > 0 ? between / (between + within) : null,
    residualSd: representable('oneWayAnova', Math.sqrt(msWithin) / data.factor),
    betweenSd: Math.sqrt(Math.max(0, msBetween - msWithin) / n0) / data.factor,
  };
}
