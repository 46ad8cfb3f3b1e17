import { numberFromDecimal } from '@/lib/units';
import type { ColumnName } from './columns';
import { identifyRow } from './identify-row';
import { positiveWords } from './number-words';
import { chooseUnit, type IndexedMeasurand, type PlanIndex, type UnitChoice } from './plan-index';
import { isInRange, MINUS_SIGN } from './read-number';
import { readResult, type ReadResult } from './result-cell';
import type { CheckedResult, DecimalMark, FileKind } from './result-types';
import type { Roll, RollEntry } from './roll';
import { RowCells } from './row-cells';
import {
  readAnalysedOn,
  readComment,
  readCoverageFactor,
  readMethod,
  readPositive,
  type SideNumber,
} from './side-cells';
import type { Table, TableRow } from './table';

type Context = {
  table: Table;
  index: PlanIndex;
  roll: Roll;
  kind: FileKind;
  mark: DecimalMark | null;
  today: string;
};

type Amounts = { result: ReadResult; uncertainty: SideNumber; factor: number; loq: SideNumber };
type PlanAmounts = { value: number | null; uncertainty: number | null; loq: number | null };
type Remarks = { method: string | null; analysedOn: string | null; comment: string };

/** Checks the rows of one table; every bad cell of a row is written down, not only the first. */
export class RowChecker {
  private readonly units = new Map<IndexedMeasurand, Map<string, UnitChoice>>();
  private readonly uncertaintyWords: () => string;
  private readonly loqWords: () => string;

  constructor(private readonly context: Context) {
    this.uncertaintyWords = () => positiveWords('0.8', context.mark);
    this.loqWords = () => positiveWords('2.0', context.mark);
  }

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
    const converted = convertAmounts(row, amounts, exponent);
    if (table.findings.problemCount > before) return null;
    noticeOddities(row, amounts);
    return compose({ row, entry, measurand, replicate, amounts, converted, remarks });
  }

  private readAmounts(row: RowCells, comment: string): Amounts {
    const { mark } = this.context;
    const loq = readPositive(row, 'loq', mark, this.loqWords);
    const result = readResult(row.text('result'), { mark, comment, loq });
    if (!result.ok) row.refuse('result', result.code, result.expected, result.words);
    const uncertainty = readPositive(row, 'expanded_uncertainty', mark, this.uncertaintyWords);
    const factor = readCoverageFactor(row, mark);
    return { result, uncertainty, factor, loq };
  }

  private unitExponent(row: RowCells, measurand: IndexedMeasurand): number | null {
    const text = row.text('unit');
    const choices = this.units.get(measurand) ?? new Map<string, UnitChoice>();
    const choice = choices.get(text) ?? chooseUnit(text, measurand);
    if (!choices.has(text)) this.units.set(measurand, choices.set(text, choice));
    if (!choice.ok) row.refuse('unit', choice.code, choice.expected);
    return choice.ok ? choice.exponent : null;
  }
}

function convertAmounts(row: RowCells, { result, uncertainty, loq }: Amounts, exponent: number): PlanAmounts {
  return {
    value: result.ok ? convertAmount(row, 'result', result, exponent) : null,
    uncertainty: convertAmount(row, 'expanded_uncertainty', uncertainty, exponent),
    loq: convertAmount(row, 'loq', loq, exponent),
  };
}

type Amount = { text: string | null; value: number | null };

/** A number that is in range as written can leave it by converting: 1e308 kg/kg in ug/kg. */
function convertAmount(
  row: RowCells,
  column: ColumnName,
  { text, value }: Amount,
  exponent: number,
): number | null {
  if (text === null || exponent === 0) return value;
  const converted = numberFromDecimal(text, exponent);
  if (!isInRange(text, converted)) {
    row.refuse(column, 'out-of-range', "In the plan's unit the number is too large or too small to be kept.");
  }
  return converted;
}

function noticeOddities(row: RowCells, { result, loq }: Amounts): void {
  if (!result.ok || result.kind !== 'value' || result.value === null) return;
  if (result.hasMinusSign) {
    const words = `begins with the minus sign U+2212 ("${MINUS_SIGN}") and is read as ${result.text}.`;
    row.notice('result', 'minus-sign', words);
  }
  if (result.value < 0) row.notice('result', 'negative', 'is negative; it is taken as it stands.');
  if (result.value === 0) {
    const words = 'is taken as the number zero. If it was not quantified, write <LOQ or a limit.';
    row.notice('result', 'zero', words);
  } else if (result.value > 0 && loq.value !== null && result.value < loq.value) {
    const words = `is below the limit of quantification in the same row, ${row.text('loq')}.`;
    row.notice('result', 'below-loq', words);
  }
}

type Parts = {
  row: RowCells;
  entry: RollEntry;
  measurand: IndexedMeasurand;
  replicate: number;
  amounts: Amounts;
  converted: PlanAmounts;
  remarks: Remarks;
};

function compose({ row, entry, measurand, replicate, amounts, converted, remarks }: Parts): CheckedResult {
  const { result, uncertainty, factor } = amounts;
  return {
    line: row.line,
    roundMeasurandId: measurand.roundMeasurandId,
    item: measurand.item,
    measurand: measurand.measurand,
    replicate,
    resultText: row.text('result'),
    kind: result.ok ? result.kind : 'not-measured',
    limitOrValue: converted.value,
    valueInOwnUnit: result.ok ? result.value : null,
    unitText: orNull(row.text('unit')),
    unit: measurand.unit,
    expandedUncertaintyText: orNull(row.text('expanded_uncertainty')),
    expandedUncertaintyInOwnUnit: uncertainty.value,
    expandedUncertainty: converted.uncertainty,
    coverageFactor: uncertainty.value === null ? null : factor,
    loqText: orNull(row.text('loq')),
    loq: converted.loq,
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
