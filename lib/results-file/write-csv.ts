import Papa from 'papaparse';
import type { Separator } from './columns';
import { neutraliseCell } from './neutralise';
import type { DecimalMark } from './result-types';

export type CsvColumn = {
  /** Name of the field in a row. */
  key: string;
  /** Text of the header; default the key. */
  header?: string;
};

export type CsvRow = Readonly<Record<string, string | number | null | undefined>>;

export type CsvOptions = {
  /** Default comma. */
  separator?: Separator;
  /** How numbers are written; texts stay as they are. Default the point. */
  decimalMark?: DecimalMark;
};

/**
 * Writes rows as CSV by RFC 4180 with a header and CRLF after every line, the last one too.
 *
 * Cells that a spreadsheet would run as a formula begin with an apostrophe (see neutraliseCell). Missing values and
 * numbers that are not finite are empty cells. No byte-order mark: the caller puts one before where a spreadsheet
 * is the reader.
 */
export function writeCsv(
  rows: readonly CsvRow[],
  columns: readonly (string | CsvColumn)[],
  { separator = ',', decimalMark = '.' }: CsvOptions = {},
): string {
  const shaped = columns.map((column) => (typeof column === 'string' ? { key: column } : column));
  const fields = shaped.map(({ key, header }: CsvColumn) => neutraliseCell(header ?? key));
  const data = rows.map((row) => shaped.map(({ key }) => cellText(row[key], decimalMark)));
  const config = { delimiter: separator, newline: '\r\n', quotes: needsQuotes };
  return `${Papa.unparse([fields, ...data], config)}\r\n`;
}

function cellText(value: string | number | null | undefined, decimalMark: DecimalMark): string {
  if (typeof value !== 'number') return neutraliseCell(value ?? '');
  if (!Number.isFinite(value)) return '';
  return decimalMark === ',' ? String(value).replace('.', ',') : String(value);
}

/** Beyond what the library quotes: a lone CR or LF would end the row for some readers. */
function needsQuotes(value: unknown): boolean {
  return typeof value === 'string' && /[\r\n"]/.test(value);
}
