import { StatsError } from '../../stats-error';
import { confidenceOf } from '../internal/confidence';
import { proportionInterval } from '../qualitative/proportion-interval';
import type { ConfidenceOptions, Interval, UniformGenerator } from '../types';

export interface SimulatedPower {
  readonly runs: number;
  readonly found: number;
  readonly power: number;
  /** Wilson interval for what more runs would give. */
  readonly interval: Interval;
}

export interface SimulatePowerOptions extends ConfidenceOptions {
  readonly generator: UniformGenerator;
  /** Default 1,000. */
  readonly runs?: number;
}

/**
 * Power by simulation: the share of simulated studies in which something is found.
 *
 * For questions without a formula. The same seed gives the same figure.
 *
 * @param study - makes one study from the generator and says whether it found what it was for
 * @param options.generator - uniform numbers from 0 up to 1, seeded by the caller
 * @param options.runs - Domain: whole; at least 10. Default 1,000 (the power is then known to about 3 %).
 * @param options.confidence - of the interval. Default 0.95.
 * @returns { runs, found, power, interval }
 * @throws StatsError out-of-domain for options; whatever the study throws
 *
 * Numerics: runs times the cost of a study. Source: Metropolis and Ulam 1949.
 * Checked by: tests/stats/method-comparison/planning.test.ts (against the formula).
 * @example simulatePower((next) => next() < 0.3, { generator }).power // => about 0.3
 */
export function simulatePower(
  study: (generator: UniformGenerator) => boolean,
  options: SimulatePowerOptions,
): SimulatedPower {
  const caller = 'simulatePower';
  const { generator, runs = 1_000 } = options;
  const confidence = confidenceOf(caller, options.confidence);
  if (!Number.isSafeInteger(runs) || runs < 10) {
    throw new StatsError('out-of-domain', `${caller} requires at least 10 runs, found ${runs}`);
  }
  let found = 0;
  for (let run = 0; run < runs; run += 1) if (study(generator)) found += 1;
  return { runs, found, power: found / runs, interval: proportionInterval(found, runs, { confidence }) };
}
