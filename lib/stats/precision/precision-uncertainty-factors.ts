import { checkPositive } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface PrecisionStudySize {
  readonly laboratories: number;
  readonly replicates: number;
  readonly ratio: number;
}

export interface PrecisionUncertaintyFactors {
  /** Half-width of the interval of the bias, as a multiple of sigma_R. */
  readonly bias: number;
  /** Half-width relative to s_r. */
  readonly repeatability: number;
  /** Half-width relative to s_R. */
  readonly reproducibility: number;
}

const Z_95 = 1.96;

/**
 * Uncertainty factors A, A_r and A_R: how well a precision study of a given size can know its figures.
 *
 * For planning: with probability 0.95 the bias is within A sigma_R, s_r within A_r and s_R within A_R of the truth.
 *
 * @param size.laboratories - p. Domain: whole; at least 2.
 * @param size.replicates - n, results a laboratory. Domain: whole; at least 2.
 * @param size.ratio - gamma = sigma_R / sigma_r. Unit: none. Domain: finite; at least 1.
 * @returns { bias: A, repeatability: A_r, reproducibility: A_R }, no unit
 * @throws StatsError too-few-values; not-finite; out-of-domain for a ratio below 1 or numbers that are not whole
 *
 * Numerics: three formulas; the coverage factor is 1.96 as printed.
 * Source: ISO 5725-1:1994, 6.3, equations 9 to 16 (numbers from memory).
 * Checked by: tests/stats/precision/precision.test.ts, tests/reference/interlaboratory.
 * @example precisionUncertaintyFactors({ laboratories: 10, replicates: 2, ratio: 2 }) // => bias 0.57978
 */
export function precisionUncertaintyFactors(size: PrecisionStudySize): PrecisionUncertaintyFactors {
  const { laboratories: p, replicates: n, ratio } = size;
  for (const [name, count] of [
    ['laboratories', p],
    ['replicates', n],
  ] as const) {
    if (!(count >= 2)) {
      const message = `precisionUncertaintyFactors requires at least 2 ${name}, found ${count}`;
      throw new StatsError('too-few-values', message);
    }
    if (!Number.isInteger(count)) {
      const message = `precisionUncertaintyFactors requires a whole number of ${name}, found ${count}`;
      throw new StatsError('out-of-domain', message);
    }
  }
  checkPositive('precisionUncertaintyFactors', 'ratio of sigma_R to sigma_r', ratio);
  if (ratio < 1) {
    const message = `precisionUncertaintyFactors requires a ratio of at least 1, found ${ratio}`;
    throw new StatsError('out-of-domain', message);
  }
  // n (gamma^2 - 1) + 1 over gamma^2, written so that a large gamma does not overflow.
  const share = n - (n - 1) / ratio / ratio;
  const alone = (n - 1) / ratio / ratio;
  return {
    bias: Z_95 * Math.sqrt(share / (p * n)),
    repeatability: Z_95 * Math.sqrt(1 / (2 * p * (n - 1))),
    reproducibility:
      Z_95 * Math.sqrt((p * share ** 2 + ((p - 1) * alone ** 2) / (n - 1)) / (2 * n ** 2 * (p - 1) * p)),
  };
}
