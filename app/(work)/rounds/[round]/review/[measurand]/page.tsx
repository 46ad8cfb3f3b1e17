import { redirect } from 'next/navigation';
import { EstimatesTable } from '@/components/rounds/estimates-table';
import { EvaluationFacts } from '@/components/rounds/evaluation-facts';
import { ResultsChart, ScoresChart } from '@/components/rounds/measurand-charts';
import { MeasurandLinks } from '@/components/rounds/measurand-links';
import { NotesList } from '@/components/rounds/notes-list';
import { scoreTable } from '@/components/rounds/score-columns';
import { DataTable } from '@/components/ui/data-table';
import { Notice } from '@/components/ui/notice';
import { requirePageActor } from '@/lib/auth/guards';
import { reviewMeasurand } from '@/lib/services/round-results';
import { findOr404 } from '../../../find-or-404';
import { loadRound } from '../../load-round';

export const metadata = { title: 'Review' };

export default async function ReviewMeasurandPage({
  params,
}: PageProps<'/rounds/[round]/review/[measurand]'>) {
  await requirePageActor('round:see-results');
  const { round: slug, measurand } = await params;
  const { round } = await loadRound(slug);
  if (!['closed', 'evaluated', 'published'].includes(round.state)) redirect(`/rounds/${slug}/review`);
  const { plan, measurands, preview } = await findOr404(reviewMeasurand(slug, Number(measurand)));
  const table = scoreTable(preview, plan, null);
  return (
    <section className="flex flex-col gap-6" aria-labelledby="review">
      <MeasurandLinks
        current={plan.id}
        links={measurands.map((entry) => ({ ...entry, href: `/rounds/${slug}/review/${entry.id}` }))}
      />
      <h2 id="review">
        {plan.name} in item {plan.itemCode}
      </h2>
      <Notice>
        Computed from the results as they stand, by the plan. Nothing here is stored; what counts is the
        evaluation.
      </Notice>
      <NotesList notes={preview.notes} />
      <ResultsChart plan={plan} evaluation={preview} />
      <EstimatesTable robust={preview.robust} unit={plan.unit} decimals={plan.decimals} />
      <EvaluationFacts evaluation={preview} plan={plan} />
      <ScoresChart plan={plan} evaluation={preview} />
      <DataTable
        caption="Results in ascending order, with the scores they would get"
        columns={table.columns}
        rows={table.rows}
        sortBy={{ key: 'result' }}
        filterLabel="Filter codes"
      />
    </section>
  );
}
