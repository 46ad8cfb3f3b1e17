import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf, zFactor } from '../internal/confidence';
import { scalePairs } from '../internal/scale-pairs';
import { step } from '../internal/step';
import { centredSums } from '../lines/deming-slope';
import type { ConfidenceOptions, Interval } from '../types';

export interface Concordance {
  readonly count: number;
  /** Concordance correlation coefficient, -1 to 1. */
  readonly coefficient: number;
  /** Its parts: coefficient = correlation times accuracy (bias correction factor C_b). */
  readonly correlation: number;
  readonly accuracy: number;
  /** Ratio of the standard deviations, y to x, and shift of the means in sqrt(s_x s_y). */
  readonly scaleShift: number;
  readonly locationShift: number;
  readonly standardError: number;
  /** Of the z transform; null at a coefficient of 1 or -1. */
  readonly zStandardError: number | null;
  readonly interval: Interval;
  readonly confidence: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Concordance correlation coefficient (Lin): how closely pairs lie on the line of identity.
 *
 * It grows with the range of the items and says nothing about what is good enough; give it beside limits of agreement.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of the data. Domain: finite; at least 3, not all
 *   equal.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of the data. Domain: as x.
 * @param options.confidence - of the interval, by the z transform. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns Concordance
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x or all y are equal; out-of-domain
 *
 * Ties and equal values: allowed. Perfect agreement: coefficient 1, interval 1 to 1. Order of input: does not matter.
 * Numerics: compensated sums, variances with divisor n; the variance formula is written without division by r. O(n).
 * Source: Lin 1989, Biometrics 45, 255-268; standard error as corrected in 2000, Biometrics 56, 324-325 (divisor n - 2).
 * Checked by: tests/reference/method-comparison (pefr, milkfat, tire), tests/stats/method-comparison/concordance.test.ts.
 * @example concordance([1, 2, 3, 4], [1.1, 2.3, 2.9, 4.4]).coefficient // => 0.9785
 */
export function concordance(
  x: readonly number[],
  y: readonly number[],
  options: ConfidenceOptions & { readonly working?: boolean } = {},
): Concordance {
  const caller = 'concordance';
  checkPairs(caller, x, y, 3);
  const confidence = confidenceOf(caller, options.confidence);
  const parts = partsOf(caller, x, y);
  const { correlation: r, accuracy: cb, locationShift: u } = parts;
  const coefficient = Math.min(1, Math.max(-1, r * cb)) + 0;
  const variance =
    ((1 - r * r) * cb * cb * (1 - coefficient ** 2) +
      2 * coefficient ** 2 * cb * (1 - coefficient) * u * u -
      (coefficient ** 2 * cb * cb * u ** 4) / 2) /
    (x.length - 2);
  const standardError = Math.sqrt(Math.max(0, variance));
  const exact = 1 - coefficient ** 2 <= 0;
  const zStandardError = exact ? null : standardError / (1 - coefficient ** 2);
  const z = zStandardError === null ? 0 : zFactor(confidence) * zStandardError;
  const at = (side: number) => (exact ? coefficient : Math.tanh(Math.atanh(coefficient) + side * z));
  const interval = { lower: at(-1), upper: at(1) };
  const result = {
    count: x.length,
    coefficient,
    ...parts,
    standardError,
    zStandardError,
    interval,
    confidence,
  };
  return { ...result, working: options.working ? workingOf(result, x, y) : null };
}

function partsOf(caller: string, x: readonly number[], y: readonly number[]) {
  const { unitX, unitY, ...scaled } = scalePairs(x, y);
  const { sxx, syy, sxy, meanX, meanY, weight } = centredSums(scaled.x, scaled.y);
  if (sxx === 0 || syy === 0) {
    throw new StatsError('no-spread', `${caller} requires at least two different values of each method`);
  }
  const correlation = Math.min(1, Math.max(-1, sxy / Math.sqrt(sxx * syy)));
  const scaleShift = Math.sqrt(syy / sxx) * (unitY / unitX);
  // Difference of the means in the unit of x, then in the geometric mean of both standard deviations.
  const shift = meanY * (unitY / unitX) - meanX;
  const locationShift = shift / Math.sqrt(sxx / weight) / Math.sqrt(scaleShift);
  const accuracy = 2 / (scaleShift + 1 / scaleShift + locationShift ** 2);
  if (![scaleShift, 1 / scaleShift, locationShift ** 2].every(Number.isFinite)) {
    throw new StatsError('out-of-domain', `${caller} finds x and y too different in size`);
  }
  return { correlation, accuracy, scaleShift, locationShift };
}

function workingOf(
  result: Omit<Concordance, 'working'>,
  x: readonly number[],
  y: readonly number[],
): WorkingStep[] {
  const clause = METHOD_CLAUSES.concordance;
  const { coefficient: c, correlation: r, accuracy: cb, scaleShift: v, locationShift: u, count: n } = result;
  const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const [meanX, meanY] = [mean(x), mean(y)];
  const about = 'sum((x - meanX)^2)';
  const abouty = 'sum((y - meanY)^2)';
  return [
    step('Mean of x', 'meanX = sum(x) / count(x)', clause, { x }, meanX),
    step('Mean of y', 'meanY = sum(y) / count(y)', clause, { y }, meanY),
    step(
      'Correlation',
      `r = sum((x - meanX) * (y - meanY)) / sqrt(${about} * ${abouty})`,
      clause,
      { x, y, meanX, meanY },
      r,
    ),
    step('Scale shift', `v = sqrt(${abouty} / ${about})`, clause, { x, y, meanX, meanY }, v),
    step(
      'Location shift',
      `u = (meanY - meanX) / sqrt(sqrt(${about} * ${abouty}) / n)`,
      clause,
      { x, y, meanX, meanY, n },
      u,
    ),
    step('Accuracy', 'cb = 2 / (v + 1 / v + u^2)', clause, { v, u }, cb),
    step('Concordance', 'c = r * cb', clause, { r, cb }, c),
    step(
      'Standard error',
      'se = sqrt(((1 - r^2) * cb^2 * (1 - c^2) + 2 * c^2 * cb * (1 - c) * u^2 - c^2 * cb^2 * u^4 / 2) / (n - 2))',
      clause,
      { r, cb, c, u, n },
      result.standardError,
    ),
  ];
}
