import type { ColumnName } from './columns';
import { MAX_CELL } from './limits';
import type { Findings, NoticeCode, ProblemCode } from './problem';
import { nameCharacter, quoteFound } from './quote-found';
import type { Table, TableRow } from './table';

/** Control codes other than the tab and the line feed, which RFC 4180 cells may hold. */
export const CONTROL_CODE = /[\u0000-\u0008\u000b-\u001f\u007f-\u009f]/;

/** The cells of one row by column name, and the way to complain of them. */
export class RowCells {
  readonly line: number;
  private readonly cells: readonly string[];

  constructor(
    row: TableRow,
    private readonly table: Table,
    private readonly findings: Findings,
  ) {
    this.line = row.line;
    this.cells = row.cells;
  }

  /** Without the white space around it, no-break spaces included; empty when the file has no such column. */
  text(column: ColumnName): string {
    const index = this.table.columns.get(column);
    return index === undefined ? '' : (this.cells[index] ?? '').trim();
  }

  /** @param words - what was found, when quoting the cell would not say it. */
  refuse(column: ColumnName, code: ProblemCode, expected: string, words?: string | null): void {
    const foundWords = words ?? undefined;
    this.findings.problem({ code, line: this.line, column, found: this.text(column), expected, foundWords });
  }

  refuseRow(code: ProblemCode, found: string, words: string, expected: string): void {
    this.findings.problem({ code, line: this.line, found, foundWords: words, expected });
  }

  notice(column: ColumnName, code: NoticeCode, words: string): void {
    this.findings.notice(code, this.line, column, `${quoteFound(this.text(column))} ${words}`);
  }

  /** False when a cell is too long or holds control codes; such a row is not looked at further. */
  areReadable(): boolean {
    let isReadable = true;
    for (const [column, index] of this.table.columns) {
      const cell = this.cells[index] ?? '';
      if (cell.length > MAX_CELL) {
        isReadable = false;
        const size = cell.length.toLocaleString('en-GB');
        const most = MAX_CELL.toLocaleString('en-GB');
        this.refuse(
          column,
          'cell-too-long',
          `A cell has at most ${most}.`,
          `the cell has ${size} characters`,
        );
      } else if (this.table.hasControlCodes && CONTROL_CODE.test(cell.trim())) {
        isReadable = false;
        const control = nameCharacter(CONTROL_CODE.exec(cell.trim())?.[0] ?? '');
        const words = `found the control code ${control.slice(1, -1)} in ${quoteFound(cell.trim())}`;
        this.refuse(column, 'control-character', 'Delete the character that cannot be seen.', words);
      }
    }
    return isReadable;
  }
}
