import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import Papa from 'papaparse';

export interface Figure {
  readonly value: number;
  readonly tolerance: number;
  readonly provenance: string;
  readonly source?: string;
  readonly note?: string;
  readonly reproduced?: boolean;
}

export interface Check {
  readonly id: string;
  readonly computed: Figure;
  readonly published?: readonly Figure[];
}

const folder = import.meta.dirname;

/** Names of all data sets that have a file of checks. */
export function dataSets(): string[] {
  const ending = '.checks.json';
  const files = readdirSync(path.join(folder, 'checks')).filter((file) => file.endsWith(ending));
  return files.map((file) => file.slice(0, -ending.length)).sort();
}

export function loadChecks(name: string): readonly Check[] {
  const text = readFileSync(path.join(folder, 'checks', `${name}.checks.json`), 'utf8');
  return (JSON.parse(text) as { checks: Check[] }).checks;
}

export type Table = (column: string) => number[];

/** The columns of a data file, by name. */
export function loadTable(name: string): Table {
  const text = readFileSync(path.join(folder, 'data', `${name}.csv`), 'utf8');
  const rows = Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true }).data;
  return (column) =>
    rows.map((row) => {
      const value = Number(row[column]);
      if (!Number.isFinite(value)) throw new Error(`${name} has no number in column ${column}`);
      return value;
    });
}

/** published | published, from memory | computed, as the provenance begins. */
export function authority(provenance: string): string {
  if (provenance.startsWith('published, from memory')) return 'published, from memory';
  return provenance.startsWith('published') ? 'published' : 'computed';
}
