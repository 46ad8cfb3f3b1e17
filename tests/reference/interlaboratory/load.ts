import { readFileSync } from 'node:fs';
import path from 'node:path';
import Papa from 'papaparse';

export interface DataOfCheck {
  readonly file: string;
  readonly column: string;
  readonly group?: string;
  readonly reduce?: 'group_mean';
  readonly where?: Readonly<Record<string, unknown>>;
  readonly not?: Readonly<Record<string, unknown>>;
}

export interface RoundCheck {
  readonly id: string;
  readonly method: string;
  readonly data: DataOfCheck | null;
  readonly params: Readonly<Record<string, number>> | null;
  readonly value: number;
  readonly tolerance: number;
  readonly source: string;
  readonly provenance: string;
  readonly recomputed: number | null;
}

export interface Figure {
  readonly value: number;
  readonly tolerance: number;
  readonly provenance: string;
  readonly source?: string;
  readonly reproduced?: boolean;
}

export interface TrialCheck {
  readonly id: string;
  readonly computed: Figure;
  readonly published?: readonly Figure[];
}

export type Row = Readonly<Record<string, string>>;

function read(name: string): string {
  return readFileSync(path.join(import.meta.dirname, name), 'utf8');
}

export function loadRoundChecks(): readonly RoundCheck[] {
  return (JSON.parse(read('rounds-and-trials.checks.json')) as { checks: RoundCheck[] }).checks;
}

/** Checks kept beside the estimators that functions for rounds and trials must meet too. */
export function loadSharedChecks(): readonly RoundCheck[] {
  const { checks } = JSON.parse(read('../proficiency/estimators.json')) as { checks: RoundCheck[] };
  const shared = /^(q_method|q_hampel_x|rsz|ssz|count_abs_gt)$/;
  return checks.filter(({ id, method }) => shared.test(method) && /^(creosote|antibody|allergen)/.test(id));
}

export function loadTrialChecks(name: string): readonly TrialCheck[] {
  return (JSON.parse(read(`${name}.checks.json`)) as { checks: TrialCheck[] }).checks;
}

export function loadRows(file: string): readonly Row[] {
  return Papa.parse<Row>(read(`data/${file}`), { header: true, comments: '#', skipEmptyLines: true }).data;
}

const listed = (row: Row, [key, wanted]: [string, unknown]) =>
  [wanted]
    .flat()
    .map(String)
    .includes(row[key] ?? '');

function rowsOf({ file, where = {}, not = {} }: DataOfCheck): readonly Row[] {
  return loadRows(file)
    .filter((row) => Object.entries(where).every((condition) => listed(row, condition)))
    .filter((row) => !Object.entries(not).some((condition) => listed(row, condition)));
}

/** Values by group, in order of first appearance. */
export function grouped(rows: readonly Row[], group: string, column: string): Map<string, number[]> {
  const groups = new Map<string, number[]>();
  for (const row of rows) {
    const key = row[group] ?? '';
    groups.set(key, [...(groups.get(key) ?? []), Number(row[column])]);
  }
  return groups;
}

export function groupsOf(data: DataOfCheck): Map<string, number[]> {
  return grouped(rowsOf(data), data.group ?? '', data.column);
}

/** The numbers of a check: its column, or the means of its groups. */
export function valuesOf(data: DataOfCheck): number[] {
  if (data.reduce !== 'group_mean') return rowsOf(data).map((row) => Number(row[data.column]));
  return [...groupsOf(data).values()].map((own) => own.reduce((sum, value) => sum + value, 0) / own.length);
}

/** published | published, from memory | computed, as the provenance begins. */
export function authority(provenance: string): string {
  if (provenance.startsWith('published, from memory')) return 'published, from memory';
  return provenance.startsWith('published') ? 'published' : 'computed';
}
