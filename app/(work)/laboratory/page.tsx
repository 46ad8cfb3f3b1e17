import type { ReactNode } from 'react';
import { DeskList, type DeskEntry } from '@/components/laboratory/desk-list';
import { PastRounds } from '@/components/laboratory/past-rounds';
import { SignalTally } from '@/components/laboratory/signal-tally';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import type { LaboratoryRound } from '@/db/views/laboratory-rounds-view';
import { daysBetween, formatDate, formatDateTime, formatRelativeDays } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import { getDesk, type Desk } from '@/lib/services/laboratory-desk';
import { NoLaboratory } from './no-laboratory';
import { findOwnPlace } from './own-place';

export const metadata = { title: 'Today' };

export default async function LaboratoryPage() {
  const place = await findOwnPlace();
  if (!place) return <NoLaboratory />;
  const now = new Date().toISOString();
  const desk = await getDesk(place.laboratoryId, now);
  const isEmpty = Object.values(desk).every((list: readonly unknown[]) => list.length === 0);
  return (
    <>
      <PageHeader title={place.laboratoryName} lead={isEmpty ? undefined : leadOf(desk, now)} />
      {isEmpty ? (
        <EmptyState title="No round yet">
          Rounds stand here once the provider invites your laboratory: what to accept, which items to receive,
          when results are due, and your scores after publication. You will get an e-mail with the invitation.
        </EmptyState>
      ) : (
        <DeskLists desk={desk} now={now} canAnswer={can(place.actor, 'own:enrol', place)} />
      )}
    </>
  );
}

function leadOf(desk: Desk, now: string): string {
  const waiting = desk.invitations.length + desk.toReceive.length + desk.due.length;
  const day = formatDate(now);
  return waiting === 0 ? `${day}. Nothing waits for you today.` : `${day}. What waits for you stands first.`;
}

interface DeskListsProps {
  desk: Desk;
  now: string;
  canAnswer: boolean;
}

function DeskLists({ desk, now, canAnswer }: DeskListsProps) {
  return (
    <>
      <DeskList
        id="invitations"
        title="Invitations to answer"
        entries={desk.invitations.map((round) =>
          entryOf(
            round,
            canAnswer ? 'Accept or decline' : 'See the invitation',
            'invitation',
            `results due ${formatDate(round.closesAt)}`,
          ),
        )}
      />
      <DeskList
        id="to-receive"
        title="Items to receive"
        entries={desk.toReceive.map((round) =>
          entryOf(round, 'Confirm receipt', 'items', `sent ${formatDate(round.dispatchAt)}`),
        )}
      />
      <DeskList
        id="due"
        title="Results due"
        entries={desk.due.map((round) =>
          entryOf(round, 'Send results', 'results', <DueWords closesAt={round.closesAt} now={now} />),
        )}
      />
      <DeskList
        id="new-scores"
        title="Newly published scores"
        entries={desk.newlyPublished.map((round) =>
          entryOf(round, 'See the scores', 'scores', <SignalTally signals={round.signals} />),
        )}
      />
      <DeskList
        id="under-way"
        title="Under way"
        entries={desk.underWay.map((round) =>
          entryOf(round, 'Open the round', undefined, underWayWords(round, now)),
        )}
      />
      <PastRounds rounds={desk.past} />
    </>
  );
}

function entryOf(
  round: LaboratoryRound,
  link: string,
  part: string | undefined,
  words: ReactNode,
): DeskEntry {
  return { slug: round.slug, name: round.name, schemeName: round.schemeName, link, part, words };
}

const SOON_DAYS = 3;

function DueWords({ closesAt, now }: { closesAt: string; now: string }) {
  const isSoon = daysBetween(now, closesAt) <= SOON_DAYS;
  return (
    <span>
      <strong className={isSoon ? 'text-warning' : undefined}>{formatRelativeDays(closesAt, now)}</strong>,{' '}
      {formatDateTime(closesAt)}
    </span>
  );
}

function underWayWords(round: LaboratoryRound, now: string): string {
  if (round.state === 'draft') return `opens ${formatDate(round.opensAt)}`;
  const publication = `scores on ${formatDate(round.publishAt)}`;
  if (round.state !== 'open') return `under review, ${publication}`;
  if (round.enrolmentState === 'invited') return 'the invitation was not answered in time';
  if (round.receiptCode) return `results sent; can be amended until ${formatDateTime(round.closesAt)}`;
  return round.closesAt <= now
    ? `results were due ${formatDate(round.closesAt)}`
    : `items leave on ${formatDate(round.dispatchAt)}`;
}
