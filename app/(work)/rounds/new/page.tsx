import { RoundForm } from '@/components/forms/round-form';
import { newRoundValues } from '@/components/rounds/round-values';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { db } from '@/db/connection';
import { listSchemesWithCounts } from '@/db/views/scheme-list-view';
import { requirePageActor } from '@/lib/auth/guards';
import { createRoundAction } from '../actions';

export const metadata = { title: 'New round' };

export default async function NewRoundPage({ searchParams }: PageProps<'/rounds/new'>) {
  await requirePageActor('round:edit');
  const { scheme } = await searchParams;
  const schemes = await listSchemesWithCounts(db());
  const chosen =
    schemes.find((entry) => entry.slug === scheme) ?? (schemes.length === 1 ? schemes[0] : undefined);
  return (
    <>
      <PageHeader
        title="New round"
        lead="Name and dates first; test items and measurands come on the next page."
        breadcrumb={[{ href: '/rounds', label: 'Rounds' }]}
      />
      {schemes.length === 0 ? (
        <EmptyState
          title="A round belongs to a scheme"
          action={
            <ButtonLink href="/schemes/new" variant="primary">
              New scheme
            </ButtonLink>
          }
        >
          There is no scheme yet. Create one with its measurands, then plan the round.
        </EmptyState>
      ) : (
        <RoundForm
          action={createRoundAction}
          values={newRoundValues(new Date())}
          schemes={schemes.map(({ slug, name }) => ({ slug, name }))}
          scheme={chosen?.slug}
        />
      )}
    </>
  );
}
