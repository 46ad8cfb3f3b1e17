import { redirect } from 'next/navigation';
import { EmptyState } from '@/components/ui/empty-state';
import { requirePageActor } from '@/lib/auth/guards';
import { getRoundPlan } from '@/lib/services/round-plan';
import { loadRound } from '../load-round';

export const metadata = { title: 'Review' };

export default async function ReviewPage({ params }: PageProps<'/rounds/[round]/review'>) {
  await requirePageActor('round:see-results');
  const { round: slug } = await params;
  const { round } = await loadRound(slug);
  const { measurands } = await getRoundPlan(slug);
  const first = measurands[0];
  if (['closed', 'evaluated', 'published'].includes(round.state) && first) {
    redirect(`/rounds/${slug}/review/${first.id}`);
  }
  return (
    <EmptyState title="Nothing to review yet">
      Once the round is closed, the results of each measurand stand here in order, with their distribution and
      the estimates side by side. Reviewing before the close could not be fair to those who report last.
    </EmptyState>
  );
}
