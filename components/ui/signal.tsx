import { formatScore, type ScoreKind } from '@/lib/format';
import type { Signal as StatsSignal } from '@/lib/stats/scores/limits';
import { cx } from './cx';
import { FilledSquare, OpenTriangle } from './shapes';

export type SignalKind = StatsSignal | 'not-scored';
export type SignalProps = {
  score: number | null;
  signal: SignalKind;
  kind?: ScoreKind;
  compact?: boolean;
  column?: boolean;
  why?: string;
};

/**
 * A score and its signal, told by shape, word and colour together.
 * `compact` keeps the word for screen readers and paper only; `column` reserves the room of the
 * signal, so that the figures of a column stay aligned.
 */
export function Signal({ score, signal, kind = 'z', compact, column, why }: SignalProps) {
  if (signal === 'not-scored' || score === null)
    return <NotScored compact={compact} column={column} why={why} />;
  return (
    <span className={cx('inline-flex items-baseline gap-1.5', TEXT[signal])}>
      <span className="figures">{formatScore(score, kind)}</span>
      {(signal !== 'none' || column) && (
        <span className={cx('inline-flex items-baseline text-left', column && slot(compact))}>
          <SignalMark signal={signal} compact={compact} />
        </span>
      )}
    </span>
  );
}

const TEXT = { none: '', warning: 'text-warning font-semibold', action: 'text-action font-semibold' };

function slot(compact?: boolean): string {
  return compact ? 'w-4 print:w-20' : 'w-20';
}

/** Shape and word of a signal without its score. */
export function SignalMark({ signal, compact }: { signal: SignalKind; compact?: boolean }) {
  if (signal === 'not-scored') return <span className="text-grey">not scored</span>;
  if (signal === 'none') return null;
  const Shape = signal === 'warning' ? OpenTriangle : FilledSquare;
  return (
    <span
      title={compact ? signal : undefined}
      className={cx(
        'inline-flex items-baseline gap-1',
        signal === 'warning' ? 'text-warning' : 'text-action',
      )}
    >
      <Shape />
      <span className={compact ? 'sr-only print:not-sr-only' : ''}>{signal}</span>
    </span>
  );
}

function NotScored({ compact, column, why }: Pick<SignalProps, 'compact' | 'column' | 'why'>) {
  return (
    <span title={why} className="inline-flex items-baseline gap-1.5 text-grey">
      <span aria-hidden="true">{'\u2013'}</span>
      <span className={cx('text-left', column && slot(compact))}>
        <span className={compact ? 'sr-only print:not-sr-only' : ''}>not scored</span>
        {why && <span className="sr-only">: {why}</span>}
      </span>
    </span>
  );
}
