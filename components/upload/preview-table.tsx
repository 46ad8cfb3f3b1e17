import { cx } from '@/components/ui/cx';
import { FilledSquare, InfoMark } from '@/components/ui/shapes';
import { Table, Td, Th } from '@/components/ui/table';
import { formatCount } from '@/lib/format';
import type { Preview, PreviewCell, PreviewNote, PreviewRow } from './preview';

export type PreviewTableProps = { preview: Preview; caption: string };

/** The rows of a file as read; what is wrong stands in the cell where it is wrong. */
export function PreviewTable({ preview, caption }: PreviewTableProps) {
  const { columns, rows, unshown } = preview;
  return (
    <div>
      <Table caption={caption}>
        <thead>
          <tr>
            <Th numeric>line</Th>
            {columns.map((column) => (
              <Th key={column.key} numeric={column.numeric}>
                {column.label}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.line} row={row} columns={columns} />
          ))}
        </tbody>
      </Table>
      {unshown > 0 && (
        <p className="mt-2 text-sm text-ink-soft">
          {formatCount(unshown, 'further row is', 'further rows are')} not shown here.
        </p>
      )}
    </div>
  );
}

function Row({ row, columns }: { row: PreviewRow; columns: Preview['columns'] }) {
  const isUnread = row.cells.length === 0;
  return (
    <>
      <tr>
        <Td numeric className="figures text-ink-soft">
          {row.line}
        </Td>
        {isUnread ? (
          <Td colSpan={columns.length}>
            <Notes notes={row.notes} />
          </Td>
        ) : (
          columns.map((column, index) => (
            <Cell key={column.key} cell={row.cells[index]} numeric={column.numeric} />
          ))
        )}
      </tr>
      {!isUnread && row.notes.length > 0 && (
        <tr>
          <Td />
          <Td colSpan={columns.length}>
            <Notes notes={row.notes} />
          </Td>
        </tr>
      )}
    </>
  );
}

function Cell({ cell, numeric }: { cell: PreviewCell | undefined; numeric: boolean }) {
  const isWrong = cell?.notes.some((note) => note.kind === 'problem') ?? false;
  return (
    <Td numeric={numeric} className={cx(isWrong && 'bg-paper-wash')}>
      <span className={cx(numeric && 'tabular-nums', isWrong && 'font-semibold', 'wrap-anywhere')}>
        {cell?.text ?? ''}
      </span>
      {cell && <Notes notes={cell.notes} />}
    </Td>
  );
}

function Notes({ notes }: { notes: readonly PreviewNote[] }) {
  return notes.map((note, index) => (
    <p
      key={index}
      className={cx('min-w-48 text-left text-sm', note.kind === 'problem' ? 'text-action' : 'text-ink-soft')}
    >
      {note.kind === 'problem' ? <FilledSquare className="mr-1.5" /> : <InfoMark className="mr-1.5" />}
      {note.text}
    </p>
  ));
}
