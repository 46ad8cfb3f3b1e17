import type { Notice, Problem } from './problem';
import type { Separator } from './columns';

export type FileKind = 'laboratory' | 'whole-round';

/** The sign between units and tenths. */
export type DecimalMark = '.' | ',';

export type TextEncodingName = 'UTF-8' | 'UTF-16LE' | 'UTF-16BE' | 'Windows-1252';

/** value: a number; below and above: a limit after < or >; not-measured: empty, with the reason in the comment. */
export type ResultKind = 'value' | 'below' | 'above' | 'not-measured';

/** One row of a results file that has passed every check. */
export type CheckedResult = {
  /** The physical line of the file where the row begins, counted from 1. */
  line: number;
  roundMeasurandId: number;
  /** Codes as the plan writes them. */
  item: string;
  measurand: string;
  replicate: number;
  /** The result as the laboratory wrote it, without the spaces around it; empty when not measured. */
  resultText: string;
  kind: ResultKind;
  /** The number or the limit in the plan's unit; null when not measured. */
  limitOrValue: number | null;
  /** The same in the unit that the laboratory wrote. */
  valueInOwnUnit: number | null;
  /** The unit as written; null when the cell is empty and the plan's unit holds. */
  unitText: string | null;
  /** The plan's unit. */
  unit: string;
  expandedUncertaintyText: string | null;
  /** In the unit that the laboratory wrote. */
  expandedUncertaintyInOwnUnit: number | null;
  /** In the plan's unit. */
  expandedUncertainty: number | null;
  /** 2 when an uncertainty stands without a factor; null without an uncertainty. */
  coverageFactor: number | null;
  loqText: string | null;
  /** In the plan's unit. */
  loq: number | null;
  method: string | null;
  /** YYYY-MM-DD. */
  analysedOn: string | null;
  comment: string | null;
  /** Whole round only: the name as the provider has it, or as first written for a new one, whose id is null. */
  laboratory: string | null;
  laboratoryId: number | null;
};

export type CheckedFile = {
  /** True when nothing stands against submitting. All or nothing: take no result of a file that is not ok. */
  ok: boolean;
  /** The rows without a problem, in the order of the file. */
  results: CheckedResult[];
  /** At most MAX_PROBLEMS of them, in the order they were found. */
  problems: Problem[];
  /** How many more problems there are than are listed. */
  unlistedProblems: number;
  notices: Notice[];
  unlistedNotices: number;
  /** Null when no number of the file has decimals, or when the file mixes the two. */
  decimalMark: DecimalMark | null;
  separator: Separator | null;
  /** Rows with content, the header not counted. */
  rowCount: number;
  /** Columns of the file that are ignored, as written. */
  ignoredColumns: string[];
  /** Whole round only: laboratories that the provider does not know, as first written. */
  newLaboratories: string[];
};

/** What readResultsFile returns: the check and how the bytes were read. */
export type ReadFile = CheckedFile & {
  /** Null when the bytes are not text. */
  encoding: TextEncodingName | null;
};

/** What readResultsFile needs to know besides the plan. */
export type ReadOptions = CheckOptions & { kind: FileKind };

export type CheckOptions = {
  /** Today as YYYY-MM-DD; no analysis is dated after it. */
  today: string;
};
