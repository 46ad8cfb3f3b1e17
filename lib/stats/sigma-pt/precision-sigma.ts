import { checkNotNegative, checkPositive } from '../internal/check-values';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';

export interface PrecisionSigmaInput {
  readonly reproducibilitySd: number;
  readonly repeatabilitySd: number;
  readonly replicates: number;
}

export interface PrecisionSigmaResult {
  readonly sigmaPt: number;
  readonly working: readonly WorkingStep[];
}

/**
 * sigma_pt from the precision data of a method: the standard deviation between laboratories of a mean of m replicates.
 *
 * For rounds in which all use a method with known repeatability and reproducibility. Scores then ask whether a laboratory
 * does as well as the method can.
 *
 * @param input.reproducibilitySd - sigma_R. Unit: unit of the data. Domain: finite; > 0.
 * @param input.repeatabilitySd - sigma_r. Unit: unit of the data. Domain: finite; >= 0; at most sigma_R.
 * @param input.replicates - m, how many replicates a reported result is the mean of. Domain: whole; at least 1.
 * @returns { sigmaPt: sqrt(sigma_R^2 - sigma_r^2 (1 - 1/m)), working }, unit of the data
 * @throws StatsError not-finite; no-spread when sigma_R, or the result, is 0; out-of-domain when one is negative, sigma_r is
 *   above sigma_R or m is not a whole number
 *
 * Numerics: from (sigma_R - q) (sigma_R + q) with q = sigma_r sqrt(1 - 1/m): no overflow, no cancelled digits.
 * Source: ISO 13528:2022, 8.5.
 * Checked by: tests/stats/sigma-pt/sigma-function.test.ts.
 * @example precisionSigma({ reproducibilitySd: 5, repeatabilitySd: 4, replicates: 2 }).sigmaPt // => 4.12311
 */
export function precisionSigma(input: PrecisionSigmaInput): PrecisionSigmaResult {
  const { reproducibilitySd, repeatabilitySd, replicates } = input;
  checkPositive('precisionSigma', 'reproducibility standard deviation', reproducibilitySd);
  checkNotNegative('precisionSigma', 'repeatability standard deviation', repeatabilitySd);
  if (!(Number.isInteger(replicates) && replicates >= 1)) {
    const rule = 'a whole number of at least 1 replicate';
    throw new StatsError('out-of-domain', `precisionSigma requires ${rule}, found ${replicates}`);
  }
  if (repeatabilitySd > reproducibilitySd) {
    throw new StatsError(
      'out-of-domain',
      `precisionSigma requires a repeatability of at most the reproducibility ${reproducibilitySd}, found ${repeatabilitySd}`,
    );
  }
  const q = repeatabilitySd * Math.sqrt(1 - 1 / replicates);
  const sigmaPt =
    reproducibilitySd *
    Math.sqrt(((reproducibilitySd - q) / reproducibilitySd) * ((reproducibilitySd + q) / reproducibilitySd));
  if (sigmaPt === 0) {
    throw new StatsError(
      'no-spread',
      'precisionSigma leaves no spread between laboratories, found a sigma_pt of 0',
    );
  }
  const step: WorkingStep = {
    name: 'Standard deviation for proficiency assessment from precision data',
    formula: 'sigma_pt = sqrt(sigma_R^2 - sigma_r^2 * (1 - 1 / m))',
    clause: 'ISO 13528, 8.5',
    inputs: { sigma_R: reproducibilitySd, sigma_r: repeatabilitySd, m: replicates },
    value: sigmaPt,
  };
  return { sigmaPt, working: [step] };
}
