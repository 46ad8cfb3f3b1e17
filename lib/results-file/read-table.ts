import Papa from 'papaparse';
import type { Separator } from './columns';
import { SEPARATORS } from './columns';
import { chooseSeparator, readHeader, separatorLine } from './header';
import { MAX_LINE, MAX_ROWS } from './limits';
import { neverParsed } from './line-problems';
import { Findings } from './problem';
import { restoreCell } from './neutralise';
import { CONTROL_CODE } from './row-cells';
import type { FileKind } from './result-types';
import { findLongLine, findQuoteDefect, type LineDefect } from './scan-lines';
import type { Table, TableRow } from './table';

const HAS_CONTENT = /[^\s,;"]/;

/**
 * Splits the text of a file into rows under a header: comma, semicolon or tab, any kind of line end, RFC 4180
 * quotes. A line break within a quoted cell is read as a line feed.
 *
 * Reading goes on past rows of the wrong length, so that all of them are listed; it stops at what would make the
 * rest of the file unreadable.
 */
export function readTable(text: string, kind: FileKind = 'laboratory'): Table {
  const findings = new Findings();
  const lines = cutEmptyEnd(text.replace(/\r\n?/g, '\n'));
  const long = findLongLine(lines);
  if (long !== null) return refuseLine(long, null, findings);
  const separator = findSeparator(lines);
  const quote = findQuoteDefect(lines, separator);
  if (quote !== null) return refuseLine(quote, separator, findings);
  const gatherer = new RowGatherer(separator, kind, findings);
  Papa.parse<string[]>(lines, {
    delimiter: separator,
    newline: '\n',
    step: ({ data }, parser) => {
      if (!gatherer.take(data)) parser.abort();
    },
  });
  return { ...gatherer.finish(), hasControlCodes: CONTROL_CODE.test(lines) };
}

function refuseLine(defect: LineDefect, separator: Separator | null, findings: Findings): Table {
  neverParsed(defect, findings);
  return { ...EMPTY, separator, findings };
}

const EMPTY = {
  usable: false,
  header: [],
  columns: new Map(),
  ignoredColumns: [],
  rows: [],
  rowCount: 0,
  hasControlCodes: false,
} satisfies Partial<Table>;

/** Spreadsheets write out a million empty rows when a cell far down was once used. */
function cutEmptyEnd(text: string): string {
  let last = text.length - 1;
  while (last >= 0 && ' \t\n,;'.includes(text.charAt(last))) last -= 1;
  const end = text.indexOf('\n', last + 1);
  // The closing line feed spares the parser a quote followed by spaces at the very end.
  return `${end === -1 ? text : text.slice(0, end)}\n`;
}

/** The first line with content is the header, or a line that tells the separator. */
function findSeparator(text: string): Separator {
  for (let start = 0; start < text.length;) {
    const feed = text.indexOf('\n', start);
    const end = feed === -1 ? text.length : feed;
    const line = text.slice(start, Math.min(end, start + MAX_LINE));
    const told = separatorLine(line);
    const separator = SEPARATORS.find((candidate) => candidate === told);
    if (separator !== undefined) return separator;
    if (told === null && HAS_CONTENT.test(line)) return chooseSeparator(line);
    start = end + 1;
  }
  return SEPARATORS.find((candidate) => text.includes(candidate)) ?? ',';
}

const isEmptyRow = (cells: readonly string[]): boolean => cells.every((cell) => cell.trim() === '');

/** Takes the rows one after the other and keeps count of the physical lines. */
class RowGatherer {
  private line = 1;
  private table: Table;
  private readonly rows: TableRow[] = [];
  private rowCount = 0;
  private headerLine: number | null = null;

  constructor(
    private readonly separator: Separator,
    private readonly kind: FileKind,
    private readonly findings: Findings,
  ) {
    this.table = { ...EMPTY, separator, findings };
  }

  /** @returns false when nothing more is to be read. */
  take(cells: readonly string[]): boolean {
    const line = this.line;
    this.line += 1 + lineFeedsIn(cells);
    if (isEmptyRow(cells)) return true;
    if (this.headerLine === null) return this.takeHeader(line, cells);
    this.rowCount += 1;
    if (this.rowCount > MAX_ROWS) return this.refuseTooMany();
    if (cells.length === this.table.header.length) this.rows.push({ line, cells: restoreRow(cells) });
    else this.complainOfLength(line, cells);
    return true;
  }

  finish(): Table {
    if (this.headerLine === null) {
      this.findings.problem({
        code: 'empty-file',
        found: '',
        foundWords: 'the file holds nothing but empty rows',
        expected: 'Write a header line and one row for each result.',
      });
    }
    if (this.table.usable && this.rowCount === 0) {
      this.findings.problem({
        code: 'no-rows',
        found: '',
        foundWords: 'the file has a header and no rows under it',
        expected: 'Write one row for each result.',
      });
      return { ...this.table, usable: false };
    }
    return { ...this.table, rows: this.table.usable ? this.rows : [], rowCount: this.rowCount };
  }

  private takeHeader(line: number, cells: readonly string[]): boolean {
    if (separatorLine(cells.join(this.separator)) !== null) return true;
    this.headerLine = line;
    const { separator, kind, findings } = this;
    const { columns, ignored } = readHeader({ line, cells, separator, kind }, findings);
    const usable = findings.problemCount === 0;
    const header = cells.map((cell) => cell.trim());
    this.table = { ...this.table, usable, header, columns, ignoredColumns: ignored };
    return usable;
  }

  private refuseTooMany(): boolean {
    const most = MAX_ROWS.toLocaleString('en-GB');
    this.findings.problem({
      code: 'too-many-rows',
      found: `more than ${most} rows`,
      foundWords: `the file has more than ${most} rows`,
      expected: `At most ${most} rows are taken. Divide the file.`,
    });
    this.table = { ...this.table, usable: false };
    return false;
  }

  private complainOfLength(line: number, cells: readonly string[]): void {
    const wanted = this.table.header.length;
    const comma =
      cells.length > wanted && this.separator === ','
        ? ' A decimal comma or a comma in a comment needs quotation marks around the cell.'
        : '';
    this.findings.problem({
      code: 'row-length',
      line,
      found: `${cells.length} cells`,
      foundWords: `found ${cells.length} ${cells.length === 1 ? 'cell' : 'cells'} where the header has ${wanted}`,
      expected: `Write one cell for each column, empty ones too.${comma}`,
    });
  }
}

function restoreRow(cells: readonly string[]): readonly string[] {
  return cells.some((cell) => cell.startsWith("'")) ? cells.map(restoreCell) : cells;
}

function lineFeedsIn(cells: readonly string[]): number {
  let count = 0;
  for (const cell of cells) {
    for (let at = cell.indexOf('\n'); at !== -1; at = cell.indexOf('\n', at + 1)) count += 1;
  }
  return count;
}
