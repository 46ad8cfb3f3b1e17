import { ItemsTable } from '@/components/laboratory/items-table';
import { Section } from '@/components/laboratory/section';
import { Caution } from '@/components/ui/caution';
import { formatDateTime, formatDate } from '@/lib/format';
import type { OwnRound } from '@/lib/services/laboratory-round';
import { ButtonForm } from '../../../button-form';
import { confirmItemsAction } from './actions';

interface ItemsPartProps {
  own: OwnRound;
  laboratoryId: number;
  now: string;
}

export function ItemsPart({ own, laboratoryId, now }: ItemsPartProps) {
  const { round, items, measurands } = own;
  if (items.length === 0) return null;
  return (
    <Section id="items" title="Test items">
      <Caution kind="handling" />
      <ItemsTable items={items} measurands={measurands} />
      {round.enrolmentState === 'enrolled' && <Receiving own={own} laboratoryId={laboratoryId} now={now} />}
    </Section>
  );
}

function Receiving({ own: { round }, laboratoryId, now }: ItemsPartProps) {
  if (round.itemsReceivedAt) return <p>Receipt was confirmed on {formatDateTime(round.itemsReceivedAt)}.</p>;
  if (round.state !== 'open') return null;
  const verb = round.dispatchAt <= now ? 'left' : 'leave';
  return (
    <div className="flex max-w-measure flex-col gap-3">
      <p>
        The items {verb} the provider on {formatDate(round.dispatchAt)}. When they are here, check that the
        parcel is whole and that each label is there, store them as their handling says, and confirm.
      </p>
      <ButtonForm
        action={confirmItemsAction}
        fields={{ round: round.slug, laboratory: laboratoryId }}
        label="Confirm receipt of the items"
        pendingLabel="Saving"
        variant="plain"
        size="normal"
      />
    </div>
  );
}
