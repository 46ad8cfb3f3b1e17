import { writeCsv, type CsvRow } from '@/lib/results-file';
import type { Habits } from './habits';
import type { ReportedRow } from './reported-row';

const COLUMNS = [
  'item',
  'measurand',
  'replicate',
  'result',
  'unit',
  { key: 'expandedUncertainty', header: 'expanded_uncertainty' },
  { key: 'coverageFactor', header: 'coverage_factor' },
  'loq',
  'method',
  { key: 'analysedOn', header: 'analysed_on' },
  'comment',
];
const BYTE_ORDER_MARK = '\uFEFF';
const AMOUNTS = ['result', 'expandedUncertainty', 'loq'] as const;

function withDecimalComma(row: ReportedRow): ReportedRow {
  const changed = { ...row };
  for (const key of AMOUNTS) changed[key] = row[key].replace('.', ',');
  return changed;
}

/** The bytes of a laboratory's file, in its own manner of writing. */
export function resultsCsv(rows: readonly ReportedRow[], habits: Habits): Uint8Array {
  const shaped: CsvRow[] = rows.map((row) => ({
    ...(habits.decimalMark === ',' ? withDecimalComma(row) : row),
  }));
  const text = writeCsv(shaped, COLUMNS, { separator: habits.separator });
  return new TextEncoder().encode(habits.hasByteOrderMark ? BYTE_ORDER_MARK + text : text);
}
