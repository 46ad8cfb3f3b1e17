import { checkValues } from '../internal/check-values';
import { checkResamples, resample, uniformFrom, type RandomSource } from '../internal/random';
import { sampleSd } from '../internal/sums';
import { modes } from './modes';

export interface ModeStandardErrorOptions {
  readonly bandwidth: number;
  readonly random: RandomSource;
  readonly resamples?: number;
}

export interface ModeStandardErrorResult {
  /** The highest mode of the results themselves. */
  readonly mode: number;
  readonly standardError: number;
  readonly resamples: number;
  /** Share of resamples with a single mode. */
  readonly unimodalShare: number;
}

const DEFAULT_RESAMPLES = 1000;

/**
 * Standard error of the highest mode of the kernel density, by bootstrap: the standard uncertainty of a mode taken as
 * assigned value.
 *
 * Where two modes are nearly as high the resamples jump between them and the standard error tells it.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.bandwidth - of the kernel, held fixed. Unit: unit of the data. Domain: finite; > 0.
 * @param options.random - seeded source: () => number in [0, 1), or a generator as of pure-rand. It is altered.
 * @param options.resamples - Default 1000. Domain: whole; at least 50.
 * @returns { mode, standardError, resamples, unimodalShare }
 * @throws StatsError too-few-values; not-finite; no-spread for a bandwidth of 0; out-of-domain for an option
 *
 * Ties and equal values: allowed. Zero spread: 0. Order of input: changes the draws, so the last digits.
 * Numerics: a kernel density for each resample, O(resamples n log n).
 * Source: IUPAC/ISO/AOAC Harmonized Protocol 2006, Pure Appl. Chem. 78, 145, Appendix 3 (bootstrap of the mode);
 *   AMC Technical Brief 23 (2006).
 * Checked by: tests/stats/location-scale/bootstrap.test.ts.
 * @example modeStandardError([9, 10, 10.1, 10.3], { bandwidth: 0.3, random: generator }).mode // => 10.1
 */
export function modeStandardError(
  values: readonly number[],
  { bandwidth, random, resamples = DEFAULT_RESAMPLES }: ModeStandardErrorOptions,
): ModeStandardErrorResult {
  checkValues('modeStandardError', values, 2);
  checkResamples('modeStandardError', resamples, 50);
  const mode = modes(values, { bandwidth }).highest;
  const uniform = uniformFrom(random);
  const draw: number[] = [...values];
  const found = new Float64Array(resamples);
  let single = 0;
  for (let i = 0; i < resamples; i += 1) {
    resample(values, uniform, draw);
    const { highest, unimodal } = modes(draw, { bandwidth });
    found[i] = highest;
    if (unimodal) single += 1;
  }
  return { mode, standardError: sampleSd(found), resamples, unimodalShare: single / resamples };
}
