import type { ColumnName } from './columns';
import { readDate } from './date-cell';
import { listNames } from './header';
import { DEFAULT_COVERAGE_FACTOR, MAX_COMMENT, MAX_COVERAGE_FACTOR, MIN_COVERAGE_FACTOR } from './limits';
import { withHint } from './number-words';
import type { PlanIndex } from './plan-index';
import { readNumber } from './read-number';
import type { DecimalMark } from './result-types';
import type { RowCells } from './row-cells';

/** text: exact decimal text; null, as the value, when the cell is empty or was refused. */
export type SideNumber = { text: string | null; value: number | null; isWrong: boolean };

const NONE: SideNumber = { text: null, value: null, isWrong: false };
const WRONG: SideNumber = { text: null, value: null, isWrong: true };

/** Reads a cell that is empty or holds a number above 0. */
export function readPositive(
  row: RowCells,
  column: ColumnName,
  mark: DecimalMark | null,
  words: () => string,
): SideNumber {
  const cell = row.text(column);
  if (cell === '') return NONE;
  const number = readNumber(cell, mark);
  if (number.ok && number.value > 0) return { text: number.text, value: number.value, isWrong: false };
  if (number.ok) row.refuse(column, 'out-of-range', words());
  else row.refuse(column, number.code, withHint(number.hint, number.isWholeHint, words()), number.words);
  return WRONG;
}

const factorWords = () => `Write a number from ${MIN_COVERAGE_FACTOR} to ${MAX_COVERAGE_FACTOR}, such as 2.`;

export function readCoverageFactor(row: RowCells, mark: DecimalMark | null): number {
  const factor = readPositive(row, 'coverage_factor', mark, factorWords).value;
  if (factor === null) return DEFAULT_COVERAGE_FACTOR;
  if (factor < MIN_COVERAGE_FACTOR || factor > MAX_COVERAGE_FACTOR) {
    row.refuse('coverage_factor', 'out-of-range', factorWords());
  }
  return factor;
}

export function readMethod(row: RowCells, index: PlanIndex): string | null {
  const text = row.text('method');
  if (text === '' || index.methods === null) return text === '' ? null : text;
  const method = index.methods.find(text);
  if (method !== undefined) return method;
  const codes = index.methods.codes();
  const expected =
    codes.length === 0
      ? 'The laboratory has no method sheets yet: write one first, or leave the cell empty.'
      : `The method sheets are ${listNames(codes)}.`;
  row.refuse('method', 'unknown-method', expected);
  return null;
}

export function readAnalysedOn(row: RowCells, today: string): string | null {
  const text = row.text('analysed_on');
  if (text === '') return null;
  const date = readDate(text, today);
  if (!date.ok) row.refuse('analysed_on', date.code, date.expected);
  return date.ok ? text : null;
}

export function readComment(row: RowCells): string {
  const text = row.text('comment');
  if (text.length <= MAX_COMMENT) return text;
  const length = [...text].length;
  if (length > MAX_COMMENT) {
    const words = `the comment has ${length.toLocaleString('en-GB')} characters`;
    row.refuse('comment', 'comment-too-long', `At most ${MAX_COMMENT} are kept.`, words);
  }
  return text;
}
