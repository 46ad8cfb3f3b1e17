import { checkNotNegative, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface ConsensusUncertaintyInput {
  readonly robustSd: number;
  readonly count: number;
}

export interface ConsensusUncertaintyOptions {
  readonly factor?: number;
}

/** The factor of ISO 13528. The efficiency of the median gives sqrt(pi / 2) = 1.2533, often written 1.253. */
export const CONSENSUS_FACTOR = 1.25;

/**
 * Standard uncertainty of a robust consensus value: u(x_pt) = 1.25 s* / sqrt(p).
 *
 * For x* of Algorithm A and, with its own scale, for the median. It holds the spread of the results only, not
 * inhomogeneity, instability or a bias that all laboratories share.
 *
 * @param input.robustSd - s*. Unit: unit of the data. Domain: finite; >= 0.
 * @param input.count - p, the number of results in the consensus. Unit: none. Domain: whole; at least 2.
 * @param options.factor - Default 1.25, because the standard says so; 1.253 is the exact one for the median.
 * @returns u(x_pt), unit of the data
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for a negative scale or a factor not above 0
 *
 * Zero spread: 0.
 * Numerics: one formula.
 * Source: ISO 13528:2022, 7.7.3.
 * Checked by: tests/stats/consensus/consensus.test.ts, tests/reference/proficiency (def-u-consensus).
 * @example consensusUncertainty({ robustSd: 0.0395, count: 34 }) // => 0.00846774
 */
export function consensusUncertainty(
  { robustSd, count }: ConsensusUncertaintyInput,
  { factor = CONSENSUS_FACTOR }: ConsensusUncertaintyOptions = {},
): number {
  checkNotNegative('consensusUncertainty', 'robust standard deviation', robustSd);
  if (!(count >= 2)) {
    throw new StatsError(
      'too-few-values',
      `consensusUncertainty requires at least 2 results, found ${count}`,
    );
  }
  if (!(factor > 0 && Number.isFinite(factor))) {
    throw new StatsError(
      'out-of-domain',
      `consensusUncertainty requires a factor above zero, found ${factor}`,
    );
  }
  return representable('consensusUncertainty', factor * (robustSd / Math.sqrt(count)));
}
