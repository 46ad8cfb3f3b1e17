import type { DataColumn, DataRow } from '@/components/ui/data-table';
import { formatSignificant } from '@/lib/format';

export interface ResultOfCode {
  participantCode: string;
  roundMeasurandId: number;
  replicate: number;
  resultText: string;
  kind: 'value' | 'below' | 'above' | 'not-measured';
  value: number | null;
  ownUnit: string;
  uncertaintyText: string;
  expandedUncertainty: number | null;
  coverageFactor: number | null;
  loq: number | null;
  method: string;
  analysedOn: string | null;
  comment: string;
}

export interface PlannedColumn {
  id: number;
  itemCode: string;
  code: string;
  unit: string;
}

const DIGITS = 12;
const SIGNS = { value: '', below: '<', above: '>', 'not-measured': '' };

/** The result in the plan's unit, as the laboratory wrote it where the units agree. */
export function inPlanUnit(result: ResultOfCode, unit: string): string {
  if (result.value === null) return 'not measured';
  const isSame = result.ownUnit === unit;
  const text = isSame ? result.resultText : `${SIGNS[result.kind]}${formatSignificant(result.value, DIGITS)}`;
  return text.replace(/,/g, '.');
}

export function asWritten(result: ResultOfCode): string {
  return result.value === null ? '' : `${result.resultText} ${result.ownUnit}`;
}

/** One row a participant and one column a measurand; what was reported in another unit stands in brackets. */
export function resultsMatrix(
  measurands: readonly PlannedColumn[],
  results: readonly ResultOfCode[],
): { columns: DataColumn[]; rows: DataRow[] } {
  const columns: DataColumn[] = [
    { key: 'code', label: 'Code', kind: 'text' },
    ...measurands.map(({ id, itemCode, code, unit }) => ({
      key: String(id),
      label: `${itemCode} ${code} (${unit})`,
      kind: 'number' as const,
    })),
  ];
  const units = new Map(measurands.map(({ id, unit }) => [id, unit]));
  const rows = new Map<string, DataRow>();
  for (const result of results) {
    const unit = units.get(result.roundMeasurandId) ?? '';
    const row = rows.get(result.participantCode) ?? {
      id: result.participantCode,
      cells: { code: result.participantCode },
    };
    rows.set(result.participantCode, row);
    const key = String(result.roundMeasurandId);
    const isSame = result.value === null || result.ownUnit === unit;
    const text = isSame ? inPlanUnit(result, unit) : `${inPlanUnit(result, unit)} (${asWritten(result)})`;
    const before = row.cells[key];
    row.cells[key] = typeof before === 'string' ? `${before}; ${text}` : text;
  }
  return { columns, rows: [...rows.values()] };
}

/** Everything that was reported for one measurand, one row a result. */
export function resultsOfMeasurand(
  { id, unit }: PlannedColumn,
  results: readonly ResultOfCode[],
): { columns: DataColumn[]; rows: DataRow[] } {
  const own = results.filter((result) => result.roundMeasurandId === id);
  const all: (DataColumn & { of: (result: ResultOfCode) => string | number | null })[] = [
    { key: 'code', label: 'Code', kind: 'text', of: (result) => result.participantCode },
    { key: 'replicate', label: 'Replicate', kind: 'number', of: (result) => result.replicate },
    { key: 'written', label: 'As written', kind: 'text', of: asWritten },
    { key: 'value', label: `Result (${unit})`, kind: 'number', of: (result) => inPlanUnit(result, unit) },
    {
      key: 'U',
      label: `U (${unit})`,
      kind: 'number',
      of: ({ expandedUncertainty }) =>
        expandedUncertainty === null ? null : formatSignificant(expandedUncertainty, DIGITS),
    },
    {
      key: 'k',
      label: 'k',
      kind: 'number',
      of: ({ coverageFactor }) => coverageFactor && String(coverageFactor),
    },
    {
      key: 'loq',
      label: `LOQ (${unit})`,
      kind: 'number',
      of: ({ loq }) => loq && formatSignificant(loq, DIGITS),
    },
    { key: 'method', label: 'Method', kind: 'text', of: ({ method }) => method },
    { key: 'analysedOn', label: 'Analysed on', kind: 'date', of: ({ analysedOn }) => analysedOn },
    { key: 'comment', label: 'Comment', kind: 'text', of: ({ comment }) => comment },
  ];
  const isKept = (key: string) => ['code', 'written', 'value'].includes(key);
  const used = all.filter(({ key, of }) =>
    key === 'replicate'
      ? own.some((result) => result.replicate > 1)
      : isKept(key) || own.some((result) => of(result) !== null && of(result) !== ''),
  );
  return {
    columns: used.map(({ key, label, kind }) => ({ key, label, kind })),
    rows: own.map((result) => ({
      id: `${result.participantCode}-${result.replicate}`,
      cells: Object.fromEntries(used.map(({ key, of }) => [key, of(result)])),
    })),
  };
}
