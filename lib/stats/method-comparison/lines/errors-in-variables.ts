import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { around, tFactor } from '../internal/confidence';
import type { Interval } from '../types';
import type { SlopeAndIntercept } from './deming-slope';
import type { JackknifeErrors } from './jackknife-line';

export type DemingErrors = 'jackknife' | 'analytic';

/** A line y = intercept + slope x with errors in both axes. */
export interface ErrorsInVariablesLine {
  readonly count: number;
  /** Unit of y. */
  readonly intercept: number;
  /** Unit of y per unit of x. */
  readonly slope: number;
  readonly interceptSe: number;
  readonly slopeSe: number;
  readonly covariance: number;
  readonly interceptInterval: Interval;
  readonly slopeInterval: Interval;
  /** Variance of the error of y over that of x. */
  readonly errorRatio: number;
  readonly standardErrors: DemingErrors;
  readonly degreesOfFreedom: number;
  readonly confidence: number;
  readonly factor: number;
  /** Of the iteration; 0 where there is a closed form. */
  readonly iterations: number;
  readonly working: readonly WorkingStep[] | null;
}

export interface FinishLine {
  readonly caller: string;
  readonly count: number;
  readonly line: SlopeAndIntercept;
  readonly errors: JackknifeErrors;
  readonly unitX: number;
  readonly unitY: number;
  readonly errorRatio: number;
  readonly standardErrors: DemingErrors;
  readonly confidence: number;
  readonly iterations: number;
}

/** Brings a line in scaled units back to the units of the data and adds t intervals with n - 2 degrees of freedom. */
export function finishLine(input: FinishLine): ErrorsInVariablesLine {
  const { caller, count, line, errors, unitX, unitY, confidence } = input;
  const perX = unitY / unitX;
  const slope = line.slope * perX + 0;
  const intercept = line.intercept * unitY + 0;
  const slopeSe = errors.slopeSe * perX;
  const interceptSe = errors.interceptSe * unitY;
  if (![slope, intercept, slopeSe, interceptSe].every(Number.isFinite)) {
    throw new StatsError('out-of-domain', `${caller} gives a result that is too large to represent`);
  }
  const factor = tFactor(confidence, count - 2);
  return {
    count,
    intercept,
    slope,
    interceptSe,
    slopeSe,
    covariance: errors.covariance * perX * unitY + 0,
    interceptInterval: around(intercept, factor * interceptSe),
    slopeInterval: around(slope, factor * slopeSe),
    errorRatio: input.errorRatio,
    standardErrors: input.standardErrors,
    degreesOfFreedom: count - 2,
    confidence,
    factor,
    iterations: input.iterations,
    working: null,
  };
}

/** Throws unless one of the two kinds is asked for. */
export function errorsKindOf(caller: string, kind: DemingErrors = 'jackknife'): DemingErrors {
  if (kind === 'jackknife' || kind === 'analytic') return kind;
  throw new StatsError(
    'out-of-domain',
    `${caller} knows jackknife and analytic standard errors, found ${String(kind)}`,
  );
}
