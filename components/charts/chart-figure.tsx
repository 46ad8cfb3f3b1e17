import { useId, type ReactNode } from 'react';
import { Table, Td, Th } from '@/components/ui/table';
import { Figures } from '@/components/ui/figures';
import { ChartExport } from './chart-export';
import { ChartReadout } from './chart-readout';

export type ChartTableColumn = { label: string; decimals?: number; numeric?: boolean };
export type ChartTable = { columns: ChartTableColumn[]; rows: (string | number | null)[][] };
export type ChartFigureProps = {
  title: string;
  /** Level of the title among the headings of the page. */
  level?: 2 | 3 | 4;
  caption?: ReactNode;
  table: ChartTable;
  fileName: string;
  note?: string;
  children: ReactNode;
};

/** The frame of every chart: title, drawing, caption, the numbers behind it, and saving it. */
export function ChartFigure({
  title,
  level = 2,
  caption,
  table,
  fileName,
  note = '',
  children,
}: ChartFigureProps) {
  const id = useId();
  const Heading = `h${level}` as const;
  return (
    <figure aria-labelledby={id} className="border-t pt-3">
      <Heading id={id} className="text-lg">
        {title}
      </Heading>
      <div className="mt-2">
        <ChartReadout>{children}</ChartReadout>
      </div>
      <figcaption className="mt-2 max-w-prose text-sm text-ink-soft">{caption}</figcaption>
      <div className="no-print mt-1 flex flex-wrap items-start gap-x-4">
        <details className="min-w-0 open:basis-full">
          <summary className="flex min-h-9 items-center font-semibold text-press md:min-h-7">
            <span className="text-sm">Show the numbers</span>
          </summary>
          <NumbersTable title={title} table={table} />
        </details>
        <ChartExport fileName={fileName} note={note} />
      </div>
    </figure>
  );
}

function NumbersTable({ title, table }: { title: string; table: ChartTable }) {
  const isNumeric = (column: ChartTableColumn | undefined) =>
    column?.numeric ?? column?.decimals !== undefined;
  return (
    <Table caption={title} hideCaption className="my-2 w-auto text-sm">
      <thead>
        <tr>
          {table.columns.map((column) => (
            <Th key={column.label} numeric={isNumeric(column)}>
              {column.label}
            </Th>
          ))}
        </tr>
      </thead>
      <tbody>
        {table.rows.map((cells, row) => (
          <tr key={row}>
            {cells.map((cell, index) => {
              const column = table.columns[index];
              if (!isNumeric(column)) return <Td key={index}>{cell}</Td>;
              return (
                <Td key={index} numeric>
                  <Figures value={cell} decimals={column?.decimals} />
                </Td>
              );
            })}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
