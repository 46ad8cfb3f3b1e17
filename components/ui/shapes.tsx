import { cx } from './cx';

type ShapeProps = { className?: string };

const BOX = 'inline-block size-[0.8em] shrink-0 align-[-0.02em]';

/** The shape of a warning signal: an open triangle. */
export function OpenTriangle({ className }: ShapeProps) {
  return (
    <svg viewBox="0 0 12 12" aria-hidden="true" className={cx(BOX, 'text-warning', className)}>
      <path
        d="M6 1.4 11 10.6H1Z"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.8"
        strokeLinejoin="round"
      />
    </svg>
  );
}

/** The shape of an action signal: a filled square. */
export function FilledSquare({ className }: ShapeProps) {
  return (
    <svg viewBox="0 0 12 12" aria-hidden="true" className={cx(BOX, 'text-action', className)}>
      <path d="M1.2 1.2h9.6v9.6H1.2Z" fill="currentColor" />
    </svg>
  );
}

export function Tick({ className }: ShapeProps) {
  return (
    <svg viewBox="0 0 12 12" aria-hidden="true" className={cx(BOX, className)}>
      <path d="M1.5 6.5 4.7 9.8 10.6 2.4" fill="none" stroke="currentColor" strokeWidth="1.8" />
    </svg>
  );
}

export function InfoMark({ className }: ShapeProps) {
  return (
    <svg viewBox="0 0 12 12" aria-hidden="true" className={cx(BOX, className)}>
      <circle cx="6" cy="6" r="5.1" fill="none" stroke="currentColor" strokeWidth="1.4" />
      <path d="M6 5.2v3.6M6 2.9v1.3" stroke="currentColor" strokeWidth="1.4" />
    </svg>
  );
}

/** Assize's own mark: graduations on a line, the middle one drawn out. */
export function BrandMark({ className }: ShapeProps) {
  return (
    <svg viewBox="0 0 24 24" aria-hidden="true" className={cx('inline-block size-6 shrink-0', className)}>
      <path
        d="M2 20.5h20M4.5 20v-4M8.2 20v-7M15.8 20v-7M19.5 20v-4"
        stroke="currentColor"
        strokeWidth="1.6"
      />
      <path d="M12 20V3" className="stroke-maize" strokeWidth="2.8" />
    </svg>
  );
}
