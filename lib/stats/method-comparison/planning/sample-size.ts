import { checkPositive } from '../../internal/check-values';
import { LIMITS_MULTIPLIER } from '../agreement/bland-altman';
import { confidenceOf, tFactor } from '../internal/confidence';
import { proportionInterval } from '../qualitative/proportion-interval';
import type { ConfidenceOptions } from '../types';
import { differencePower, equivalencePower } from './power';
import { checkShare, smallestCount } from './smallest-count';

export type SampleSizeGoal =
  /** Interval of the mean difference no wider than +- halfWidth. */
  | { readonly goal: 'bias-width'; readonly sd: number; readonly halfWidth: number }
  /** Interval of a limit of agreement no wider than +- halfWidth, by se = sd sqrt(1/n + k^2 / (2 (n - 1))). */
  | {
      readonly goal: 'limits-width';
      readonly sd: number;
      readonly halfWidth: number;
      readonly multiplier?: number;
    }
  /** A true mean difference found with the wanted power (paired t test, two-sided alpha = 1 - confidence). */
  | { readonly goal: 'difference'; readonly sd: number; readonly difference: number; readonly power?: number }
  /** Equivalence shown with the wanted power (each one-sided alpha = 1 - confidence). */
  | {
      readonly goal: 'equivalence';
      readonly sd: number;
      readonly margin: number;
      readonly difference?: number;
      readonly power?: number;
    }
  /** Wilson interval of a proportion no wider than halfWidth to either side, at the expected share. */
  | { readonly goal: 'proportion-width'; readonly share: number; readonly halfWidth: number };

const DEFAULT_POWER = 0.8;

/**
 * Sample size: how many items does a comparison need for a wanted width or power?
 *
 * @param wanted - one of the goals; sd is that of the differences of pairs. Unit: unit of the data.
 * @param options.confidence - Default 0.95. For 'difference' and 'equivalence' alpha is 1 - confidence.
 * @returns the smallest number of pairs (of results for a proportion)
 * @throws StatsError not-finite; no-spread for 0; out-of-domain for other senseless figures, or when more than ten
 *   million items would be needed
 *
 * Numerics: doubling and halving on the exact formula, O(log n) evaluations.
 * Source: width of the limits: Bland and Altman 1999, section 5; power: see differencePower and equivalencePower.
 * Checked by: tests/stats/method-comparison/planning.test.ts.
 * @example sampleSize({ goal: 'bias-width', sd: 2, halfWidth: 0.5 }) // => 64
 */
export function sampleSize(wanted: SampleSizeGoal, options: ConfidenceOptions = {}): number {
  const caller = 'sampleSize';
  const confidence = confidenceOf(caller, options.confidence);
  if ('sd' in wanted) checkPositive(caller, 'standard deviation', wanted.sd);
  if ('halfWidth' in wanted) checkPositive(caller, 'half width', wanted.halfWidth);
  switch (wanted.goal) {
    case 'bias-width': {
      const { sd, halfWidth } = wanted;
      return smallestCount(caller, 2, (n) => (tFactor(confidence, n - 1) * sd) / Math.sqrt(n) <= halfWidth);
    }
    case 'limits-width': {
      const { sd, halfWidth, multiplier: k = LIMITS_MULTIPLIER } = wanted;
      checkPositive(caller, 'multiplier', k);
      const se = (n: number) => sd * Math.sqrt(1 / n + (k * k) / (2 * (n - 1)));
      return smallestCount(caller, 2, (n) => tFactor(confidence, n - 1) * se(n) <= halfWidth);
    }
    case 'difference': {
      const { sd, difference, power = DEFAULT_POWER } = wanted;
      checkPositive(caller, 'difference', Math.abs(difference));
      checkShare(caller, 'power', power);
      const alpha = 1 - confidence;
      return smallestCount(caller, 2, (count) => differencePower({ count, sd, difference, alpha }) >= power);
    }
    case 'equivalence': {
      const { sd, margin, difference = 0, power = DEFAULT_POWER } = wanted;
      checkPositive(caller, 'distance to the margin', margin - Math.abs(difference));
      checkShare(caller, 'power', power);
      const alpha = 1 - confidence;
      const input = { sd, margin, difference, alpha };
      return smallestCount(caller, 2, (count) => equivalencePower({ ...input, count }) >= power);
    }
    case 'proportion-width': {
      const { share, halfWidth } = wanted;
      checkShare(caller, 'share', share);
      return smallestCount(caller, 1, (n) => proportionHalfWidth(share, n, confidence) <= halfWidth);
    }
  }
}

/** Half the width of the Wilson interval at a share that need not be a whole count. */
function proportionHalfWidth(share: number, n: number, confidence: number): number {
  const low = proportionInterval(Math.floor(share * n), n, { confidence });
  const high = proportionInterval(Math.ceil(share * n), n, { confidence });
  return Math.max(low.upper - low.lower, high.upper - high.lower) / 2;
}
