import { checkFinite, checkValues } from '../internal/check-values';
import { mean } from '../location-scale/mean';
import { precisionSigma } from '../sigma-pt/precision-sigma';
import type { WorkingStep } from '../working';
import { zScore } from './z-score';

export interface ZScoreOfMeanInput {
  readonly results: readonly number[];
  readonly assignedValue: number;
  readonly reproducibilitySd: number;
  readonly repeatabilitySd: number;
}

export interface ZScoreOfMeanResult {
  readonly z: number;
  readonly mean: number;
  /** sigma_pt for a mean of so many replicates. */
  readonly sigmaPt: number;
  readonly replicates: number;
  readonly working: readonly WorkingStep[];
}

/**
 * z score of the mean of a laboratory's replicates.
 *
 * A mean of m replicates varies less than a single result, so sigma_pt is that of a mean. Where the scheme sets sigma_pt
 * for the mean itself, score the mean by zScore.
 *
 * @param input.results - the replicates of one laboratory. Shape: m values. Unit: unit of the data. Domain: finite; at
 *   least 1.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.reproducibilitySd - sigma_R. Unit: unit of the data. Domain: finite; > 0.
 * @param input.repeatabilitySd - sigma_r. Unit: unit of the data. Domain: finite; >= 0; at most sigma_R.
 * @returns { z, mean, sigmaPt, replicates, working }
 * @throws StatsError too-few-values; not-finite; no-spread when sigma_pt is 0; out-of-domain as precisionSigma
 *
 * Numerics: mean to the last digit; near 2 and 3 compared on the decimal figures (zScore).
 * Source: ISO 13528:2022, 8.5 and 9.4: sigma_pt = sqrt(sigma_R^2 - sigma_r^2 (1 - 1/m)).
 * Checked by: tests/stats/scores/z-score-of-mean.test.ts.
 * @example zScoreOfMean({ results: [11, 12], assignedValue: 10, reproducibilitySd: 1, repeatabilitySd: 0 }).z // => 1.5
 */
export function zScoreOfMean(input: ZScoreOfMeanInput): ZScoreOfMeanResult {
  checkValues('zScoreOfMean', input.results, 1);
  checkFinite('zScoreOfMean', 'assigned value', input.assignedValue);
  const replicates = input.results.length;
  const { sigmaPt, working } = precisionSigma({ ...input, replicates });
  const average = mean(input.results);
  const z = zScore({ value: average, assignedValue: input.assignedValue, sigmaPt });
  const steps: WorkingStep[] = [
    {
      name: 'Mean of the replicates',
      formula: 'mean of values',
      clause: 'arithmetic mean',
      inputs: { values: [...input.results] },
      value: average,
    },
    ...working,
    {
      name: 'z of the mean',
      formula: 'z = (mean - x_pt) / sigma_pt',
      clause: 'ISO 13528, 9.4',
      inputs: { mean: average, x_pt: input.assignedValue, sigma_pt: sigmaPt },
      value: z,
    },
  ];
  return { z, mean: average, sigmaPt, replicates, working: steps };
}
