import { notFound } from 'next/navigation';
import { MeasurandLinks } from '@/components/rounds/measurand-links';
import { WorkingWindow } from '@/components/rounds/working-window';
import { EmptyState } from '@/components/ui/empty-state';
import { requirePageActor } from '@/lib/auth/guards';
import { getPreparedEvaluation } from '@/lib/services/read-evaluation';
import { getParticipantWorking } from '@/lib/services/show-working';
import { findOr404 } from '../../find-or-404';
import { loadRound } from '../load-round';
import { MeasurandSection } from './measurand-section';
import { Provenance } from './provenance';
import { SignSection } from './sign-section';

export const metadata = { title: 'Evaluation' };

export default async function EvaluationPage({
  params,
  searchParams,
}: PageProps<'/rounds/[round]/evaluation'>) {
  const actor = await requirePageActor('round:see-results');
  const { round: slug } = await params;
  const query = await searchParams;
  const { round } = await loadRound(slug);
  const found = await findOr404(getPreparedEvaluation(slug));
  if (!found) {
    return (
      <EmptyState title="Not evaluated yet">
        {round.state === 'closed'
          ? 'Look at the review of each measurand, then evaluate the round by the button above.'
          : 'Assigned values, sigma_pt and scores stand here once the round is closed and evaluated.'}
      </EmptyState>
    );
  }
  const { measurands, evaluation } = found;
  const wanted = typeof query.measurand === 'string' ? Number(query.measurand) : measurands[0]?.plan.id;
  const chosen = measurands.find(({ plan }) => plan.id === wanted);
  if (!chosen) notFound();
  const page = `/rounds/${slug}/evaluation?measurand=${chosen.plan.id}`;
  const code = typeof query.working === 'string' ? query.working : null;
  return (
    <>
      <SignSection actor={actor} round={round} found={found} />
      <MeasurandLinks
        current={chosen.plan.id}
        links={measurands.map(({ plan }) => ({
          ...plan,
          href: `/rounds/${slug}/evaluation?measurand=${plan.id}`,
        }))}
      />
      <MeasurandSection slug={slug} chosen={chosen} libraryVersion={evaluation.libraryVersion} />
      <Provenance found={found} />
      {code && (
        <WorkingWindow
          title={`Scores of ${code}, ${chosen.plan.itemCode} ${chosen.plan.code}`}
          steps={await findOr404(
            Promise.resolve().then(() => getParticipantWorking(chosen.evaluation, code)),
          )}
          version={evaluation.libraryVersion}
          closeTo={page}
        />
      )}
    </>
  );
}
