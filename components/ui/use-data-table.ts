'use client';

import {
  columnFilteringFeature,
  createColumnHelper,
  createFilteredRowModel,
  createSortedRowModel,
  globalFilteringFeature,
  rowSortingFeature,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { useMemo } from 'react';
import { cellText, isNumeric, numberToSort, sortValue, type DataColumn, type DataRow } from './data-cells';

const features = tableFeatures({
  columnFilteringFeature,
  globalFilteringFeature,
  rowSortingFeature,
  filteredRowModel: createFilteredRowModel(),
  sortedRowModel: createSortedRowModel(),
});
const helper = createColumnHelper<typeof features, DataRow>();
const byText = new Intl.Collator('en-GB', { numeric: true });

function compare(left: unknown, right: unknown, numeric: boolean): number {
  if (numeric && isPlain(left) && isPlain(right)) {
    const [a, b] = [numberToSort(left), numberToSort(right)];
    if (Number.isNaN(a) || Number.isNaN(b)) return Number(Number.isNaN(a)) - Number(Number.isNaN(b));
    return a - b;
  }
  return byText.compare(String(left), String(right));
}

function isPlain(value: unknown): value is string | number {
  return typeof value === 'string' || typeof value === 'number';
}

export function useDataTable(
  columns: DataColumn[],
  rows: DataRow[],
  sortBy?: { key: string; descending?: boolean },
) {
  const definitions = useMemo(
    () =>
      helper.columns(
        columns.map((column) =>
          helper.accessor((row) => sortValue(row.cells[column.key]), {
            id: column.key,
            enableSorting: column.sortable !== false,
            sortDescFirst: false,
            sortUndefined: 'last',
            sortFn: (a, b, id) => compare(a.getValue(id), b.getValue(id), isNumeric(column.kind)),
          }),
        ),
      ),
    [columns],
  );
  const columnOf = useMemo(() => new Map(columns.map((column) => [column.key, column])), [columns]);
  return useTable({
    features,
    columns: definitions,
    data: rows,
    getRowId: (row) => row.id,
    enableSortingRemoval: false,
    initialState: { sorting: sortBy ? [{ id: sortBy.key, desc: sortBy.descending ?? false }] : [] },
    getColumnCanGlobalFilter: () => true,
    globalFilterFn: (row, id, wanted) => {
      const column = columnOf.get(id);
      return (
        !!column &&
        cellText(column, row.original.cells[id]).toLowerCase().includes(String(wanted).toLowerCase())
      );
    },
  });
}
