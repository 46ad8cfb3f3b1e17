import { Caution } from '@/components/ui/caution';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Facts } from '@/components/ui/facts';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount, formatDateTime } from '@/lib/format';
import { listParticipantsFor } from '@/lib/services/participant-key';
import { getRoundPlan, type PlannedItem, type PlannedMeasurand } from '@/lib/services/round-plan';
import { loadRound } from '../load-round';

export const metadata = { title: 'Items' };

export default async function ItemsPage({ params }: PageProps<'/rounds/[round]/items'>) {
  const actor = await requirePageActor('round:view');
  const { round: slug } = await params;
  const { round } = await loadRound(slug);
  const { items, measurands } = await getRoundPlan(slug);
  const common = commonHandling(items);
  const enrolled = (await listParticipantsFor(actor, slug)).filter((entry) => entry.state === 'enrolled');
  return (
    <>
      <section className="flex flex-col gap-4" aria-labelledby="items">
        <h2 id="items">Test items as laboratories see them</h2>
        <Caution kind="handling" />
        {items.length === 0 && (
          <EmptyState
            title="No test item yet"
            action={<ButtonLink href={`/rounds/${slug}/plan`}>Go to the plan</ButtonLink>}
          >
            Items are added on the plan page.
          </EmptyState>
        )}
        {items.map((item) => (
          <Item
            key={item.id}
            item={item}
            measurands={measurands.filter((entry) => entry.testItemId === item.id)}
            showHandling={common === null}
          />
        ))}
        {common !== null && (
          <p className="max-w-measure whitespace-pre-wrap">
            <strong>Handling of every item.</strong> {common}
          </p>
        )}
      </section>
      {enrolled.length > 0 && (
        <section className="flex flex-col gap-3" aria-labelledby="receipt">
          <h2 id="receipt">Receipt</h2>
          <Receipt
            dispatchAt={round.dispatchAt}
            received={enrolled.filter((entry) => entry.itemsReceivedAt !== null)}
            waiting={enrolled.filter((entry) => entry.itemsReceivedAt === null)}
          />
        </section>
      )}
    </>
  );
}

/** What is the same for several items is said once; null when they differ. */
function commonHandling(items: readonly PlannedItem[]): string | null {
  const texts = new Set(items.map((item) => item.handling.trim()));
  const [text] = texts;
  return items.length > 1 && texts.size === 1 && text ? text : null;
}

interface ItemProps {
  item: PlannedItem;
  measurands: PlannedMeasurand[];
  showHandling: boolean;
}

function Item({ item, measurands, showHandling }: ItemProps) {
  return (
    <article className="flex flex-col gap-2" aria-label={`Item ${item.code}`}>
      <h3>
        {item.code} <span className="font-normal">{item.name}</span>
      </h3>
      <Facts
        items={[
          { label: 'Matrix', value: item.matrix || 'not given' },
          {
            label: 'To be measured',
            value: measurands.map((entry) => `${entry.code} in ${entry.unit}`).join(', ') || 'nothing yet',
          },
        ]}
      />
      {showHandling && (
        <p className="max-w-measure whitespace-pre-wrap">
          {item.handling || <span className="text-ink-soft">No handling instructions of its own.</span>}
        </p>
      )}
    </article>
  );
}

type Entry = Awaited<ReturnType<typeof listParticipantsFor>>[number];

function Receipt({
  dispatchAt,
  received,
  waiting,
}: {
  dispatchAt: string;
  received: Entry[];
  waiting: Entry[];
}) {
  const nameOf = (entry: Entry) => entry.laboratoryName ?? entry.participantCode;
  return (
    <>
      <p>
        Dispatch {formatDateTime(dispatchAt)}. {received.length} of{' '}
        {formatCount(received.length + waiting.length, 'participant')} confirmed that the items arrived.
      </p>
      {waiting.length > 0 && (
        <p>
          <span className="font-semibold">Not confirmed yet: </span>
          {waiting.map(nameOf).join('; ')}.
        </p>
      )}
      {received.length > 0 && (
        <ul className="columns-1 gap-x-10 sm:columns-2">
          {received.map((entry) => (
            <li
              key={entry.participantCode}
              className="flex flex-wrap justify-between gap-x-4 break-inside-avoid border-b py-1"
            >
              {nameOf(entry)}
              <span className="figures text-ink-soft">{formatDateTime(entry.itemsReceivedAt)}</span>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
