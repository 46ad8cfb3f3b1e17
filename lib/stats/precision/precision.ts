import { representable } from '../internal/check-values';
import {
  checkGroups,
  grandMean,
  groupedData,
  sdOfMeans,
  squaresBetween,
  sumOver,
  type Groups,
} from '../internal/grouped-data';
import { horRat } from '../sigma-pt/hor-rat';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { precisionWorking } from './precision-working';

export interface PrecisionOptions {
  /** Factor of the limits r and R. */
  readonly limitFactor?: number;
  /** Mass fraction (g/g) of one unit, for HorRat. */
  readonly massFractionPerUnit?: number;
  readonly working?: boolean;
}

export interface PrecisionResult {
  readonly laboratories: number;
  readonly results: number;
  /** Mean number of results a laboratory, as ISO 5725-2 weighs unequal numbers. */
  readonly meanReplicates: number;
  /** Mean of all results, m. */
  readonly mean: number;
  /** Repeatability standard deviation s_r. */
  readonly repeatabilitySd: number;
  /** Between-laboratory standard deviation s_L; 0 when its variance comes out negative. */
  readonly betweenSd: number;
  /** True when the variance between laboratories came out below zero and was set to zero. */
  readonly betweenSetToZero: boolean;
  /** Reproducibility standard deviation s_R. */
  readonly reproducibilitySd: number;
  /** Limits r and R: two results differ by more in about 5 percent of cases. */
  readonly repeatabilityLimit: number;
  readonly reproducibilityLimit: number;
  /** In percent of the mean; null when the mean is 0. */
  readonly repeatabilityRsd: number | null;
  readonly reproducibilityRsd: number | null;
  /** Standard deviation of the laboratory means, unweighted. */
  readonly meansSd: number;
  /** s_R over the Horwitz prediction, when the unit was given and the mean lies above 0. */
  readonly horRat: number | null;
  readonly working: readonly WorkingStep[] | null;
}

/** 1.96 times the root of 2, as the standard rounds it. */
export const LIMIT_FACTOR = 2.8;

/**
 * Precision of a method by ISO 5725-2: mean, repeatability and reproducibility at one level.
 *
 * For results as they are: look at outlier tests first (outlierScreen), and leave out what a person decided to
 * leave out. Laboratories may differ in their number of results; a single result tells of the mean only.
 *
 * @param groups - the results of each laboratory. Shape: p lists. Unit: unit of the data. Domain: finite; at least 2
 *   laboratories, at least 1 result each and one with 2 or more.
 * @param options.limitFactor - Default 2.8, because the standard says so (1.96 sqrt(2) is 2.7719).
 * @param options.massFractionPerUnit - mass fraction of one unit, such as 1e-9 for ug/kg. Default none: no HorRat.
 * @param options.working - keep the steps. Default false.
 * @returns standard deviations, mean and limits in the unit of the data; relative ones in percent
 * @throws StatsError too-few-values; not-finite; out-of-domain for a factor not above 0 or a figure too large
 *
 * Ties and equal values: allowed. Zero spread: standard deviations 0. Order of input: does not matter.
 * Numerics: as oneWayAnova; O(N log N).
 * Source: ISO 5725-2:2019, 7.4: s_L^2 = (s_d^2 - s_r^2) / n, with s_d^2 the mean square between laboratories.
 * Checked by: tests/stats/precision/precision.test.ts, tests/reference/interlaboratory (coal, glucose, pentosan,
 *   creosote).
 * @example precision([[1, 2], [3, 4], [8, 9]]) // => mean 4.5, repeatabilitySd 0.70711, reproducibilitySd 3.64005
 */
export function precision(groups: Groups, options: PrecisionOptions = {}): PrecisionResult {
  const factor = options.limitFactor ?? LIMIT_FACTOR;
  checkGroups('precision', groups, { groups: 2, each: 1 }, 'laboratory');
  if (!(factor > 0 && Number.isFinite(factor))) {
    throw new StatsError(
      'out-of-domain',
      `precision requires a factor of the limits above zero, found ${factor}`,
    );
  }
  const data = groupedData(groups);
  const laboratories = groups.length;
  const degrees = data.count - laboratories;
  if (degrees === 0) {
    throw new StatsError(
      'too-few-values',
      'precision requires one laboratory with at least 2 results, found none',
    );
  }
  const within = sumOver(data.groups, (group) => group.squares) / degrees;
  const between = squaresBetween(data) / (laboratories - 1);
  const meanReplicates =
    (data.count - sumOver(data.groups, (group) => group.count ** 2) / data.count) / (laboratories - 1);
  const betweenVariance = (between - within) / meanReplicates;
  const length = (value: number) => representable('precision', value / data.factor);
  const mean = representable('precision', data.centre + grandMean(data) / data.factor);
  const repeatabilitySd = length(Math.sqrt(within));
  const reproducibilitySd = length(Math.sqrt(within + Math.max(0, betweenVariance)));
  const unit = options.massFractionPerUnit;
  const facts = {
    laboratories,
    results: data.count,
    meanReplicates,
    mean,
    repeatabilitySd,
    betweenSd: length(Math.sqrt(Math.max(0, betweenVariance))),
    betweenSetToZero: betweenVariance < 0,
    reproducibilitySd,
    repeatabilityLimit: representable('precision', factor * repeatabilitySd),
    reproducibilityLimit: representable('precision', factor * reproducibilitySd),
    repeatabilityRsd: percentOf(repeatabilitySd, mean),
    reproducibilityRsd: percentOf(reproducibilitySd, mean),
    meansSd: length(sdOfMeans(data)),
    horRat:
      unit !== undefined && mean > 0
        ? horRat({ standardDeviation: reproducibilitySd, assignedValue: mean, massFractionPerUnit: unit })
        : null,
  };
  return { ...facts, working: options.working ? precisionWorking(groups, facts, factor, unit) : null };
}

function percentOf(sd: number, mean: number): number | null {
  return mean === 0 ? null : representable('precision', (sd / Math.abs(mean)) * 100);
}
