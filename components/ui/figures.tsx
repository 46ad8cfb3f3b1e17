import { countDecimals, formatNumber, showMinus } from '@/lib/format';
import { cx } from './cx';

export type FiguresProps = {
  value: number | string | null;
  decimals?: number;
  columnDecimals?: number;
  className?: string;
};

/** The decimals a column of figures needs room for, whether they are numbers or text as reported. */
export function columnDecimals(values: (number | string | null)[], decimals?: number): number {
  return Math.max(
    decimals ?? 0,
    ...values.map((value) => (typeof value === 'string' ? countDecimals(value) : 0)),
  );
}

/** What is missing behind a figure so that it lines up on the decimal sign of its column. */
export function padForDecimals(text: string, columnWidth: number): string {
  const missing = columnWidth - countDecimals(text);
  if (missing <= 0) return '';
  return `${text.includes('.') ? '' : '.'}${'0'.repeat(missing)}`;
}

/**
 * One figure of a right-aligned column. A number is written with `decimals`; text, such as a
 * result as the laboratory wrote it ("<2.0"), is kept and lined up by its own decimal sign.
 */
export function Figures({ value, decimals, columnDecimals: width, className }: FiguresProps) {
  const text = typeof value === 'string' ? showMinus(value) : formatNumber(value, decimals ?? 0);
  const pad = value === null ? '' : padForDecimals(text, width ?? decimals ?? 0);
  return (
    <span className={cx('figures', value === null && 'text-grey', className)} data-pad={pad || undefined}>
      {text}
    </span>
  );
}
