import { cx } from '@/components/ui/cx';
import type { StageState } from './round-line-words';

/** The mark of a stage on the round line; its state is told by shape first. */
export function StageMark({ state, className }: { state: StageState; className?: string }) {
  return (
    <svg viewBox="0 0 16 16" aria-hidden="true" className={cx('size-4 shrink-0 rounded-full', className)}>
      <Shape state={state} />
    </svg>
  );
}

function Shape({ state }: { state: StageState }) {
  switch (state) {
    case 'done':
      return <circle cx="8" cy="8" r="5.5" className="fill-ink" />;
    case 'current':
      return (
        <>
          <circle cx="8" cy="8" r="6.75" className="fill-maize stroke-ink" strokeWidth="1.5" />
          <circle cx="8" cy="8" r="2" className="fill-maize-ink" />
        </>
      );
    case 'due':
      return <circle cx="8" cy="8" r="5.5" className="fill-paper stroke-ink" strokeWidth="2.2" />;
    case 'overdue':
      return (
        <path
          d="M8 2 14.6 13.6H1.4Z"
          className="fill-paper stroke-warning"
          strokeWidth="2"
          strokeLinejoin="round"
        />
      );
    case 'cancelled':
      return <path d="m4 4 8 8M12 4 4 12" className="stroke-grey" strokeWidth="1.8" />;
    case 'later':
      return <circle cx="8" cy="8" r="4" className="fill-paper stroke-rule-strong" strokeWidth="1.5" />;
  }
}
