import type { ReactNode } from 'react';
import { RoundNavigation } from '@/components/rounds/round-navigation';
import { roundStages } from '@/components/rounds/round-stages';
import { PageHeader } from '@/components/ui/page-header';
import { StateTag } from '@/components/ui/state-tag';
import { requirePageActor } from '@/lib/auth/guards';
import { signatureOf } from '@/lib/services/round-overview';
import { loadRound } from './load-round';
import { roundPages } from './round-pages';
import { StepButtons } from './step-buttons';

export default async function RoundLayout({
  children,
  params,
}: LayoutProps<'/rounds/[round]'> & { children: ReactNode }) {
  const actor = await requirePageActor('round:view');
  const overview = await loadRound((await params).round);
  const { round, scheme, next, blockers, now } = overview;
  const signedAt = signatureOf(overview)?.at ?? null;
  return (
    <>
      <PageHeader
        title={round.name}
        tag={<StateTag of="round" state={round.state} />}
        lead={round.state === 'cancelled' ? `Cancelled: ${round.cancelReason}` : undefined}
        breadcrumb={[
          { href: '/rounds', label: 'Rounds' },
          { href: `/schemes/${scheme.slug}`, label: scheme.name },
        ]}
        actions={<StepButtons actor={actor} overview={overview} />}
      />
      <RoundNavigation
        base={`/rounds/${round.slug}`}
        stages={roundStages({ round, next, blockers, signedAt, now })}
        pages={roundPages(actor)}
        signedAt={signedAt}
        today={now}
      />
      {children}
    </>
  );
}
