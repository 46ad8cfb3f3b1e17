import Link from 'next/link';
import {
  formatDate,
  formatDateTime,
  formatPlainNumber,
  formatPlainScore,
  type ScoreKind,
} from '@/lib/format';
import { Figures } from './figures';
import { Signal, SignalMark, type SignalKind } from './signal';

export type DataColumnKind = 'text' | 'number' | 'score' | 'signal' | 'link' | 'date' | 'datetime';
export type DataColumn = {
  key: string;
  label: string;
  kind: DataColumnKind;
  decimals?: number;
  scoreKind?: ScoreKind;
  compact?: boolean;
  sortable?: boolean;
};
export type LinkCell = { text: string; href: string };
export type ScoreCell = { score: number | null; signal: SignalKind; why?: string };
export type DataCell = string | number | null | LinkCell | ScoreCell;
export type DataRow = { id: string; own?: boolean; cells: Record<string, DataCell> };

export function isNumeric(kind: DataColumnKind): boolean {
  return kind === 'number' || kind === 'score';
}

/** What a column sorts by: a number where there is one; undefined, which sorts last, where nothing is. */
export function sortValue(cell: DataCell | undefined): string | number | undefined {
  if (cell === null || cell === undefined || cell === '') return undefined;
  if (typeof cell !== 'object') return cell;
  if ('href' in cell) return cell.text;
  return cell.score ?? undefined;
}

/** A result as reported ("<2.0") sorts by its figure, after the plain figure of the same size. */
export function numberToSort(value: string | number): number {
  if (typeof value === 'number') return value;
  const figure = /-?\d+(\.\d+)?([eE][+-]?\d+)?/.exec(value.replace('\u2212', '-'));
  return figure ? Number(figure[0]) : Number.NaN;
}

/** The text of a cell for filtering and copying; figures have an ASCII minus and a decimal point. */
export function cellText(column: DataColumn, cell: DataCell | undefined): string {
  if (cell === null || cell === undefined) return '';
  if (typeof cell === 'object') {
    if ('href' in cell) return cell.text;
    if (cell.score === null || cell.signal === 'not-scored') return 'not scored';
    const score = formatPlainScore(cell.score, column.scoreKind);
    return cell.signal === 'none' ? score : `${score} ${cell.signal}`;
  }
  if (typeof cell === 'number') return formatPlainNumber(cell, column.decimals ?? 0);
  if (column.kind === 'date') return formatDate(cell);
  if (column.kind === 'datetime') return formatDateTime(cell);
  if (column.kind === 'signal') return cell === 'none' ? '' : cell;
  return cell;
}

export function CellContent({
  column,
  cell,
  width,
}: {
  column: DataColumn;
  cell: DataCell | undefined;
  width: number;
}) {
  if (cell === null || cell === undefined || cell === '')
    return <span className="text-grey">{'\u2013'}</span>;
  if (typeof cell === 'object') {
    if ('href' in cell) {
      return (
        <Link href={cell.href} className="text-link inline-flex min-h-6 items-center">
          {cell.text}
        </Link>
      );
    }
    return <Signal {...cell} kind={column.scoreKind} compact={column.compact} column />;
  }
  if (column.kind === 'number')
    return <Figures value={cell} decimals={column.decimals} columnDecimals={width} />;
  if (column.kind === 'signal' && isSignal(cell)) return <SignalMark signal={cell} />;
  if (column.kind === 'date' || column.kind === 'datetime') {
    return <span className="figures">{cellText(column, cell)}</span>;
  }
  return cellText(column, cell);
}

function isSignal(cell: DataCell): cell is SignalKind {
  return cell === 'none' || cell === 'warning' || cell === 'action' || cell === 'not-scored';
}
