import type { ReportedRow } from '../generate/reported-row';
import type { MeasurandCode } from './methods';
import { UNIT } from './schemes';

export type Change = (rows: readonly ReportedRow[]) => ReportedRow[];

const DILUTION_FACTOR = 5;

function decimals(text: string): number {
  return text.split('.')[1]?.length ?? 0;
}

function scaled(text: string, factor: number): string {
  return text === '' || text.startsWith('<') ? text : (Number(text) * factor).toFixed(decimals(text));
}

/** Changes the results of one measurand in one item; a story that names what the file does not have is wrong. */
function inRow(item: string, measurand: MeasurandCode, change: (row: ReportedRow) => ReportedRow): Change {
  const isMeant = (row: ReportedRow) => row.item === item && row.measurand === measurand;
  return (rows) => {
    if (!rows.some(isMeant))
      throw new Error(`the story changes ${item} ${measurand}, which is not in the file`);
    return rows.map((row) => (isMeant(row) ? change(row) : { ...row }));
  };
}

export function multiplied(item: string, measurand: MeasurandCode, factor: number): Change {
  return inRow(item, measurand, (row) => ({
    ...row,
    result: scaled(row.result, factor),
    expandedUncertainty: scaled(row.expandedUncertainty, factor),
  }));
}

/** The dilution of the filtrate was left out of the sum: the result is too low by its factor. */
export const withoutDilution = (item: string, measurand: MeasurandCode) =>
  multiplied(item, measurand, 1 / DILUTION_FACTOR);

/** The figure of the instrument in mg/kg, entered as it stands under the unit of the plan. */
export const unitOfThePlan = (item: string, measurand: MeasurandCode) =>
  inRow(item, measurand, (row) => ({ ...row, unit: UNIT }));

/** The two portions changed places on the bench; what only one of the items is asked for stays where it is. */
export function swapped(first: string, second: string): Change {
  const other: Record<string, string> = { [first]: second, [second]: first };
  return (rows) =>
    rows.map((row) => {
      const item = other[row.item];
      const isInBoth = rows.some((entry) => entry.item === item && entry.measurand === row.measurand);
      return item !== undefined && isInBoth ? { ...row, item } : { ...row };
    });
}

export function aboveRange(item: string, measurand: MeasurandCode, limit: number): Change {
  return inRow(item, measurand, (row) => ({
    ...row,
    result: `>${limit}`,
    expandedUncertainty: '',
    coverageFactor: '',
  }));
}

export function notMeasured(item: string, measurand: MeasurandCode, comment: string): Change {
  return inRow(item, measurand, (row) => ({
    ...row,
    result: '',
    expandedUncertainty: '',
    coverageFactor: '',
    comment,
  }));
}

/** Measured once, written twice. */
export function sameReplicates(rows: readonly ReportedRow[]): ReportedRow[] {
  const firstOf = (row: ReportedRow) =>
    rows.find(
      (other) => other.item === row.item && other.measurand === row.measurand && other.replicate === 1,
    );
  return rows.map((row) => ({ ...row, result: firstOf(row)?.result ?? row.result }));
}
