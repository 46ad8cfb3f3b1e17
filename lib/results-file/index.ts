export { checkResults, checkWholeRound } from './check-results';
export { COLUMNS, type ColumnName, type Separator } from './columns';
export { decodeFile, type DecodedFile } from './decode-file';
export * from './limits';
export { neutraliseCell, restoreCell } from './neutralise';
export type { PlanItem, PlanLaboratory, PlanMeasurand, ResultsPlan } from './plan';
export type { Notice, NoticeCode, Problem, ProblemCode } from './problem';
export { readResultsFile } from './read-results-file';
export { readTable } from './read-table';
export type {
  CheckedFile,
  CheckedResult,
  CheckOptions,
  DecimalMark,
  FileKind,
  ReadFile,
  ReadOptions,
  ResultKind,
  TextEncodingName,
} from './result-types';
export { resultsTemplate, wholeRoundTemplate } from './template';
export type { Table, TableRow } from './table';
export { writeCsv, type CsvColumn, type CsvOptions, type CsvRow } from './write-csv';
