import { checkPositive } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface LimitRoundSigmaInput {
  /** Robust standard deviation of this round. */
  readonly roundSd: number;
  readonly lowest?: number;
  readonly highest?: number;
  /** The other choices of sigma_pt, by name, to be held beside it. */
  readonly others?: Readonly<Record<string, number>>;
}

export interface LimitRoundSigmaResult {
  readonly sigmaPt: number;
  readonly limitedBy: 'none' | 'lowest' | 'highest';
  /** The round's own standard deviation over each of the other choices. */
  readonly ratios: Readonly<Record<string, number>>;
  readonly statement: string;
}

/**
 * The round's own standard deviation as sigma_pt, kept within limits.
 *
 * Without limits a round in which all do poorly is judged mildly, and one in which all agree condemns differences of no
 * consequence. A highest value follows from fitness for purpose, a lowest from the repeatability or the uncertainty that
 * matters.
 *
 * @param input.roundSd - s*. Unit: unit of the data. Domain: finite; > 0.
 * @param input.lowest - Unit: unit of the data. Domain: finite; > 0. Default: no limit.
 * @param input.highest - Unit: unit of the data. Domain: finite; > 0; not below `lowest`. Default: no limit.
 * @param input.others - other choices, for the ratios. Domain: finite; > 0.
 * @returns { sigmaPt, limitedBy, ratios, statement }
 * @throws StatsError not-finite; no-spread when one is 0; out-of-domain when one is negative or the limits are crossed
 *
 * Numerics: plain comparison. Source: ISO 13528:2022, 8.6 (limits on the robust standard deviation of a round).
 * Checked by: tests/stats/sigma-pt/sigma-function.test.ts.
 * @example limitRoundSigma({ roundSd: 3, highest: 2 }).sigmaPt // => 2
 */
export function limitRoundSigma(input: LimitRoundSigmaInput): LimitRoundSigmaResult {
  const { roundSd, lowest, highest, others = {} } = input;
  const caller = 'limitRoundSigma';
  checkPositive(caller, 'standard deviation of the round', roundSd);
  if (lowest !== undefined) checkPositive(caller, 'lowest sigma_pt', lowest);
  if (highest !== undefined) checkPositive(caller, 'highest sigma_pt', highest);
  if (lowest !== undefined && highest !== undefined && lowest > highest) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires limits in order, found ${lowest} above ${highest}`,
    );
  }
  const ratios: Record<string, number> = {};
  for (const [name, value] of Object.entries(others)) {
    checkPositive(caller, name, value);
    ratios[name] = roundSd / value;
  }
  if (highest !== undefined && roundSd > highest) {
    const statement =
      'The spread of this round is above the highest allowed; the limit is taken as sigma_pt.';
    return { sigmaPt: highest, limitedBy: 'highest', ratios, statement };
  }
  if (lowest !== undefined && roundSd < lowest) {
    const statement = 'The spread of this round is below the lowest allowed; the limit is taken as sigma_pt.';
    return { sigmaPt: lowest, limitedBy: 'lowest', ratios, statement };
  }
  const statement = 'The spread of this round is within the limits and is taken as sigma_pt.';
  return { sigmaPt: roundSd, limitedBy: 'none', ratios, statement };
}
