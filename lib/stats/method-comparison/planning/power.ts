import {
  chiSquareDensity,
  noncentralTCdf,
  noncentralTSurvival,
  normalCdf,
  studentTUpperQuantile,
} from '../../distributions';
import { checkFinite, checkPositive } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { checkItems, checkShare } from './smallest-count';

export interface DifferencePowerInput {
  readonly count: number;
  /** Standard deviation of the differences of pairs. */
  readonly sd: number;
  /** True mean difference that is to be found. */
  readonly difference: number;
  /** Default 0.05, two-sided. */
  readonly alpha?: number;
}

/**
 * Power of the paired t test: how likely is it that a true mean difference is found?
 *
 * @param input.count - pairs. Domain: whole; at least 2.
 * @param input.sd - Unit: unit of the data. Domain: > 0.
 * @param input.difference - Unit: unit of the data. Domain: finite.
 * @param input.alpha - Default 0.05.
 * @returns probability, 0 to 1
 * @throws StatsError too-few-values; not-finite; no-spread; out-of-domain
 *
 * Numerics: noncentral t distribution, both tails. Source: Cohen 1988, Statistical Power Analysis, ch. 2.
 * Checked by: tests/stats/method-comparison/planning.test.ts (base R power.t.test).
 * @example differencePower({ count: 20, sd: 1, difference: 0.66 }) // => 0.7995
 */
export function differencePower({ count, sd, difference, alpha = 0.05 }: DifferencePowerInput): number {
  const caller = 'differencePower';
  checkItems(caller, count, 2);
  checkPositive(caller, 'standard deviation', sd);
  checkFinite(caller, 'difference', difference);
  checkShare(caller, 'alpha', alpha);
  const df = count - 1;
  const critical = studentTUpperQuantile(alpha / 2, df);
  const shift = Math.sqrt(count) * (Math.abs(difference) / sd);
  return Math.min(1, noncentralTSurvival(critical, df, shift) + noncentralTCdf(-critical, df, shift));
}

export interface EquivalencePowerInput {
  readonly count: number;
  readonly sd: number;
  readonly margin: number;
  /** True mean difference. Default 0. */
  readonly difference?: number;
  /** Of each one-sided test. Default 0.05. */
  readonly alpha?: number;
}

/**
 * Power of the equivalence test (TOST): how likely is it that methods that are close enough are found to be so?
 *
 * @param input.count - pairs. Domain: whole; at least 2.
 * @param input.sd - of the differences of pairs. Unit: unit of the data. Domain: > 0.
 * @param input.margin - Unit: unit of the data. Domain: > 0.
 * @param input.difference - true mean difference. Default 0. Outside the margin the power is at most alpha.
 * @param input.alpha - Domain: above 0, below 0.5. Default 0.05.
 * @returns probability, 0 to 1
 * @throws StatsError too-few-values; not-finite; no-spread; out-of-domain
 *
 * Numerics: exact for normal differences, by integrating over the standard deviation found (1e-10).
 * Source: Phillips 1990, J Pharmacokinet Biopharm 18, 137-144.
 * Checked by: tests/stats/method-comparison/planning.test.ts (base R integrate).
 * @example equivalencePower({ count: 12, sd: 1, margin: 1 }) // => 0.8894
 */
export function equivalencePower(input: EquivalencePowerInput): number {
  const caller = 'equivalencePower';
  const { count, sd, margin, difference = 0, alpha = 0.05 } = input;
  checkItems(caller, count, 2);
  checkPositive(caller, 'standard deviation', sd);
  checkPositive(caller, 'margin', margin);
  checkFinite(caller, 'difference', difference);
  if (!(alpha > 0 && alpha < 0.5)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires an alpha above 0 and below 0.5, found ${alpha}`,
    );
  }
  const df = count - 1;
  const t = studentTUpperQuantile(alpha, df);
  const unit = sd / Math.sqrt(count);
  const up = (margin - difference) / unit;
  const down = (-margin - difference) / unit;
  // w is the standard deviation found over the true one; beyond (up - down) / 2 t nothing can be shown.
  const width = 12 / Math.sqrt(2 * df);
  const from = Math.max(0, 1 - width);
  const to = Math.min(1 + width, (up - down) / (2 * t));
  if (!(to > from)) return 0;
  const inside = (w: number) => normalCdf(up - t * w) - normalCdf(down + t * w);
  return Math.min(
    1,
    Math.max(
      0,
      integrate((w) => inside(w) * 2 * df * w * chiSquareDensity(df * w * w, df), from, to),
    ),
  );
}

const PANELS = 100;
/** Gauss-Legendre nodes and weights of order 5 on -1..1 (Abramowitz and Stegun 25.4.30). */
const NODES = [
  [0, 128 / 225],
  [Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900],
  [Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900],
] as const;

function integrate(density: (w: number) => number, from: number, to: number): number {
  const half = (to - from) / PANELS / 2;
  let sum = 0;
  for (let panel = 0; panel < PANELS; panel += 1) {
    const middle = from + (2 * panel + 1) * half;
    for (const [node, weight] of NODES) {
      sum += weight * density(middle + node * half);
      if (node > 0) sum += weight * density(middle - node * half);
    }
  }
  return sum * half;
}
