'use client';

import { useMemo, type ReactNode } from 'react';
import { CopyButton } from './copy-button';
import { cx } from './cx';
import { CellContent, isNumeric, type DataColumn, type DataRow } from './data-cells';
import { CONTROL_STYLE } from './field';
import { columnDecimals } from './figures';
import { OWN_ROW, Table, Td, Th } from './table';
import { toTabSeparated } from './tab-separated';
import { useDataTable } from './use-data-table';

export type { DataCell, DataColumn, DataRow, LinkCell, ScoreCell } from './data-cells';
export type DataTableProps = {
  caption: ReactNode;
  hideCaption?: boolean;
  columns: DataColumn[];
  rows: DataRow[];
  sortBy?: { key: string; descending?: boolean };
  filterLabel?: string;
  empty?: ReactNode;
};

type Sorted = false | 'asc' | 'desc';
const ARIA_SORT = { asc: 'ascending', desc: 'descending' } as const;

export function DataTable({
  caption,
  hideCaption,
  columns,
  rows,
  sortBy,
  filterLabel = 'Filter rows',
  empty = 'No row has this text.',
}: DataTableProps) {
  const table = useDataTable(columns, rows, sortBy);
  const shown = table.getRowModel().rows;
  const widths = useMemo(
    () => new Map(columns.map((column) => [column.key, widthOf(column, rows)])),
    [columns, rows],
  );
  return (
    <div>
      <Toolbar
        label={filterLabel}
        filter={String(table.state.globalFilter ?? '')}
        onFilter={(text) => table.setGlobalFilter(text)}
        shown={shown.length}
        total={rows.length}
        copy={() =>
          toTabSeparated(
            columns,
            shown.map((row) => row.original),
          )
        }
      />
      <Table caption={caption} hideCaption={hideCaption}>
        <thead>
          <tr>
            {columns.map((column) => (
              <HeaderCell
                key={column.key}
                column={column}
                sorted={table.getColumn(column.key)?.getIsSorted() ?? false}
                onSort={() => table.getColumn(column.key)?.toggleSorting()}
              />
            ))}
          </tr>
        </thead>
        <tbody>
          {shown.map(({ original: row }) => (
            <tr key={row.id} className={cx('hover:bg-paper-wash', row.own && OWN_ROW)}>
              {columns.map((column) => (
                <Td key={column.key} numeric={isNumeric(column.kind)}>
                  <CellContent
                    column={column}
                    cell={row.cells[column.key]}
                    width={widths.get(column.key) ?? 0}
                  />
                </Td>
              ))}
            </tr>
          ))}
          {shown.length === 0 && (
            <tr>
              <Td colSpan={columns.length} className="text-ink-soft">
                {empty}
              </Td>
            </tr>
          )}
        </tbody>
      </Table>
    </div>
  );
}

function widthOf(column: DataColumn, rows: DataRow[]): number {
  const values = rows.map((row) => row.cells[column.key] ?? null);
  return columnDecimals(
    values.map((value) => (typeof value === 'object' ? null : value)),
    column.decimals,
  );
}

type ToolbarProps = {
  label: string;
  filter: string;
  onFilter: (text: string) => void;
  shown: number;
  total: number;
  copy: () => string;
};

function Toolbar({ label, filter, onFilter, shown, total, copy }: ToolbarProps) {
  return (
    <div className="no-print mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
      <input
        type="search"
        aria-label={label}
        placeholder={label}
        value={filter}
        onChange={(event) => onFilter(event.target.value)}
        className={cx(CONTROL_STYLE, 'max-w-64')}
      />
      <span aria-live="polite" className="figures text-sm text-ink-soft">
        {shown === total ? `${total} rows` : `${shown} of ${total} rows`}
      </span>
      <span className="ml-auto">
        <CopyButton text={copy} label="Copy as text" />
      </span>
    </div>
  );
}

type HeaderCellProps = { column: DataColumn; sorted: Sorted; onSort: () => void };

function HeaderCell({ column, sorted, onSort }: HeaderCellProps) {
  const numeric = isNumeric(column.kind);
  // Signals stand to the right of the figures; the heading stays over the figures.
  const inset = column.kind === 'score' ? (column.compact ? 'pr-8.5' : 'pr-24.5') : '';
  if (column.sortable === false) {
    return (
      <Th numeric={numeric} className={inset}>
        {column.label}
      </Th>
    );
  }
  return (
    <Th numeric={numeric} className={inset} aria-sort={sorted ? ARIA_SORT[sorted] : undefined}>
      <button
        type="button"
        onClick={onSort}
        className="inline-flex min-h-6 cursor-pointer items-baseline gap-1 text-inherit hover:text-press-strong"
      >
        {column.label}
        <SortMark sorted={sorted} />
      </button>
    </Th>
  );
}

function SortMark({ sorted }: { sorted: Sorted }) {
  return (
    <svg viewBox="0 0 8 12" aria-hidden="true" className="h-[0.75em] shrink-0">
      <path d="M4 1 7 5H1Z" className={sorted === 'asc' ? 'fill-ink' : 'fill-rule-strong'} />
      <path d="M4 11 1 7h6Z" className={sorted === 'desc' ? 'fill-ink' : 'fill-rule-strong'} />
    </svg>
  );
}
