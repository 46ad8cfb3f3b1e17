import { example, REASON_WORDS, resultWords, withHint } from './number-words';
import type { ProblemCode } from './problem';
import { readNumber, type ReadNumber } from './read-number';
import type { DecimalMark, ResultKind } from './result-types';
import type { SideNumber } from './side-cells';

export type ReadResult =
  /** text: exact decimal text of the number or the limit; text and value are null when not measured. */
  | { ok: true; kind: ResultKind; text: string | null; value: number | null; hasMinusSign: boolean }
  /** words: what was found, when quoting the cell would not say it. */
  | { ok: false; code: ProblemCode; words: string | null; expected: string };

/** What the meaning of a result hangs on besides its own cell. */
type Beside = { mark: DecimalMark | null; comment: string; loq: SideNumber };

const OR_EQUAL = /^([<>]\s*=|[\u2264\u2265])/;
const NOT_DETECTED = /^(<\s*lod|n\.?\s*d\.?|n\/?a|not detected|-+|\u2013|\u2014)$/i;

/** Reads a trimmed result cell: a number, <LOQ, <2.0, >300, or empty with a reason in the comment. */
export function readResult(cell: string, beside: Beside): ReadResult {
  const { mark } = beside;
  if (cell === '') return readEmpty(beside);
  if (NOT_DETECTED.test(cell)) {
    const limit = example('<2.0', mark);
    return refuse(
      `Write <LOQ with the limit in the column loq, or the limit itself, such as ${limit}. ${REASON_WORDS}`,
    );
  }
  if (OR_EQUAL.test(cell)) {
    return refuse(`Write ${example('<2.0', mark)} or ${example('>300', mark)}, without "or equal".`);
  }
  const first = cell.charAt(0);
  if (first === '<' || first === '>') return readLimit(cell, cell.slice(1).trim(), beside);
  const number = readNumber(cell, mark);
  return number.ok ? { ...number, kind: 'value' } : explain(number, mark);
}

function refuse(expected: string): ReadResult {
  return { ok: false, code: 'not-a-number', words: null, expected };
}

function explain(number: Extract<ReadNumber, { ok: false }>, mark: DecimalMark | null): ReadResult {
  const expected = withHint(number.hint, number.isWholeHint, resultWords(mark));
  return { ok: false, code: number.code, words: number.words, expected };
}

function readEmpty({ comment }: Beside): ReadResult {
  if (comment !== '') return { ok: true, kind: 'not-measured', text: null, value: null, hasMinusSign: false };
  const expected = 'Write the result or, when there is none, the reason in the column comment.';
  return { ok: false, code: 'reason-missing', words: 'found an empty cell and no reason', expected };
}

/** @param rest - what stands after < or >. */
function readLimit(cell: string, rest: string, { mark, loq }: Beside): ReadResult {
  const isBelow = cell.startsWith('<');
  if (/^loq$/i.test(rest)) {
    return isBelow
      ? readBelowLoq(loq, mark)
      : refuse(`Write the limit itself, such as ${example('>300', mark)}.`);
  }
  const number = readNumber(rest, mark, cell);
  if (!number.ok) return explain(number, mark);
  if (number.value <= 0) {
    const expected = `A limit is above 0, such as ${example('<2.0', mark)}.`;
    return { ok: false, code: 'out-of-range', words: null, expected };
  }
  return { ...number, kind: isBelow ? 'below' : 'above' };
}

function readBelowLoq({ text, value, isWrong }: SideNumber, mark: DecimalMark | null): ReadResult {
  if (text !== null) return { ok: true, kind: 'below', text, value, hasMinusSign: false };
  const state = isWrong ? 'no usable number' : 'nothing';
  return {
    ok: false,
    code: 'loq-missing',
    words: `found "<LOQ", but the column loq has ${state} in this row`,
    expected: `Give the limit of quantification there, or write the limit itself, such as ${example('<2.0', mark)}.`,
  };
}
