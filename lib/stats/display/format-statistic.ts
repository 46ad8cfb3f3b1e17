import { toDecimal } from '../internal/decimal';
import { checkFinite } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface FormatOptions {
  readonly ties?: 'even' | 'away';
}

/**
 * A number as text with a fixed number of decimals, rounded as a person would round what is written.
 *
 * The built-in toFixed rounds the binary value, so 0.285 and 1.005 go the wrong way; here the shortest decimal
 * text of the number decides.
 *
 * @param value - the number. Domain: finite.
 * @param decimals - digits after the point. Domain: whole, 0 to 100.
 * @param options.ties - what to do half-way. Default 'even' (ISO 80000-1, rule A); 'away' is rule B.
 * @returns plain decimal text, with a hyphen-minus, never "-0", never an exponent
 * @throws StatsError not-finite; out-of-domain for a senseless number of decimals
 *
 * Numerics: exact whole-number arithmetic on the decimal digits.
 * Source: ISO 80000-1:2022, Annex B.
 * Checked by: tests/stats/display/format-statistic.test.ts.
 * @example formatStatistic(0.285, 2) // => '0.28'
 */
export function formatStatistic(
  value: number,
  decimals: number,
  { ties = 'even' }: FormatOptions = {},
): string {
  checkFinite('formatStatistic', 'number', value);
  if (!Number.isInteger(decimals) || decimals < 0 || decimals > 100) {
    throw new StatsError('out-of-domain', `formatStatistic requires 0 to 100 decimals, found ${decimals}`);
  }
  const { digits, exponent } = toDecimal(Math.abs(value));
  const shift = exponent + decimals;
  const scaled =
    shift >= 0 ? digits * 10n ** BigInt(shift) : roundedQuotient(digits, 10n ** BigInt(-shift), ties);
  const text = scaled.toString().padStart(decimals + 1, '0');
  const cut = text.length - decimals;
  const body = decimals === 0 ? text : `${text.slice(0, cut)}.${text.slice(cut)}`;
  return value < 0 && scaled !== 0n ? `-${body}` : body;
}

function roundedQuotient(dividend: bigint, divisor: bigint, ties: 'even' | 'away'): bigint {
  const quotient = dividend / divisor;
  const twice = 2n * (dividend - quotient * divisor);
  if (twice < divisor) return quotient;
  if (twice > divisor) return quotient + 1n;
  return ties === 'away' || quotient % 2n === 1n ? quotient + 1n : quotient;
}
