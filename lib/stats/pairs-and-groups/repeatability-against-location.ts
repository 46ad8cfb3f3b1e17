import { chiSquareSurvival, chiSquareUpperQuantile } from '../distributions';
import { representable } from '../internal/check-values';
import { checkGroups, commonCount, type Groups } from '../internal/grouped-data';
import { algorithmA } from '../location-scale/algorithm-a';
import { algorithmS } from '../location-scale/algorithm-s';
import { mean } from '../location-scale/mean';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { PAIR_CLAUSES } from './clauses';

const CALLER = 'repeatabilityAgainstLocation';

export interface RepeatabilityPoint {
  readonly mean: number;
  readonly sd: number;
  /** Squared distance from the centre, near chi-square with 2 degrees of freedom; null for an sd of 0. */
  readonly statistic: number | null;
  readonly pValue: number | null;
  readonly outside95: boolean;
  readonly outside99: boolean;
}

export interface RepeatabilityContour {
  readonly level: 0.95 | 0.99;
  /** Closed: the last point is the first again. */
  readonly points: readonly { readonly mean: number; readonly sd: number }[];
}

export interface RepeatabilityAgainstLocationResult {
  readonly replicates: number;
  /** Robust mean of the laboratory means, x*. */
  readonly location: number;
  /** Robust pooled within-laboratory sd, w*. */
  readonly withinSd: number;
  /** The sd of a laboratory mean that the plot measures by. */
  readonly meansSd: number;
  readonly laboratories: readonly RepeatabilityPoint[];
  readonly contours: readonly [RepeatabilityContour, RepeatabilityContour];
  /** One step a laboratory with an sd above 0, from its figures and the common ones to its statistic. */
  readonly working: readonly WorkingStep[] | null;
}

export interface RepeatabilityAgainstLocationOptions {
  readonly meansSd?: 'within' | 'between';
  readonly contourPoints?: number;
  readonly working?: boolean;
}

/**
 * Repeatability against location: the sd of each laboratory's replicates against its mean, with critical regions.
 *
 * A laboratory far to the side is biased, one far up does not repeat. By default the region is that of no difference
 * between laboratories (means scatter by w* / sqrt(n)); with 'between' the means are measured by their own spread, and
 * only laboratories that differ from the usual difference fall out.
 *
 * @param groups - replicates of each laboratory. Shape: p lists of n. Unit: unit of the data. Domain: finite; at least 3
 *   laboratories with the same number of 2 or more results.
 * @param options.meansSd - 'within' (default, as the standard) or 'between' (algorithm A of the means).
 * @param options.contourPoints - points of a contour. Domain: whole; 8 to 1000. Default 72.
 * @param options.working - keep the steps. Default false.
 * @returns location, withinSd, laboratories with statistics, contours at 95 and 99 percent
 * @throws StatsError too-few-values; unequal-lengths; not-finite; no-spread when the robust within-laboratory sd, or that
 *   of the means for 'between', is 0; out-of-domain
 *
 * Ties and equal values: allowed. An sd of 0 has no logarithm: statistic null, and outside only by its mean. Order of
 *   input: kept. Numerics: O(N log N).
 * Source: ISO 13528:2022, 10.6: ((x - x*) / s_x)^2 + 2 (n - 1) ln(s / w*)^2 against chi-square with 2 degrees of
 *   freedom; van Nuland 1992, Quality Engineering 4, 583.
 * Checked by: tests/stats/pairs-and-groups/pairs-and-groups.test.ts.
 * @example repeatabilityAgainstLocation([[1, 1.2], [1.1, 1.2], [1, 1.1], [5, 5.1]]).laboratories[3].outside99 // => true
 */
export function repeatabilityAgainstLocation(
  groups: Groups,
  options: RepeatabilityAgainstLocationOptions = {},
): RepeatabilityAgainstLocationResult {
  checkGroups(CALLER, groups, { groups: 3, each: 2 }, 'laboratory');
  const replicates = commonCount(CALLER, groups, 'laboratory');
  const count = options.contourPoints ?? 72;
  if (!(Number.isInteger(count) && count >= 8 && count <= 1000)) {
    throw new StatsError('out-of-domain', `${CALLER} requires 8 to 1000 points of a contour, found ${count}`);
  }
  const means = groups.map((group) => mean(group));
  const sds = groups.map((group) => sd(group));
  const { location, scale } = algorithmA(means);
  const { pooled: withinSd } = algorithmS(sds, { degreesOfFreedom: replicates - 1 });
  const meansSd = options.meansSd === 'between' ? scale : withinSd / Math.sqrt(replicates);
  if (withinSd === 0 || meansSd === 0) {
    throw new StatsError(
      'no-spread',
      `${CALLER} requires laboratories with some spread, found a robust sd of 0`,
    );
  }
  const centre = { location, withinSd, meansSd, replicates };
  const laboratories = means.map((x, i) => placeOf(x, sds[i] as number, centre));
  return {
    ...centre,
    laboratories,
    contours: [contour(0.95, centre, count), contour(0.99, centre, count)],
    working: options.working ? workingOf(laboratories, centre) : null,
  };
}

interface Centre {
  readonly location: number;
  readonly withinSd: number;
  readonly meansSd: number;
  readonly replicates: number;
}

function placeOf(
  x: number,
  s: number,
  { location, withinSd, meansSd, replicates }: Centre,
): RepeatabilityPoint {
  const aside = representable(CALLER, ((x - location) / meansSd) ** 2);
  const up = s > 0 ? 2 * (replicates - 1) * logRatio(s, withinSd) ** 2 : 0;
  const pValue = chiSquareSurvival(aside + up, 2);
  return {
    mean: x,
    sd: s,
    statistic: s > 0 ? aside + up : null,
    pValue: s > 0 ? pValue : null,
    outside95: pValue < 0.05,
    outside99: pValue < 0.01,
  };
}

/** ln(a / b) of positive numbers whose ratio may leave the number range. */
function logRatio(a: number, b: number): number {
  const ratio = a / b;
  return ratio > 0 && Number.isFinite(ratio) ? Math.log(ratio) : Math.log(a) - Math.log(b);
}

function contour(
  level: 0.95 | 0.99,
  { location, withinSd, meansSd, replicates }: Centre,
  count: number,
): RepeatabilityContour {
  const radius = Math.sqrt(chiSquareUpperQuantile(1 - level, 2));
  const points = Array.from({ length: count + 1 }, (_, i) => {
    const angle = (2 * Math.PI * (i % count)) / count;
    return {
      mean: representable(CALLER, location + meansSd * radius * Math.cos(angle)),
      sd: representable(
        CALLER,
        withinSd * Math.exp((radius * Math.sin(angle)) / Math.sqrt(2 * (replicates - 1))),
      ),
    };
  });
  return { level, points };
}

/** ln(s / w*) is printed as an input, since the formulas have no logarithm. */
function workingOf(laboratories: readonly RepeatabilityPoint[], centre: Centre): readonly WorkingStep[] {
  return laboratories.flatMap(({ mean: x, sd: s, statistic }, i): WorkingStep[] => {
    if (statistic === null) return [];
    const inputs = {
      mean: x,
      x_star: centre.location,
      s_mean: centre.meansSd,
      n: centre.replicates,
      s,
      w_star: centre.withinSd,
      ln_s_over_w: logRatio(s, centre.withinSd),
    };
    const formula = 'distance2 = ((mean - x_star) / s_mean)^2 + 2 * (n - 1) * ln_s_over_w^2';
    const name = `Squared distance of laboratory ${i + 1}`;
    return [{ name, formula, clause: PAIR_CLAUSES.repeatability, inputs, value: statistic }];
  });
}
