import type { MeasurandCode } from '../scenario/methods';

/** One result as a laboratory is about to write it into its file. Amounts are in `unit`. */
export interface ReportedRow {
  item: string;
  measurand: MeasurandCode;
  replicate: number;
  /** Text of the cell: a number with a decimal point, or a limit such as <2.0. */
  result: string;
  unit: string;
  expandedUncertainty: string;
  coverageFactor: string;
  loq: string;
  method: string;
  analysedOn: string;
  comment: string;
}
