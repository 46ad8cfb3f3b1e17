import { PrintButton } from '@/components/rounds/print-button';
import { Caution } from '@/components/ui/caution';
import { EmptyState } from '@/components/ui/empty-state';
import { Facts } from '@/components/ui/facts';
import { Notice } from '@/components/ui/notice';
import { requirePageActor } from '@/lib/auth/guards';
import { formatDate } from '@/lib/format';
import { getPreparedEvaluation } from '@/lib/services/read-evaluation';
import { getRoundPlan } from '@/lib/services/round-plan';
import { findOr404 } from '../../find-or-404';
import { Provenance } from '../evaluation/provenance';
import { loadRound } from '../load-round';
import { MeasurandReport } from './measurand-report';

export const metadata = { title: 'Report' };

export default async function ReportPage({ params }: PageProps<'/rounds/[round]/report'>) {
  await requirePageActor('round:see-results');
  const { round: slug } = await params;
  const { round, scheme, facts } = await loadRound(slug);
  const found = await findOr404(getPreparedEvaluation(slug));
  if (!found) {
    return (
      <EmptyState title="No report yet">
        The report is made from the evaluation, which comes after the close.
      </EmptyState>
    );
  }
  const { items } = await getRoundPlan(slug);
  const hasLimit = found.measurands.some(({ plan }) => plan.decisionLimit !== null);
  return (
    <article className="flex flex-col gap-8" aria-labelledby="report">
      <div className="flex flex-wrap items-end justify-between gap-3">
        <h2 id="report">Report on {round.name}</h2>
        <PrintButton />
      </div>
      {round.state !== 'published' && (
        <Notice kind="warning" title="Draft.">
          The scores are not published; this page is for the provider only.
        </Notice>
      )}
      <Facts
        columns={2}
        items={[
          { label: 'Scheme', value: scheme.name },
          { label: 'Published', value: formatDate(round.publishedAt) },
          { label: 'Dispatch of the items', value: formatDate(round.dispatchAt) },
          { label: 'Results due', value: formatDate(round.closesAt) },
          {
            label: 'Participants',
            value: `${facts.submittedCount} of ${facts.participantCount} sent results`,
          },
          {
            label: 'Test items',
            value: items.map((item) => `${item.code}: ${item.name}`).join('; '),
          },
        ]}
      />
      <Caution kind="score" />
      {hasLimit && <Caution kind="limit" />}
      {found.measurands.map(({ plan, evaluation }) => (
        <MeasurandReport key={plan.id} plan={plan} evaluation={evaluation} />
      ))}
      <Provenance found={found} />
    </article>
  );
}
