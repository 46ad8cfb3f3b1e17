/** A decimal number as text, with a point: sign, digits, exponent. Linear in the length, also for what does not match. */
const DECIMAL = /^([+-]?)(\d+(?:\.\d*)?|\.\d+)(?:[eE]([+-]?\d{1,6}))?$/;
/** Past this many places the shifted text keeps an exponent instead of a row of zeros. */
const MOST_ZEROS = 30;

export function isDecimalText(text: string): boolean {
  return DECIMAL.test(text);
}

/**
 * The number nearest to text x 10^exponent.
 *
 * The shift goes into the exponent of the text, so that the only rounding is that of the reading:
 * 0.1 shifted by 3 is 100, where 0.1 * 1000 could be off in the last place for other digits.
 *
 * @returns NaN when the text is no decimal number; Infinity or 0 when it is out of the range of numbers.
 */
export function numberFromDecimal(text: string, exponent = 0): number {
  if (!DECIMAL.test(text)) return Number.NaN;
  const value = Number(exponent === 0 ? text : withExponent(text, exponent));
  return value === 0 ? 0 : value;
}

function withExponent(text: string, exponent: number): string {
  const at = text.search(/e/i);
  return at === -1 ? `${text}e${exponent}` : `${text.slice(0, at)}e${Number(text.slice(at + 1)) + exponent}`;
}

/** True when every digit is 0, however it is written. */
export function isZeroText(text: string): boolean {
  return !/[1-9]/.test(DECIMAL.exec(text)?.[2] ?? '1');
}

/** text x 10^exponent as decimal text; all digits are kept, trailing zeros too ("1.20" shifted by 3 is "1200"). */
export function shiftDecimal(text: string, exponent: number): string {
  const parts = DECIMAL.exec(text);
  if (parts === null) throw new RangeError('shiftDecimal requires a decimal number');
  const [whole = '', fraction = ''] = (parts[2] ?? '').split('.');
  const digits = whole + fraction;
  const point = whole.length + Number(parts[3] ?? 0) + exponent;
  const sign = parts[1] === '-' ? '-' : '';
  if (point > digits.length + MOST_ZEROS || point < -MOST_ZEROS) {
    return `${sign}${digits.replace(/^0+(?=\d)/, '')}e${point - digits.length}`;
  }
  const padded = digits.padStart(digits.length + Math.max(0, 1 - point), '0');
  const at = point < 1 ? 1 : point;
  const before = padded
    .slice(0, at)
    .padEnd(at, '0')
    .replace(/^0+(?=\d)/, '');
  const after = padded.slice(at);
  return `${sign}${before}${after === '' ? '' : `.${after}`}`;
}
