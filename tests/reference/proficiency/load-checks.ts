import { readFileSync } from 'node:fs';
import path from 'node:path';
import Papa from 'papaparse';

interface DataOfCheck {
  readonly file: string;
  readonly column: string;
  readonly group?: string;
  readonly reduce?: 'group_mean';
  readonly where?: Readonly<Record<string, unknown>>;
  readonly not?: Readonly<Record<string, unknown>>;
}

export interface Check {
  readonly id: string;
  readonly method: string;
  readonly data: DataOfCheck | null;
  readonly params: Readonly<Record<string, number | string>> | null;
  readonly value: number;
  readonly tolerance: number;
  readonly source: string;
  readonly provenance: string;
  readonly recomputed: number | null;
}

type Row = Readonly<Record<string, string>>;

function read(name: string): string {
  return readFileSync(path.join(import.meta.dirname, name), 'utf8');
}

export function loadChecks(): readonly Check[] {
  return (JSON.parse(read('checks.json')) as { checks: Check[] }).checks;
}

export function loadRows(file: string): readonly Row[] {
  return Papa.parse<Row>(read(`data/${file}`), { header: true, comments: '#', skipEmptyLines: true }).data;
}

export function loadColumn(file: string, column: string): number[] {
  return loadRows(file).map((row) => Number(row[column]));
}

const listed = (row: Row, [key, wanted]: [string, unknown]) =>
  [wanted]
    .flat()
    .map(String)
    .includes(row[key] ?? '');

/** The rows of a check, with its `where` and `not` applied. */
export function rowsOf({ file, where = {}, not = {} }: DataOfCheck): readonly Row[] {
  return loadRows(file)
    .filter((row) => Object.entries(where).every((condition) => listed(row, condition)))
    .filter((row) => !Object.entries(not).some((condition) => listed(row, condition)));
}

/** The numbers of a check: its column, or the means of its groups. */
export function valuesOf(data: DataOfCheck): number[] {
  const rows = rowsOf(data);
  if (data.reduce !== 'group_mean') return rows.map((row) => Number(row[data.column]));
  const groups = new Map<string, number[]>();
  for (const row of rows) {
    const key = row[data.group ?? ''] ?? '';
    groups.set(key, [...(groups.get(key) ?? []), Number(row[data.column])]);
  }
  return [...groups.values()].map((group) => group.reduce((sum, value) => sum + value, 0) / group.length);
}
