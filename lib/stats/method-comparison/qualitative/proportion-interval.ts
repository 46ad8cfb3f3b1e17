import { betaQuantile, betaUpperQuantile } from '../../distributions';
import { StatsError } from '../../stats-error';
import { confidenceOf, zFactor } from '../internal/confidence';
import type { ConfidenceOptions, Interval } from '../types';
import { checkCounts } from './check-counts';

export type ProportionMethod = 'wilson' | 'exact';

/**
 * Confidence interval of a proportion: Wilson's score interval, or the exact one of Clopper and Pearson.
 *
 * Wilson has about the stated confidence; the exact one at least that, and is wider.
 *
 * @param positives - how many. Domain: whole; 0 to trials.
 * @param trials - out of how many. Domain: whole; at least 1.
 * @param options.method - 'wilson' (default, as AOAC Appendix J) or 'exact'.
 * @param options.confidence - two-sided. Default 0.95.
 * @returns { lower, upper }, shares from 0 to 1; exactly 0 at no positives and exactly 1 at all
 * @throws StatsError too-few-values for no trials; out-of-domain for counts or options
 *
 * Numerics: O(1). Source: Wilson 1927, J Am Stat Assoc 22, 209-212; Clopper and Pearson 1934, Biometrika 26, 404-413;
 *   both compared in Newcombe 1998, Stat Med 17, 857-872.
 * Checked by: tests/reference/method-comparison (proportions_single, proportions_single_scipy),
 *   tests/stats/method-comparison/proportions.test.ts.
 * @example proportionInterval(81, 263) // => 0.2553 to 0.3662
 */
export function proportionInterval(
  positives: number,
  trials: number,
  options: ConfidenceOptions & { readonly method?: ProportionMethod } = {},
): Interval {
  const caller = 'proportionInterval';
  checkCounts(caller, positives, trials);
  const confidence = confidenceOf(caller, options.confidence);
  const method = options.method ?? 'wilson';
  if (method === 'wilson') return wilson(positives, trials, confidence);
  if (method === 'exact') return exact(positives, trials, confidence);
  throw new StatsError(
    'out-of-domain',
    `${caller} knows wilson and exact intervals, found ${String(method)}`,
  );
}

function wilson(x: number, n: number, confidence: number): Interval {
  const z = zFactor(confidence);
  const centre = x + (z * z) / 2;
  const half = z * Math.sqrt((x / n) * (n - x) + (z * z) / 4);
  const all = n + z * z;
  return {
    lower: x === 0 ? 0 : Math.max(0, (centre - half) / all),
    upper: x === n ? 1 : Math.min(1, (centre + half) / all),
  };
}

function exact(x: number, n: number, confidence: number): Interval {
  const tail = (1 - confidence) / 2;
  return {
    lower: x === 0 ? 0 : betaQuantile(tail, x, n - x + 1),
    upper: x === n ? 1 : betaUpperQuantile(tail, x + 1, n - x),
  };
}
