import type { FileKind } from './result-types';

export type Separator = ',' | ';' | '\t';

export const SEPARATORS: readonly Separator[] = [',', ';', '\t'];

/** The columns of a results file, in the order in which we write them. */
export const COLUMNS = [
  'laboratory',
  'item',
  'measurand',
  'replicate',
  'result',
  'unit',
  'expanded_uncertainty',
  'coverage_factor',
  'loq',
  'method',
  'analysed_on',
  'comment',
] as const;

export type ColumnName = (typeof COLUMNS)[number];

/** The columns in which a number may have decimals. */
export const DECIMAL_COLUMNS = ['result', 'expanded_uncertainty', 'coverage_factor', 'loq'] as const;

export function requiredColumns(kind: FileKind): ColumnName[] {
  const always: ColumnName[] = ['item', 'measurand', 'result'];
  return kind === 'whole-round' ? ['laboratory', ...always] : always;
}

/** A laboratory's own file has no column laboratory: whose it is, the sign-in says. */
export function knownColumns(kind: FileKind): ColumnName[] {
  return COLUMNS.filter((name) => kind === 'whole-round' || name !== 'laboratory');
}

export const SEPARATOR_WORDS: Record<Separator, string> = { ',': 'comma', ';': 'semicolon', '\t': 'tab' };
