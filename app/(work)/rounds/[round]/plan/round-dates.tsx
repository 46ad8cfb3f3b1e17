import { RoundDialog } from '@/components/forms/round-dialog';
import { roundValues } from '@/components/rounds/round-values';
import { Facts } from '@/components/ui/facts';
import { formatDateTime } from '@/lib/format';
import type { Round } from '@/lib/services/round-overview';
import { changeRoundAction } from './actions';

export function RoundDates({ round, mayEdit }: { round: Round; mayEdit: boolean }) {
  const mayChange = mayEdit && (round.state === 'draft' || round.state === 'open');
  const fee = round.feeCents === 0 ? 'none' : `${(round.feeCents / 100).toFixed(2)} ${round.feeCurrency}`;
  return (
    <section className="flex flex-col gap-3" aria-labelledby="dates">
      <div className="flex flex-wrap items-end justify-between gap-3">
        <h2 id="dates">Dates</h2>
        {mayChange && (
          <RoundDialog
            action={changeRoundAction}
            round={round.slug}
            values={roundValues(round)}
            isOpen={round.state === 'open'}
          />
        )}
      </div>
      <Facts
        columns={2}
        items={[
          { label: 'Opening', value: formatDateTime(round.opensAt) },
          { label: 'Dispatch of the items', value: formatDateTime(round.dispatchAt) },
          { label: 'Results due', value: formatDateTime(round.closesAt) },
          { label: 'Publication', value: formatDateTime(round.publishAt) },
          { label: 'Fee', value: fee },
          { label: 'Past round', value: round.isPast ? 'yes, loaded from a file' : 'no' },
        ]}
      />
      <div className="flex flex-col gap-1 pt-2">
        <h3>Instructions to participants</h3>
        <p className="max-w-measure whitespace-pre-wrap">
          {round.instructions || <span className="text-ink-soft">None yet.</span>}
        </p>
      </div>
    </section>
  );
}
