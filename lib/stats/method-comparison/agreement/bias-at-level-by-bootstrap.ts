import { checkFinite } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { bootstrapPairs } from '../internal/bootstrap-pairs';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import { passingBablok } from '../rank-lines/passing-bablok';
import { repeatedMedian } from '../rank-lines/repeated-median';
import { theilSen } from '../rank-lines/theil-sen';
import type { ConfidenceOptions, Interval, UniformGenerator } from '../types';
import { allowedAt, verdictOn, type AllowedBias, type BiasVerdict } from './allowed-bias';

const LINES = {
  'passing-bablok': (x: readonly number[], y: readonly number[]) => passingBablok(x, y),
  'passing-bablok-equivariant': (x: readonly number[], y: readonly number[]) =>
    passingBablok(x, y, { variant: 'equivariant' }),
  'theil-sen': (x: readonly number[], y: readonly number[]) => theilSen(x, y, { interceptFrom: 'residuals' }),
  'repeated-median': (x: readonly number[], y: readonly number[]) => repeatedMedian(x, y),
} as const;

export type RankLineName = keyof typeof LINES;

export interface BootstrapBiasOptions extends ConfidenceOptions {
  readonly line: RankLineName;
  readonly levels: readonly number[];
  readonly allowed?: AllowedBias;
  /** Uniform numbers from 0 to 1, seeded by the caller. */
  readonly generator: UniformGenerator;
  /** Default 999. */
  readonly resamples?: number;
}

export interface BootstrapBias {
  readonly level: number;
  readonly bias: number;
  readonly interval: Interval;
  readonly allowed: number | null;
  readonly verdict: BiasVerdict | null;
  /** Resamples without a line, left out. */
  readonly failedResamples: number;
}

/**
 * Bias at levels from a line by ranks, with percentile intervals from resampled pairs.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of the data.
 * @param options.line - which line.
 * @param options.levels - where. Unit: unit of the data.
 * @param options.generator - the same seed gives the same intervals.
 * @param options.allowed - as in biasAtLevel. @param options.resamples - at least 100. Default 999.
 * @param options.confidence - Default 0.95.
 * @returns for each level { level, bias, interval, allowed, verdict, failedResamples }
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread; out-of-domain
 *
 * Order of input: the intervals depend on it through the drawing. Numerics: a line for each resample, O(B n log n).
 * Source: Efron and Tibshirani 1993, An Introduction to the Bootstrap, 9.5 and ch. 13.
 * Checked by: tests/stats/method-comparison/bias-at-level.test.ts.
 * @example biasAtLevelByBootstrap(x, y, { line: 'passing-bablok', levels: [50], generator }) // => [{ level: 50, ... }]
 */
export function biasAtLevelByBootstrap(
  x: readonly number[],
  y: readonly number[],
  options: BootstrapBiasOptions,
): BootstrapBias[] {
  const caller = 'biasAtLevelByBootstrap';
  checkPairs(caller, x, y, 3);
  const confidence = confidenceOf(caller, options.confidence);
  options.levels.forEach((level) => checkFinite(caller, 'level', level));
  const fit = LINES[options.line] as (typeof LINES)[RankLineName] | undefined;
  if (fit === undefined)
    throw new StatsError('out-of-domain', `${caller} does not know the line ${options.line}`);
  const biases = (px: readonly number[], py: readonly number[]) => {
    const { slope, intercept } = fit(px, py);
    return options.levels.map((level) => intercept + (slope - 1) * level);
  };
  const found = biases(x, y);
  const { generator, resamples } = options;
  const made = bootstrapPairs(caller, { x, y, confidence, generator, resamples }, (px, py) =>
    orNull(() => biases(px, py)),
  );
  return options.levels.map((level, k) => {
    const interval = made.intervals[k] as Interval;
    const allowed = options.allowed === undefined ? null : allowedAt(caller, options.allowed, level);
    const verdict = allowed === null ? null : verdictOn(interval, allowed);
    return { level, bias: found[k] as number, interval, allowed, verdict, failedResamples: made.failed };
  });
}

/** A resample may have all x equal; anything but that is a fault. */
function orNull<T>(run: () => T): T | null {
  try {
    return run();
  } catch (error) {
    if (error instanceof StatsError && error.code === 'no-spread') return null;
    throw error;
  }
}
