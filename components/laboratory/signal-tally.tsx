import { SignalMark } from '@/components/ui/signal';
import { formatCount } from '@/lib/format';

export type Tally = Record<'none' | 'warning' | 'action' | 'not-scored', number>;

/** How many scores of a round have which signal; what is fine is told in plain ink. */
export function SignalTally({ signals }: { signals: Tally }) {
  const total = signals.none + signals.warning + signals.action + signals['not-scored'];
  if (total === 0) return <span className="text-grey">no score</span>;
  return (
    <span className="inline-flex flex-wrap items-baseline gap-x-4">
      <span>{formatCount(total, 'measurand')}</span>
      {(['action', 'warning'] as const).map(
        (signal) =>
          signals[signal] > 0 && (
            <span key={signal} className="inline-flex items-baseline gap-1.5 font-semibold">
              <span className="figures">{signals[signal]}</span>
              <SignalMark signal={signal} />
            </span>
          ),
      )}
      {signals.action + signals.warning === 0 && <span>no signal</span>}
      {signals['not-scored'] > 0 && <span className="text-grey">{signals['not-scored']} not scored</span>}
    </span>
  );
}
