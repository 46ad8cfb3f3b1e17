import { cx } from './cx';

export type SkeletonProps = { lines?: number; title?: boolean; table?: boolean; label?: string };

const WIDTHS = ['w-11/12', 'w-4/5', 'w-10/12', 'w-3/5'];

/** Stands where a page is being fetched. Still, so that it does not call for attention. */
export function Skeleton({ lines = 4, title = true, table = false, label = 'Loading' }: SkeletonProps) {
  return (
    <div role="status" className="max-w-page">
      <span className="sr-only">{label}</span>
      {title && <div className="mb-6 h-8 w-2/5 rounded-xs bg-paper-wash" />}
      {Array.from({ length: lines }, (_, line) => (
        <div key={line} className={cx(table ? 'border-b py-2.5' : 'mb-3')}>
          <div
            className={cx('h-4 rounded-xs bg-paper-wash', table ? 'w-full' : WIDTHS[line % WIDTHS.length])}
          />
        </div>
      ))}
    </div>
  );
}
