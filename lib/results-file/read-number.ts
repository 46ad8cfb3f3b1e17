import { isDecimalText, isZeroText, numberFromDecimal } from '@/lib/units';
import { explainNumber, OUT_OF_RANGE, type Explanation } from './explain-number';
import type { DecimalMark } from './result-types';

export type ReadNumber =
  /** text: decimal text with a point and a hyphen, exact. */
  { ok: true; text: string; value: number; hasMinusSign: boolean } | ({ ok: false } & Explanation);

/** U+2212, the minus sign of typesetting, which spreadsheets and word processors put for the hyphen. */
export const MINUS_SIGN = '\u2212';

/**
 * Reads a trimmed cell as a finite decimal number under the decimal mark of the file.
 *
 * @param shown - what a complaint quotes, when the number is only a part of its cell.
 */
export function readNumber(cell: string, mark: DecimalMark | null, shown = cell): ReadNumber {
  const hasMinusSign = cell.startsWith(MINUS_SIGN);
  const signed = hasMinusSign ? `-${cell.slice(1)}` : cell;
  const text = mark === ',' ? signed.replace('.', '?').replace(',', '.') : signed;
  if (!isDecimalText(text)) return { ok: false, ...explainNumber(cell, shown) };
  const value = numberFromDecimal(text);
  if (!isInRange(text, value)) return { ok: false, ...OUT_OF_RANGE };
  return { ok: true, text, value, hasMinusSign };
}

/** False for 1e999, which reads as infinity, and for 1e-999, which reads as nothing. */
export function isInRange(text: string, value: number): boolean {
  return Number.isFinite(value) && (value !== 0 || isZeroText(text));
}
