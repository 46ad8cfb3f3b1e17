import { checkFinite, representable } from '../../internal/check-values';
import { METHOD_CLAUSES } from '../clauses';
import { around } from '../internal/confidence';
import { step } from '../internal/step';
import type { WorkingStep } from '../../working';
import type { Interval } from '../types';
import { allowedAt, verdictOn, type AllowedBias, type BiasVerdict } from './allowed-bias';

/** What any fitted line of this topic with standard errors carries. */
export interface LineWithErrors {
  readonly intercept: number;
  readonly slope: number;
  readonly interceptSe: number;
  readonly slopeSe: number;
  readonly covariance: number;
  /** Factor of its intervals. */
  readonly factor: number;
}

export interface BiasAtLevel {
  readonly level: number;
  /** a + (b - 1) level, unit of the data, and in percent of the level (null at 0). */
  readonly bias: number;
  readonly percent: number | null;
  readonly standardError: number;
  readonly interval: Interval;
  /** Allowed bias in the unit of the data; null when none is given. */
  readonly allowed: number | null;
  readonly verdict: BiasVerdict | null;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Bias of the second method against the first at a level, from a fitted line, against an allowed bias.
 *
 * Give it at the levels where decisions are taken. Works for ordinary and weighted least squares, Deming, weighted
 * Deming and York; for lines by ranks see biasAtLevelByBootstrap.
 *
 * @param line - a fitted line with standard errors and their covariance
 * @param level - of the first method. Unit: unit of the data. Domain: finite.
 * @param options.allowed - { absolute } in the unit of the data or { percent } of the level. Domain: > 0.
 * @param options.working - give the steps. Default false.
 * @returns { level, bias, percent, standardError, interval, allowed, verdict, working }; verdict 'within' when the
 *   interval lies inside the allowed bias, 'beyond' when it lies outside altogether, else 'undecided'
 * @throws StatsError not-finite; out-of-domain for the allowed bias or a result too large to represent
 *
 * Numerics: var = se_a^2 + level^2 se_b^2 + 2 level cov; for a jackknife this is the jackknife of the bias itself. O(1).
 * Source: Linnet 1993, Clin Chem 39, 424-432 (jackknife); Draper and Smith 1998, 3.1 (least squares).
 * Checked by: tests/reference/method-comparison (norris, tire, pefr, milkfat), tests/stats/method-comparison/bias-at-level.test.ts.
 * @example biasAtLevel({ intercept: 1, slope: 1.1, interceptSe: 0.5, slopeSe: 0, covariance: 0, factor: 2 }, 10).bias // => 2
 */
export function biasAtLevel(
  line: LineWithErrors,
  level: number,
  options: { readonly allowed?: AllowedBias; readonly working?: boolean } = {},
): BiasAtLevel {
  const caller = 'biasAtLevel';
  checkFinite(caller, 'level', level);
  const { intercept: a, slope: b, interceptSe: sea, slopeSe: seb, covariance: cov, factor } = line;
  const bias = representable(caller, a + (b - 1) * level);
  const variance = sea ** 2 + level ** 2 * seb ** 2 + 2 * level * cov;
  const standardError = representable(caller, Math.sqrt(Math.max(0, variance)));
  const interval = around(bias, factor * standardError);
  const allowed = options.allowed === undefined ? null : allowedAt(caller, options.allowed, level);
  const clause = METHOD_CLAUSES.deming;
  const limitInputs = { bias, factor, se: standardError };
  const working = options.working
    ? [
        step('Bias', 'bias = a + (b - 1) * level', clause, { a, b, level }, bias),
        step(
          'Standard error of the bias',
          'se = sqrt(sea^2 + level^2 * seb^2 + 2 * level * cov)',
          clause,
          { sea, seb, cov, level },
          standardError,
        ),
        step('Lower limit of the bias', 'limit = bias - factor * se', clause, limitInputs, interval.lower),
        step('Upper limit of the bias', 'limit = bias + factor * se', clause, limitInputs, interval.upper),
      ]
    : null;
  return {
    level,
    bias,
    percent: level === 0 ? null : (100 * bias) / Math.abs(level),
    standardError,
    interval,
    allowed,
    verdict: allowed === null ? null : verdictOn(interval, allowed),
    working,
  };
}
