import { isDecimalText, isZeroText, numberFromDecimal } from '@/lib/units';
import { explainNumber } from './explain-number';
import type { ProblemCode } from './problem';
import type { DecimalMark } from './result-types';

export type ReadNumber =
  /** text: decimal text with a point and a hyphen, exact. */
  | { ok: true; text: string; value: number; hasMinusSign: boolean }
  | { ok: false; code: ProblemCode; words: string | null; hint: string };

/** U+2212, the minus sign of typesetting, which spreadsheets and word processors put for the hyphen. */
export const MINUS_SIGN = '\u2212';

/** Reads a trimmed cell as a finite decimal number under the decimal mark of the file. */
export function readNumber(cell: string, mark: DecimalMark | null): ReadNumber {
  const hasMinusSign = cell.startsWith(MINUS_SIGN);
  const signed = hasMinusSign ? `-${cell.slice(1)}` : cell;
  const text = mark === ',' ? signed.replace('.', '?').replace(',', '.') : signed;
  if (!isDecimalText(text)) return { ok: false, ...explainNumber(cell) };
  const value = numberFromDecimal(text);
  if (!isInRange(text, value)) {
    return {
      ok: false,
      code: 'out-of-range',
      words: null,
      hint: 'The number is too large or too small to be kept.',
    };
  }
  return { ok: true, text, value, hasMinusSign };
}

/** False for 1e999, which reads as infinity, and for 1e-999, which reads as nothing. */
export function isInRange(text: string, value: number): boolean {
  return Number.isFinite(value) && (value !== 0 || isZeroText(text));
}
