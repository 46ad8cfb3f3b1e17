import type { ColumnName, Separator } from './columns';
import type { Findings } from './problem';

export type TableRow = {
  /** The physical line where the row begins, counted from 1. */
  line: number;
  /** As many as the header has. */
  cells: readonly string[];
};

/** The rows of a file under its header, not yet checked against a plan. */
export type Table = {
  /** False when the rows cannot be read under the header: nothing more can be said of the file. */
  usable: boolean;
  separator: Separator | null;
  /** The header as written, trimmed. */
  header: readonly string[];
  /** Where each column that we know stands. */
  columns: ReadonlyMap<ColumnName, number>;
  ignoredColumns: readonly string[];
  rows: readonly TableRow[];
  /** True when some cell holds control codes other than tabs and line breaks. */
  hasControlCodes: boolean;
  /** Rows with content, those with a problem included. */
  rowCount: number;
  /** What was found while reading; checking goes on with these. */
  findings: Findings;
};
