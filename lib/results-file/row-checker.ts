import { numberFromDecimal } from '@/lib/units';
import type { ColumnName } from './columns';
import { identifyRow } from './identify-row';
import { loqWords, uncertaintyWords } from './number-words';
import { chooseUnit, type IndexedMeasurand, type PlanIndex, type UnitChoice } from './plan-index';
import { isInRange, MINUS_SIGN } from './read-number';
import { readResult, type ReadResult } from './result-cell';
import type { CheckedResult, DecimalMark, FileKind } from './result-types';
import type { Roll, RollEntry } from './roll';
import { RowCells } from './row-cells';
import { readAnalysedOn, readComment, readCoverageFactor, readMethod, readPositive } from './side-cells';
import type { Table, TableRow } from './table';

type Context = {
  table: Table;
  index: PlanIndex;
  roll: Roll;
  kind: FileKind;
  mark: DecimalMark | null;
  today: string;
};

type Amounts = { result: ReadResult; uncertainty: string | null; factor: number; loq: string | null };
type Remarks = { method: string | null; analysedOn: string | null; comment: string };

/** Checks the rows of one table; every bad cell of a row is written down, not only the first. */
export class RowChecker {
  private readonly units = new Map<string, UnitChoice>();

  constructor(private readonly context: Context) {}

  /** @returns null when the row has a problem. */
  check(tableRow: TableRow): CheckedResult | null {
    const { table, today, index } = this.context;
    const before = table.findings.problemCount;
    const row = new RowCells(tableRow, table, table.findings);
    if (!row.areReadable()) return null;
    const { entry, measurand, replicate } = identifyRow(row, this.context);
    const comment = readComment(row);
    const amounts = this.readAmounts(row, comment);
    const remarks = { method: readMethod(row, index), analysedOn: readAnalysedOn(row, today), comment };
    const exponent = measurand === null ? null : this.unitExponent(row, measurand);
    if (entry === null || measurand === null || replicate === null || exponent === null) return null;
    if (!amounts.result.ok || !areInRange(row, amounts, exponent)) return null;
    if (table.findings.problemCount > before) return null;
    noticeOddities(row, amounts.result, amounts.loq);
    return compose({ row, entry, measurand, replicate, exponent, amounts, remarks });
  }

  private readAmounts(row: RowCells, comment: string): Amounts {
    const { mark } = this.context;
    const loq = readPositive(row, 'loq', mark, loqWords(mark));
    const beside = { mark, comment, loq: loq.text, isLoqWrong: loq.isWrong };
    const result = readResult(row.text('result'), beside);
    if (!result.ok) row.refuse('result', result.code, result.expected, result.words);
    const uncertainty = readPositive(row, 'expanded_uncertainty', mark, uncertaintyWords(mark));
    const factor = readCoverageFactor(row, mark);
    return { result, uncertainty: uncertainty.text, factor, loq: loq.text };
  }

  private unitExponent(row: RowCells, measurand: IndexedMeasurand): number | null {
    const text = row.text('unit');
    const key = `${measurand.at} ${text}`;
    const choice = this.units.get(key) ?? chooseUnit(text, measurand);
    this.units.set(key, choice);
    if (!choice.ok) row.refuse('unit', choice.code, choice.expected);
    return choice.ok ? choice.exponent : null;
  }
}

/** A number can leave the range of numbers only by converting: 1e308 kg/kg in ug/kg. */
function areInRange(row: RowCells, { result, uncertainty, loq }: Amounts, exponent: number): boolean {
  const texts: [ColumnName, string | null][] = [
    ['result', result.ok ? result.text : null],
    ['expanded_uncertainty', uncertainty],
    ['loq', loq],
  ];
  let areAll = true;
  for (const [column, text] of texts) {
    if (text === null || isInRange(text, numberFromDecimal(text, exponent))) continue;
    areAll = false;
    row.refuse(column, 'out-of-range', "In the plan's unit the number is too large or too small to be kept.");
  }
  return areAll;
}

function noticeOddities(row: RowCells, result: ReadResult, loq: string | null): void {
  if (!result.ok || result.kind !== 'value' || result.text === null) return;
  const value = numberFromDecimal(result.text);
  if (result.hasMinusSign) {
    row.notice(
      'result',
      'minus-sign',
      `begins with the minus sign U+2212 ("${MINUS_SIGN}") and is read as ${result.text}.`,
    );
  }
  if (value < 0) row.notice('result', 'negative', 'is negative; it is taken as it stands.');
  if (value === 0) {
    row.notice(
      'result',
      'zero',
      'is taken as the number zero. If it was not quantified, write <LOQ or a limit.',
    );
  } else if (value > 0 && loq !== null && value < numberFromDecimal(loq)) {
    row.notice(
      'result',
      'below-loq',
      `is below the limit of quantification in the same row, ${row.text('loq')}.`,
    );
  }
}

type Parts = {
  row: RowCells;
  entry: RollEntry;
  measurand: IndexedMeasurand;
  replicate: number;
  exponent: number;
  amounts: Amounts;
  remarks: Remarks;
};

function compose({ row, entry, measurand, replicate, exponent, amounts, remarks }: Parts): CheckedResult {
  const { result, uncertainty, factor, loq } = amounts;
  const text = result.ok ? result.text : null;
  const inPlanUnit = (decimal: string | null) =>
    decimal === null ? null : numberFromDecimal(decimal, exponent);
  const inOwnUnit = (decimal: string | null) => (decimal === null ? null : numberFromDecimal(decimal));
  return {
    line: row.line,
    roundMeasurandId: measurand.roundMeasurandId,
    item: measurand.item,
    measurand: measurand.measurand,
    replicate,
    resultText: row.text('result'),
    kind: result.ok ? result.kind : 'not-measured',
    limitOrValue: inPlanUnit(text),
    valueInOwnUnit: inOwnUnit(text),
    unitText: orNull(row.text('unit')),
    unit: measurand.unit,
    expandedUncertaintyText: orNull(row.text('expanded_uncertainty')),
    expandedUncertaintyInOwnUnit: inOwnUnit(uncertainty),
    expandedUncertainty: inPlanUnit(uncertainty),
    coverageFactor: uncertainty === null ? null : factor,
    loqText: orNull(row.text('loq')),
    loq: inPlanUnit(loq),
    method: remarks.method,
    analysedOn: remarks.analysedOn,
    comment: orNull(remarks.comment),
    laboratory: entry.name,
    laboratoryId: entry.id,
  };
}

function orNull(text: string): string | null {
  return text === '' ? null : text;
}
