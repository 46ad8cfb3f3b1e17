import { cellText, type DataColumn, type DataRow } from './data-cells';

/** Rows as tab-separated text with a header line, ready to paste into a spreadsheet. */
export function toTabSeparated(columns: DataColumn[], rows: DataRow[]): string {
  const header = columns.map((column) => clean(column.label)).join('\t');
  const lines = rows.map((row) =>
    columns.map((column) => neutralise(clean(cellText(column, row.cells[column.key])))).join('\t'),
  );
  return [header, ...lines].join('\n');
}

function clean(text: string): string {
  return text.replace(/\s*[\t\r\n]+\s*/g, ' ');
}

/** Text that a spreadsheet would run as a formula gets an apostrophe in front; a plain number does not. */
function neutralise(text: string): string {
  if (!/^[=+\-@]/.test(text)) return text;
  return /^[+-]?\d+(\.\d+)?([eE][+-]?\d+)?( (warning|action))?$/.test(text) ? text : `'${text}`;
}
