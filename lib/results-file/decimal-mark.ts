import { DECIMAL_COLUMNS, type ColumnName } from './columns';
import type { Findings } from './problem';
import { quoteFound } from './quote-found';
import type { DecimalMark } from './result-types';
import type { Table } from './table';

/** A number with one decimal mark, with or without < or > before it. */
const ONE_MARK = /^[<>]?\s*[+\-\u2212]?(\d*)([.,])(\d*)(?:[eE][+-]?\d+)?$/;

type Evidence = { line: number; column: ColumnName; text: string; mark: DecimalMark; isGroupLike: boolean };

/** What a cell says about the decimal mark; null when it is no number with one mark. */
function evidenceOf(line: number, column: ColumnName, cell: string): Evidence | null {
  if (!cell.includes('.') && !cell.includes(',')) return null;
  const text = cell.trim();
  const parts = ONE_MARK.exec(text);
  if (parts === null) return null;
  const [, whole = '', mark = '', fraction = ''] = parts;
  if (whole === '' && fraction === '') return null;
  const isGroupLike =
    /^[1-9]\d{0,2}$/.test(whole) && /^\d{3}$/.test(fraction) && /\d$/.test(text) && !/e/i.test(text);
  return { line, column, text, mark: mark === ',' ? ',' : '.', isGroupLike };
}

export type DecidedMark = { ok: true; mark: DecimalMark | null } | { ok: false };

/**
 * Decides the decimal mark of the whole file from every number in it. A file that has both is refused.
 *
 * "1,234" alone is one thousand or one and a bit. Where a comma separates the cells too, or a tab does, nothing
 * in the file tells which, and the wrong guess is a factor of a thousand: it is refused. A semicolon between the
 * cells tells of a decimal comma.
 */
export function decideDecimalMark(table: Table, findings: Findings): DecidedMark {
  const first: Partial<Record<DecimalMark, Evidence>> = {};
  let isCommaCertain = false;
  const places = DECIMAL_COLUMNS.flatMap((column) => {
    const index = table.columns.get(column);
    return index === undefined ? [] : [{ column, index }];
  });
  for (const { line, cells } of table.rows) {
    for (const { column, index } of places) {
      const evidence = evidenceOf(line, column, cells[index] ?? '');
      if (evidence === null) continue;
      first[evidence.mark] ??= evidence;
      if (evidence.mark === ',' && !evidence.isGroupLike) isCommaCertain = true;
      const other = first[evidence.mark === ',' ? '.' : ','];
      if (other !== undefined) return refuseMixed(other, evidence, findings);
    }
  }
  const comma = first[','];
  if (comma === undefined) return { ok: true, mark: first['.'] ? '.' : null };
  if (!isCommaCertain && table.separator !== ';') return refuseAmbiguous(comma, findings);
  if (!isCommaCertain) {
    findings.notice(
      'decimal-comma',
      comma.line,
      comma.column,
      `${quoteFound(comma.text)} is read with a decimal comma, not as thousands.`,
    );
  }
  return { ok: true, mark: ',' };
}

const MARK_WORDS: Record<DecimalMark, string> = { '.': 'a decimal point', ',': 'a decimal comma' };

function refuseMixed(earlier: Evidence, later: Evidence, findings: Findings): DecidedMark {
  findings.problem({
    code: 'mixed-decimal-marks',
    line: later.line,
    column: later.column,
    found: later.text,
    foundWords:
      `found ${quoteFound(later.text)} with ${MARK_WORDS[later.mark]}, ` +
      `but line ${earlier.line}, ${earlier.column}, has ${quoteFound(earlier.text)} with ${MARK_WORDS[earlier.mark]}`,
    expected: 'Use one decimal mark in the whole file, and no mark between thousands.',
  });
  return { ok: false };
}

function refuseAmbiguous(comma: Evidence, findings: Findings): DecidedMark {
  const bare = comma.text.replace(/^[<>]\s*/, '');
  findings.problem({
    code: 'ambiguous-decimal-comma',
    line: comma.line,
    column: comma.column,
    found: comma.text,
    foundWords: `found ${quoteFound(comma.text)}, which could be ${bare.replace(',', '.')} or ${bare.replace(',', '')}`,
    expected:
      'Write numbers with a decimal point and no mark between thousands, or put semicolons between the cells.',
  });
  return { ok: false };
}
