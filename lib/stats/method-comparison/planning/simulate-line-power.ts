import { normalQuantile } from '../../distributions';
import { checkFinite, checkNotNegative, checkValues } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { biasAtLevel } from '../agreement/bias-at-level';
import { confidenceOf } from '../internal/confidence';
import { deming } from '../lines/deming';
import { ordinaryLeastSquares } from '../lines/ordinary-least-squares';
import { weightedDeming } from '../lines/weighted-deming';
import { passingBablok } from '../rank-lines/passing-bablok';
import type { Interval, UniformGenerator } from '../types';
import { simulatePower, type SimulatedPower, type SimulatePowerOptions } from './simulate-power';

/** Error of a method at a level: sqrt(sd^2 + (cv level)^2). */
export interface ErrorModel {
  readonly sd?: number;
  /** As a share, not in percent. */
  readonly cv?: number;
}

export type PlannedLine = 'ordinary-least-squares' | 'deming' | 'weighted-deming' | 'passing-bablok';

export interface LineStudy {
  /** True levels of the items. Shape: n values; at least 3. Unit: unit of the data. */
  readonly levels: readonly number[];
  /** True relation y = intercept + slope x. Default 0 and 1. */
  readonly intercept?: number;
  readonly slope?: number;
  readonly errorX: ErrorModel;
  readonly errorY: ErrorModel;
  readonly line: PlannedLine;
  /** Variance of the error of y over that of x, as the Deming lines will be told. Default 1. */
  readonly errorRatio?: number;
  /**
   * What counts as found: 'slope', 'intercept' (the interval leaves out 1, or 0) or a level (the interval of the bias
   * there leaves out 0; not for passing-bablok).
   */
  readonly target: 'slope' | 'intercept' | { readonly level: number };
}

/**
 * Power of a line to find a bias, by simulating the study with normal errors.
 *
 * @param study - levels, true line, errors, line to be fitted and target
 * @param options.generator - uniform numbers, seeded by the caller
 * @param options.runs - studies. Default 1,000. @param options.confidence - of the line's intervals. Default 0.95.
 * @returns SimulatedPower; with the true line the identity it gives the rate of false findings
 * @throws StatsError too-few-values; not-finite; out-of-domain; no-spread when a simulated study has no line
 *
 * Numerics: runs times the cost of the line. Source: Linnet 1999, Clin Chem 45, 882-894 (necessary sample size).
 * Checked by: tests/stats/method-comparison/planning.test.ts.
 * @example simulateLinePower({ levels, slope: 1.05, errorX: { cv: 0.05 }, errorY: { cv: 0.05 }, line: 'deming', target: 'slope' }, { generator })
 */
export function simulateLinePower(study: LineStudy, options: SimulatePowerOptions): SimulatedPower {
  const caller = 'simulateLinePower';
  const { levels, intercept = 0, slope = 1, errorX, errorY } = study;
  checkValues(caller, levels, 3);
  checkFinite(caller, 'intercept', intercept);
  checkFinite(caller, 'slope', slope);
  for (const { sd = 0, cv = 0 } of [errorX, errorY]) {
    checkNotNegative(caller, 'standard deviation', sd);
    checkNotNegative(caller, 'coefficient of variation', cv);
  }
  const confidence = confidenceOf(caller, options.confidence);
  const found = finderOf(caller, study, confidence);
  return simulatePower((generator) => {
    const x = levels.map((level) => level + errorAt(errorX, level) * normalFrom(caller, generator));
    const y = levels.map((level) => {
      const truth = intercept + slope * level;
      return truth + errorAt(errorY, truth) * normalFrom(caller, generator);
    });
    return found(x, y);
  }, options);
}

function errorAt({ sd = 0, cv = 0 }: ErrorModel, level: number): number {
  return Math.hypot(sd, cv * level);
}

/** A standard normal number from one uniform one. */
function normalFrom(caller: string, generator: UniformGenerator): number {
  const u = generator();
  if (!(u >= 0 && u < 1)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a generator of numbers from 0 up to 1, which gave ${u}`,
    );
  }
  // Half a step up, so that 0 has a quantile too.
  return normalQuantile(u === 0 ? 2 ** -54 : u);
}

type Finder = (x: readonly number[], y: readonly number[]) => boolean;

function finderOf(caller: string, { line, target, errorRatio }: LineStudy, confidence: number): Finder {
  const leavesOut = ({ lower, upper }: Interval, value: number) => value < lower || value > upper;
  const ratio = errorRatio === undefined ? {} : { errorRatio };
  const lines = {
    'ordinary-least-squares': (x: readonly number[], y: readonly number[]) =>
      ordinaryLeastSquares(x, y, { confidence }),
    deming: (x: readonly number[], y: readonly number[]) => deming(x, y, { confidence, ...ratio }),
    'weighted-deming': (x: readonly number[], y: readonly number[]) =>
      weightedDeming(x, y, { confidence, ...ratio }),
    'passing-bablok': (x: readonly number[], y: readonly number[]) => passingBablok(x, y, { confidence }),
  };
  if (!(line in lines))
    throw new StatsError('out-of-domain', `${caller} does not know the line ${String(line)}`);
  if (typeof target === 'object') {
    if (line === 'passing-bablok') {
      throw new StatsError(
        'out-of-domain',
        `${caller} has no interval of the bias at a level for passing-bablok`,
      );
    }
    const fit = lines[line];
    return (x, y) => leavesOut(biasAtLevel(fit(x, y), target.level).interval, 0);
  }
  const fit = lines[line];
  return (x, y) => {
    const { slopeInterval, interceptInterval } = fit(x, y);
    return target === 'slope' ? leavesOut(slopeInterval, 1) : leavesOut(interceptInterval, 0);
  };
}
