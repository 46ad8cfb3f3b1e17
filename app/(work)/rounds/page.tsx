import { RoundTable } from '@/components/rounds/round-table';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { db } from '@/db/connection';
import { listRounds, type RoundListEntry } from '@/db/views/round-list-view';
import { requirePageActor } from '@/lib/auth/guards';
import { can } from '@/lib/rules/permissions';
import { groupRounds } from './group-rounds';

export const metadata = { title: 'Rounds' };

export default async function RoundsPage() {
  const actor = await requirePageActor('round:view');
  const rounds = await listRounds(db());
  const create = can(actor, 'round:edit') && (
    <ButtonLink href="/rounds/new" variant="primary">
      New round
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        title="Rounds"
        lead="What needs attention stands first."
        actions={rounds.length > 0 && create}
      />
      {rounds.length === 0 ? (
        <EmptyState title="No round yet" action={create}>
          Rounds stand here with their dates and how many laboratories have sent results. Plan the first one
          in a scheme.
        </EmptyState>
      ) : (
        <RoundGroups rounds={rounds} />
      )}
    </>
  );
}

function RoundGroups({ rounds }: { rounds: RoundListEntry[] }) {
  const groups = groupRounds(rounds, new Date().toISOString());
  return groups.map((group) => (
    <section key={group.title} className="flex flex-col gap-2" aria-label={group.title}>
      <h2>{group.title}</h2>
      <p className="text-ink-soft">{group.explanation}</p>
      <RoundTable caption={group.title} rounds={group.rounds} />
    </section>
  ));
}
