import { formatSignificant } from '@/lib/format';
import type { CheckedResult, Notice, Problem, Table } from '@/lib/results-file';

export type PreviewNote = { kind: 'problem' | 'notice'; text: string };
export type PreviewCell = { text: string; notes: PreviewNote[] };
export type PreviewRow = { line: number; cells: PreviewCell[]; notes: PreviewNote[] };
export type PreviewColumn = { key: string; label: string; numeric: boolean };
export type Preview = { columns: PreviewColumn[]; rows: PreviewRow[]; unshown: number };

/** Rows of a preview; a longer file is told to be longer. */
export const MAX_PREVIEW_ROWS = 200;
const VALUE_DIGITS = 12;

type Column = PreviewColumn & { of: (row: CheckedResult) => string };

const COLUMNS: Column[] = [
  { key: 'laboratory', label: 'laboratory', numeric: false, of: (row) => row.laboratory ?? '' },
  { key: 'item', label: 'item', numeric: false, of: (row) => row.item },
  { key: 'measurand', label: 'measurand', numeric: false, of: (row) => row.measurand },
  { key: 'replicate', label: 'replicate', numeric: true, of: (row) => String(row.replicate) },
  { key: 'result', label: 'result as written', numeric: true, of: asWritten },
  { key: 'unit', label: 'taken as', numeric: true, of: asTaken },
  {
    key: 'expanded_uncertainty',
    label: 'uncertainty as written',
    numeric: true,
    of: (row) => row.expandedUncertaintyText ?? '',
  },
  {
    key: 'coverage_factor',
    label: 'k',
    numeric: true,
    of: (row) => (row.coverageFactor === null ? '' : String(row.coverageFactor)),
  },
  { key: 'loq', label: 'LOQ as written', numeric: true, of: (row) => row.loqText ?? '' },
  { key: 'method', label: 'method', numeric: false, of: (row) => row.method ?? '' },
  { key: 'analysed_on', label: 'analysed on', numeric: false, of: (row) => row.analysedOn ?? '' },
  { key: 'comment', label: 'comment', numeric: false, of: (row) => row.comment ?? '' },
];

function asWritten(row: CheckedResult): string {
  if (row.kind === 'not-measured') return 'not measured';
  return row.unitText ? `${row.resultText} ${row.unitText}` : row.resultText;
}

function asTaken(row: CheckedResult): string {
  if (row.limitOrValue === null) return '';
  const sign = row.kind === 'below' ? '<' : row.kind === 'above' ? '>' : '';
  return `${sign}${formatSignificant(row.limitOrValue, VALUE_DIGITS)} ${row.unit}`;
}

/** The rows of a good file with the number that each result was taken as; columns without any content are left out. */
export function previewOfResults(results: readonly CheckedResult[], notices: readonly Notice[]): Preview {
  const columns = COLUMNS.filter((column) => results.some((row) => column.of(row) !== ''));
  const notes = gatherNotes([], notices);
  const rows = results.slice(0, MAX_PREVIEW_ROWS).map(({ line, ...row }) => ({
    line,
    cells: columns.map((column) => ({
      text: column.of({ line, ...row }),
      notes: notes.at(line, column.key),
    })),
    notes: notes.ofLine(line, (key) => columns.some((column) => column.key === key)),
  }));
  return { columns: columns.map(plainColumn), rows, unshown: results.length - rows.length };
}

const plainColumn = ({ key, label, numeric }: Column): PreviewColumn => ({ key, label, numeric });

/** The rows of a file as they stand in it, with what is wrong at the cell where it is wrong. */
export function previewOfTable(
  table: Pick<Table, 'header' | 'columns' | 'rows'>,
  problems: readonly Problem[],
  notices: readonly Notice[],
): Preview {
  const names = new Map([...table.columns].map(([name, index]) => [index, name as string]));
  const keys = table.header.map((label, index) => names.get(index) ?? label);
  const notes = gatherNotes(problems, notices);
  const cellsOf = new Map(table.rows.map((row) => [row.line, row.cells]));
  // A row of the wrong length has no cells under the header; it still has a line to point to.
  const lines = [...new Set([...cellsOf.keys(), ...notes.problemLines])].sort((a, b) => a - b);
  const isLong = lines.length > MAX_PREVIEW_ROWS;
  const shown = isLong ? lines.filter((line) => notes.problemLines.has(line)) : lines;
  const rows = shown.slice(0, MAX_PREVIEW_ROWS).map((line) => {
    const cells = cellsOf.get(line) ?? [];
    return {
      line,
      cells: cells.map((text, index) => ({ text, notes: notes.at(line, keys[index] ?? '') })),
      notes: notes.ofLine(line, (key) => cells.length > 0 && keys.includes(key)),
    };
  });
  const columns = table.header.map((label, index) => ({
    key: `${index}`,
    label,
    numeric: COLUMNS.find((column) => column.key === keys[index])?.numeric ?? false,
  }));
  return { columns, rows, unshown: lines.length - rows.length };
}

/** Notes by line and column; a note about a line without a column, or with one that is not shown, goes to the line. */
function gatherNotes(problems: readonly Problem[], notices: readonly Notice[]) {
  const placed: { line: number; column: string | null; note: PreviewNote }[] = [];
  for (const { line, column, found, expected, message } of problems) {
    if (line === null) continue;
    const text =
      column === null ? afterPlace(message) : `Found ${found === '' ? 'nothing' : `"${found}"`}. ${expected}`;
    placed.push({ line, column, note: { kind: 'problem', text } });
  }
  for (const { line, column, message } of notices) {
    if (line !== null) placed.push({ line, column, note: { kind: 'notice', text: afterPlace(message) } });
  }
  const byLine = groupByLine(placed);
  return {
    problemLines: new Set(placed.filter(({ note }) => note.kind === 'problem').map(({ line }) => line)),
    at: (line: number, column: string) =>
      (byLine.get(line) ?? []).filter((entry) => entry.column === column).map((entry) => entry.note),
    ofLine: (line: number, isShown: (column: string) => boolean) =>
      (byLine.get(line) ?? [])
        .filter((entry) => entry.column === null || !isShown(entry.column))
        .map((entry) => entry.note),
  };
}

function groupByLine<T extends { line: number }>(entries: readonly T[]): Map<number, T[]> {
  const groups = new Map<number, T[]>();
  for (const entry of entries) {
    const group = groups.get(entry.line);
    if (group) group.push(entry);
    else groups.set(entry.line, [entry]);
  }
  return groups;
}

/** A note in its place need not say the place again. */
function afterPlace(message: string): string {
  const rest = message.replace(/^Line \d+(, [a-z_]+)?: /, '');
  return rest.charAt(0).toUpperCase() + rest.slice(1);
}
