import type { DecimalMark } from './result-types';

/** An example in the decimal mark of the file: advice to write 12.5 would spoil a file with decimal commas. */
export function example(text: string, mark: DecimalMark | null): string {
  return mark === ',' ? text.replace('.', ',') : text;
}

/** What a result cell may hold. */
export function resultWords(mark: DecimalMark | null): string {
  if (mark === ',') {
    return 'Write a number such as 12,5 or <2,0 or >300 or <LOQ; the unit belongs in the column unit.';
  }
  return 'Write a number such as 12.5, <2.0, >300 or <LOQ; the unit belongs in the column unit.';
}

/** What expanded_uncertainty and loq may hold. */
export function positiveWords(text: string, mark: DecimalMark | null): string {
  return `Write a number above 0, such as ${example(text, mark)}, in the unit of the result.`;
}

/** A hint about the cell, and the general words where the hint leaves something open. */
export function withHint(hint: string, isWholeHint: boolean, general: string): string {
  if (hint === '') return general;
  return isWholeHint ? hint : `${hint} ${general}`;
}

export const REASON_WORDS =
  'If nothing was measured, leave it empty and give the reason in the column comment.';
