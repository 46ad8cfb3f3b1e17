import { normalUpperQuantile, studentTUpperQuantile } from '../../distributions';
import { checkNotNegative, checkPositive, checkValues, representable } from '../../internal/check-values';
import { sampleSd } from '../../internal/sums';
import { StatsError } from '../../stats-error';

export interface ErrorRates {
  /** Risk of a false detection. Default 0.05. */
  readonly alpha?: number;
  /** Risk of a false non-detection at the detection limit. Default 0.05. */
  readonly beta?: number;
}

export interface DetectionLimits {
  /** Net signal above which something is said to be there. */
  readonly criticalLevel: number;
  /** True net signal that is found with probability 1 - beta. */
  readonly detectionLimit: number;
}

function risk(caller: string, name: string, value = 0.05): number {
  if (!(value > 0 && value < 0.5)) {
    throw new StatsError('out-of-domain', `${caller} requires ${name} above 0 and below 0.5, found ${value}`);
  }
  return normalUpperQuantile(value);
}

/**
 * Critical level and detection limit of Currie for a known constant standard deviation.
 *
 * @param sd - of a blank reading. Unit: unit of the signal. Domain: > 0.
 * @param options.paired - true when each reading has its own blank, which doubles the variance. Default false: the
 *   blank is well known.
 * @param options.alpha - Default 0.05. @param options.beta - Default 0.05.
 * @returns { criticalLevel, detectionLimit }, unit of the signal
 * @throws StatsError not-finite; no-spread for an sd of 0; out-of-domain
 *
 * Source: Currie 1968, Anal Chem 40, 586-593; he rounds 1.6449 to 1.645 and 2.326 to 2.33.
 * Checked by: tests/reference/method-comparison (currie_constants).
 * @example detectionLimits(1) // => criticalLevel 1.6449, detectionLimit 3.2897
 */
export function detectionLimits(
  sd: number,
  options: ErrorRates & { readonly paired?: boolean } = {},
): DetectionLimits {
  const caller = 'detectionLimits';
  checkPositive(caller, 'standard deviation', sd);
  const spread = options.paired ? Math.SQRT2 * sd : sd;
  const criticalLevel = risk(caller, 'alpha', options.alpha) * spread;
  const detectionLimit = criticalLevel + risk(caller, 'beta', options.beta) * spread;
  return { criticalLevel, detectionLimit: representable(caller, detectionLimit) };
}

/**
 * Critical level and detection limit of Currie for counts, whose variance is their mean.
 *
 * @param background - expected background counts. Domain: >= 0.
 * @param options.paired - true (default) when the background is counted as long as the sample; false: well known.
 * @param options.alpha - Default 0.05. @param options.beta - Default 0.05.
 * @returns { criticalLevel, detectionLimit }, net counts
 * @throws StatsError not-finite; out-of-domain
 *
 * Source: Currie 1968, Anal Chem 40, 586-593: L_D solves L_D = L_C + k_beta sqrt(L_D + var_0); for equal risks
 *   L_D = k^2 + 2 L_C. Checked by: tests/reference/method-comparison (currie_constants).
 * @example countingDetectionLimits(100) // => criticalLevel 23.262, detectionLimit 49.229
 */
export function countingDetectionLimits(
  background: number,
  options: ErrorRates & { readonly paired?: boolean } = {},
): DetectionLimits {
  const caller = 'countingDetectionLimits';
  checkNotNegative(caller, 'background', background);
  const variance = (options.paired ?? true) ? 2 * background : background;
  const criticalLevel = risk(caller, 'alpha', options.alpha) * Math.sqrt(variance);
  const k = risk(caller, 'beta', options.beta);
  const detectionLimit = criticalLevel + (k * k) / 2 + k * Math.sqrt(criticalLevel + (k * k) / 4 + variance);
  return { criticalLevel, detectionLimit: representable(caller, detectionLimit) };
}

export interface MethodDetectionLimit {
  readonly limit: number;
  readonly sd: number;
  readonly variances: readonly number[];
  readonly degreesOfFreedom: number;
  readonly factor: number;
}

/**
 * Method detection limit: one-sided t times the standard deviation of replicates near the limit.
 *
 * @param sets - one or more sets of replicates. Shape: sets of 2 values or more. Unit: unit of the data. Several sets
 *   are pooled; look at the ratio of their variances first.
 * @param options.confidence - one-sided. Default 0.99.
 * @returns { limit, sd, variances, degreesOfFreedom, factor }
 * @throws StatsError too-few-values; not-finite; out-of-domain
 *
 * Zero spread: limit 0. Order of input: does not matter. Numerics: O(n).
 * Source: 40 CFR 136, Appendix B. Checked by: tests/reference/method-comparison (mdl_epa).
 * @example methodDetectionLimit([[2.5, 2.7, 2.2, 2.2, 3.1, 2.6, 2.8]]).limit // => 1.0172
 */
export function methodDetectionLimit(
  sets: readonly (readonly number[])[],
  options: { readonly confidence?: number } = {},
): MethodDetectionLimit {
  const caller = 'methodDetectionLimit';
  const confidence = options.confidence ?? 0.99;
  if (!(confidence > 0.5 && confidence < 1)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a confidence above 0.5 and below 1, found ${confidence}`,
    );
  }
  if (sets.length === 0) throw new StatsError('too-few-values', `${caller} requires at least 1 set, found 0`);
  sets.forEach((values) => checkValues(caller, values, 2));
  const variances = sets.map((values) => sampleSd(values) ** 2);
  const degreesOfFreedom = sets.reduce((sum, values) => sum + values.length - 1, 0);
  const squares = variances.reduce(
    (sum, variance, i) => sum + variance * ((sets[i] as readonly number[]).length - 1),
    0,
  );
  const sd = Math.sqrt(squares / degreesOfFreedom);
  const factor = studentTUpperQuantile(1 - confidence, degreesOfFreedom);
  return { limit: representable(caller, factor * sd), sd, variances, degreesOfFreedom, factor };
}
