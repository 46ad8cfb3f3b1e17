import { listNames } from './header';
import type { CodeIndex } from './code-index';
import type { IndexedMeasurand, PlanIndex } from './plan-index';
import { MAX_LABORATORY } from './limits';
import { quoteFound } from './quote-found';
import type { RowCells } from './row-cells';
import type { FileKind } from './result-types';
import type { Roll, RollEntry } from './roll';

export type RowIdentity = { entry: RollEntry; measurand: IndexedMeasurand; replicate: number };

const CODES_SHOWN = 12;

function shownCodes(codes: readonly string[]): string {
  const rest = codes.length - CODES_SHOWN;
  return rest > 0 ? `${codes.slice(0, CODES_SHOWN).join(', ')} and ${rest} more` : listNames(codes);
}

/** Finds which result of whom a row is. Null when that cannot be told; the reasons are written down. */
export function identifyRow(
  row: RowCells,
  { index, roll, kind }: { index: PlanIndex; roll: Roll; kind: FileKind },
): { entry: RollEntry | null; measurand: IndexedMeasurand | null; replicate: number | null } {
  const entry = findEntry(row, roll, kind);
  const measurand = findMeasurand(row, index);
  const replicate = measurand === null ? null : findReplicate(row, measurand);
  if (entry !== null && measurand !== null && replicate !== null) {
    refuseRepeated(row, roll, { entry, measurand, replicate });
  }
  return { entry, measurand, replicate };
}

function findEntry(row: RowCells, roll: Roll, kind: FileKind): RollEntry | null {
  const text = kind === 'whole-round' ? row.text('laboratory') : '';
  if (kind === 'whole-round' && text === '') {
    row.refuse(
      'laboratory',
      'empty-cell',
      'Write the name or the code of the laboratory.',
      'found an empty cell',
    );
    return null;
  }
  if (text.length > MAX_LABORATORY) {
    const words = `found a name of ${text.length} characters`;
    row.refuse('laboratory', 'cell-too-long', `A name has at most ${MAX_LABORATORY}.`, words);
    return null;
  }
  return roll.entryOf(text);
}

function refuseUnknown(row: RowCells, column: 'item' | 'measurand', index: CodeIndex<unknown>): void {
  const isEmpty = row.text(column) === '';
  const words = isEmpty ? 'found an empty cell' : null;
  const codes = index.codes();
  const code = isEmpty ? 'empty-cell' : column === 'item' ? 'unknown-item' : 'unknown-measurand';
  const expected =
    codes.length === 0
      ? `The plan of this round has no ${column}s yet.`
      : `The plan has ${shownCodes(codes)}.`;
  row.refuse(column, code, expected, words);
}

function findMeasurand(row: RowCells, index: PlanIndex): IndexedMeasurand | null {
  const item = index.items.find(row.text('item'));
  const code = row.text('measurand');
  if (item === undefined) refuseUnknown(row, 'item', index.items);
  if (index.measurands.find(code) === undefined) {
    refuseUnknown(row, 'measurand', index.measurands);
    return null;
  }
  if (item === undefined) return null;
  const measurand = item.measurands.find(code);
  if (measurand !== undefined) return measurand;
  const there = item.measurands.codes();
  const expected =
    there.length === 0 ? 'It asks for nothing there.' : `There it asks for ${shownCodes(there)}.`;
  const words = `found ${quoteFound(code)}, which the plan does not ask for in item ${item.code}`;
  row.refuse('measurand', 'not-in-item', expected, words);
  return null;
}

function findReplicate(row: RowCells, measurand: IndexedMeasurand): number | null {
  const text = row.text('replicate');
  if (text === '') return 1;
  const replicate = /^\d{1,6}$/.test(text) ? Number(text) : Number.NaN;
  if (replicate >= 1 && replicate <= measurand.replicates) return replicate;
  const expected =
    measurand.replicates === 1
      ? 'The plan asks for one result here: write 1 or leave the cell empty.'
      : `Write a whole number from 1 to ${measurand.replicates}.`;
  row.refuse('replicate', 'bad-replicate', expected);
  return null;
}

function refuseRepeated(row: RowCells, roll: Roll, { entry, measurand, replicate }: RowIdentity): void {
  const earlier = roll.mark(entry, measurand.at, replicate, row.line);
  if (earlier === null) return;
  const whose = entry.name === null ? '' : `${entry.name}, `;
  const what = `${whose}${measurand.item}, ${measurand.measurand}, replicate ${replicate}`;
  const expected =
    measurand.replicates === 1
      ? 'Keep one of the two rows.'
      : `Keep one of the two rows, or number the replicates from 1 to ${measurand.replicates}.`;
  row.refuseRow('duplicate-row', what, `${what}, stands on line ${earlier} already`, expected);
}
