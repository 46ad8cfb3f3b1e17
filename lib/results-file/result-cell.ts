import { readNumber, type ReadNumber } from './read-number';
import { REASON_WORDS, resultWords, example } from './number-words';
import type { ProblemCode } from './problem';
import type { DecimalMark, ResultKind } from './result-types';

export type ReadResult =
  | { ok: true; kind: ResultKind; text: string | null; hasMinusSign: boolean }
  /** words: what was found, when quoting the cell would not say it. */
  | { ok: false; code: ProblemCode; words: string | null; expected: string };

/** The other columns of the row that the meaning of a result hangs on. */
type Beside = {
  mark: DecimalMark | null;
  comment: string;
  /** Decimal text of the loq column; null when that is empty or wrong. */
  loq: string | null;
  /** True when the loq column has a complaint of its own. */
  isLoqWrong: boolean;
};

const LIMIT = /^([<>])\s*(.*)$/;
const NOT_DETECTED = /^(<\s*lod|n\.?\s*d\.?|n\/?a|not detected|nicht nachweisbar|-+|\u2013|\u2014)$/i;

/** Reads a trimmed result cell: a number, <LOQ, <2.0, >300, or empty with a reason in the comment. */
export function readResult(cell: string, beside: Beside): ReadResult {
  if (cell === '') return readEmpty(beside);
  const limit = LIMIT.exec(cell);
  if (limit !== null && !NOT_DETECTED.test(cell)) return readLimit(limit[1] === '<', limit[2] ?? '', beside);
  if (/^[\u2264\u2265]/.test(cell)) return refuseOrEqual(beside);
  if (NOT_DETECTED.test(cell)) return refuseNotDetected(beside);
  const number = readNumber(cell, beside.mark);
  if (!number.ok) return explain(number, beside);
  return { ok: true, kind: 'value', text: number.text, hasMinusSign: number.hasMinusSign };
}

function explain(number: Extract<ReadNumber, { ok: false }>, { mark }: Beside): ReadResult {
  const expected = number.hint === '' ? resultWords(mark) : `${number.hint} ${resultWords(mark)}`;
  return { ok: false, code: number.code, words: number.words, expected };
}

function readEmpty({ comment, mark }: Beside): ReadResult {
  if (comment !== '') return { ok: true, kind: 'not-measured', text: null, hasMinusSign: false };
  const expected = `${resultWords(mark)} ${REASON_WORDS}`;
  return { ok: false, code: 'reason-missing', words: 'found an empty cell and no reason', expected };
}

function readLimit(isBelow: boolean, rest: string, beside: Beside): ReadResult {
  const kind = isBelow ? 'below' : 'above';
  const { mark } = beside;
  if (rest.startsWith('=')) return refuseOrEqual(beside);
  if (/^loq$/i.test(rest)) {
    if (!isBelow) {
      const expected = `Write the limit itself, such as ${example('>300', mark)}.`;
      return { ok: false, code: 'not-a-number', words: null, expected };
    }
    return readBelowLoq(beside);
  }
  const number = readNumber(rest, mark);
  if (!number.ok) return explain({ ...number, words: null }, beside);
  if (number.value <= 0) {
    return {
      ok: false,
      code: 'out-of-range',
      words: null,
      expected: `A limit is above 0, such as ${example('<2.0', mark)}.`,
    };
  }
  return { ok: true, kind, text: number.text, hasMinusSign: false };
}

function readBelowLoq({ loq, isLoqWrong, mark }: Beside): ReadResult {
  if (loq !== null) return { ok: true, kind: 'below', text: loq, hasMinusSign: false };
  const state = isLoqWrong ? 'no usable number' : 'nothing';
  return {
    ok: false,
    code: 'loq-missing',
    words: `found "<LOQ", but the column loq has ${state} in this row`,
    expected: `Give the limit of quantification there, or write the limit itself, such as ${example('<2.0', mark)}.`,
  };
}

function refuseOrEqual({ mark }: Beside): ReadResult {
  const expected = `Write ${example('<2.0', mark)} or ${example('>300', mark)}, without "or equal".`;
  return { ok: false, code: 'not-a-number', words: null, expected };
}

function refuseNotDetected({ mark }: Beside): ReadResult {
  const expected = `Write <LOQ with the limit in the column loq, or the limit itself, such as ${example('<2.0', mark)}. ${REASON_WORDS}`;
  return { ok: false, code: 'not-a-number', words: null, expected };
}
