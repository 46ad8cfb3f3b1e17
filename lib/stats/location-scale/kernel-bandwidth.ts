import { checkPositive } from '../internal/check-values';
import { StatsError } from '../stats-error';

export type KernelBandwidthRule =
  | { readonly rule: 'sigma-pt'; readonly sigmaPt: number }
  | { readonly rule: 'robust-sd'; readonly robustSd: number; readonly count: number };

/**
 * Bandwidth of a kernel density: 0.75 sigma_pt, or 0.9 s* / p^0.2.
 *
 * 'sigma-pt' smooths away structure that does not matter for the scores; 'robust-sd' follows the spread of the round.
 *
 * @param rule - 'sigma-pt' with sigmaPt, or 'robust-sd' with s* and p. Unit of sigmaPt and robustSd: unit of the data.
 *   Domain: finite; > 0; count whole, at least 1.
 * @returns the bandwidth (standard deviation of the kernel), unit of the data
 * @throws StatsError not-finite; no-spread when a scale is 0; out-of-domain when negative; too-few-values below 1
 *
 * Numerics: one formula.
 * Source: 0.75 sigma_pt: IUPAC/ISO/AOAC Harmonized Protocol 2006; 0.9 s* / p^0.2: ISO 13528:2022, 10.3.
 * Checked by: tests/stats/location-scale/kernel-density.test.ts.
 * @example kernelBandwidth({ rule: 'sigma-pt', sigmaPt: 2 }) // => 1.5
 */
export function kernelBandwidth(rule: KernelBandwidthRule): number {
  if (rule.rule === 'sigma-pt') {
    checkPositive('kernelBandwidth', 'sigma_pt', rule.sigmaPt);
    return 0.75 * rule.sigmaPt;
  }
  checkPositive('kernelBandwidth', 'robust standard deviation', rule.robustSd);
  if (!(rule.count >= 1)) {
    throw new StatsError('too-few-values', `kernelBandwidth requires at least 1 result, found ${rule.count}`);
  }
  return (0.9 * rule.robustSd) / rule.count ** 0.2;
}
