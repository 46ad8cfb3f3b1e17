import type { WorkingStep } from '../../working';
import type { Interval } from '../types';

/** A straight line y = intercept + slope x fitted by least squares, with what prediction from it needs. */
export interface LineFit {
  readonly count: number;
  /** Unit of y. 0, with standard error 0, when the line was forced through the origin. */
  readonly intercept: number;
  /** Unit of y per unit of x. */
  readonly slope: number;
  readonly interceptSe: number;
  readonly slopeSe: number;
  readonly covariance: number;
  /** Correlation of the two coefficients; null where a standard error is 0. */
  readonly correlation: number | null;
  readonly interceptInterval: Interval;
  readonly slopeInterval: Interval;
  /** Standard deviation of the residuals, divisor degreesOfFreedom; of unit weight when weighted. */
  readonly residualSd: number;
  readonly degreesOfFreedom: number;
  /** Share of the sum of squares that the line explains; null when all y are equal. */
  readonly rSquared: number | null;
  readonly meanX: number;
  readonly meanY: number;
  /** Root of the weighted sum of squares of x about its mean (about 0 through the origin), and sum of the weights. */
  readonly rootSxx: number;
  readonly sumOfWeights: number;
  readonly throughOrigin: boolean;
  /** True when the standard errors come from stated uncertainties and not from the residuals. */
  readonly knownUncertainties: boolean;
  readonly confidence: number;
  /** Factor of the intervals: Student's t, or normal for stated uncertainties. */
  readonly factor: number;
  readonly working: readonly WorkingStep[] | null;
}
