import { checkFinite, checkPositive } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import { WARNING_LIMIT } from './limits';

export interface JudgeCensoredInput {
  readonly comparator: '<' | '>';
  readonly limit: number;
  readonly assignedValue: number;
  readonly sigmaPt: number;
}

export type CensoredJudgement = 'consistent' | 'inconsistent' | 'uninformative';

/**
 * Judgement of a less-than or greater-than result, which is never scored as a number.
 *
 * The limit is held against the range x_pt - 2 sigma_pt to x_pt + 2 sigma_pt, in which a number would give no
 * signal. "<L" with L below the range contradicts x_pt: inconsistent. With L inside the range (its ends included)
 * it is consistent. With L above the range it would be right for nearly any result and says nothing about x_pt:
 * uninformative. ">L" is the mirror image.
 *
 * @param input.comparator - '<' or '>'
 * @param input.limit - L, as reported. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt. Unit: unit of the data. Domain: finite.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @returns 'consistent', 'inconsistent' or 'uninformative'
 * @throws StatsError not-finite; no-spread when sigma_pt is 0; out-of-domain when it is negative
 *
 * Numerics: at the ends of the range compared on the decimal figures.
 * Source: common practice of schemes, no clause; the range is that of |z| <= 2.
 * Checked by: tests/stats/scores/judge-censored.test.ts.
 * @example judgeCensored({ comparator: '<', limit: 2, assignedValue: 10, sigmaPt: 2 }) // => 'inconsistent'
 */
export function judgeCensored({
  comparator,
  limit,
  assignedValue,
  sigmaPt,
}: JudgeCensoredInput): CensoredJudgement {
  checkFinite('judgeCensored', 'limit', limit);
  checkFinite('judgeCensored', 'assigned value', assignedValue);
  checkPositive('judgeCensored', 'sigma_pt', sigmaPt);
  const position = ratioAtLimit({
    caller: 'judgeCensored',
    value: limit,
    assignedValue,
    parts: [sigmaPt],
    limits: [WARNING_LIMIT],
  });
  const towards = comparator === '<' ? position : -position;
  if (towards < -WARNING_LIMIT) return 'inconsistent';
  return towards > WARNING_LIMIT ? 'uninformative' : 'consistent';
}
