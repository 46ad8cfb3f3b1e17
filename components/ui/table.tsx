import { useId, type ComponentProps, type ReactNode } from 'react';
import { cx } from './cx';
import { Figures, type FiguresProps } from './figures';

export type TableProps = ComponentProps<'table'> & {
  caption: ReactNode;
  hideCaption?: boolean;
  fullHeight?: boolean;
  /** On phones each row becomes a block of lines; cells name their column by `label`. */
  stacked?: boolean;
};

/** A table in a scroll container of its own: the header stays in view, and keys can scroll it. */
export function Table({
  caption,
  hideCaption,
  fullHeight,
  stacked,
  className,
  children,
  ...rest
}: TableProps) {
  const id = useId();
  return (
    <div
      role="region"
      aria-labelledby={id}
      tabIndex={0}
      className={cx(
        // Relative, so that text for screen readers in its cells cannot widen the page.
        'scroll-hint relative overflow-auto print:max-h-none print:overflow-visible',
        !fullHeight && (stacked ? 'sm:max-h-[85svh]' : 'max-h-[85svh]'),
      )}
    >
      <table
        {...rest}
        className={cx('w-full border-collapse text-left', stacked && 'stacked-table', className)}
      >
        <caption id={id} className={hideCaption ? 'sr-only' : 'pb-2 text-left font-semibold'}>
          {caption}
        </caption>
        {children}
      </table>
    </div>
  );
}

type CellProps = { numeric?: boolean };

export function Th({ numeric, className, scope = 'col', ...rest }: ComponentProps<'th'> & CellProps) {
  return (
    <th
      {...rest}
      scope={scope}
      className={cx(
        'px-3 py-1.5 first:pl-0 last:pr-0',
        // A border would scroll away under a sticky header; a shadow line moves with the cell.
        scope === 'col' &&
          'sticky top-0 z-10 bg-paper align-bottom text-sm font-semibold text-ink-soft shadow-[inset_0_-1px_0_var(--rule-strong)]',
        scope === 'row' && 'border-b align-top font-normal',
        numeric && 'text-right',
        className,
      )}
    />
  );
}

export type TdProps = ComponentProps<'td'> & CellProps & { label?: string };

export function Td({ numeric, label, className, ...rest }: TdProps) {
  return (
    <td
      {...rest}
      data-label={label}
      className={cx(
        'border-b px-3 py-1.5 align-top first:pl-0 last:pr-0',
        numeric && 'text-right',
        className,
      )}
    />
  );
}

export type NumberCellProps = FiguresProps & { children?: ReactNode };

export function NumberCell({ children, className, ...figures }: NumberCellProps) {
  return (
    <Td numeric className={className}>
      <Figures {...figures} />
      {children}
    </Td>
  );
}

/** Class for the row of the reader's own laboratory or of the current place. */
export const OWN_ROW =
  'bg-maize-wash [&>:first-child]:shadow-[inset_3px_0_0_var(--maize)] [&>:first-child]:pl-2';
