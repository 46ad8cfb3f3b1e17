import { EstimatesTable } from '@/components/rounds/estimates-table';
import { EvaluationFacts } from '@/components/rounds/evaluation-facts';
import { FigureWorking } from '@/components/rounds/figure-working';
import { ResultsChart, ScoresChart } from '@/components/rounds/measurand-charts';
import { NotesList } from '@/components/rounds/notes-list';
import { scoreTable } from '@/components/rounds/score-columns';
import { Caution } from '@/components/ui/caution';
import { DataTable } from '@/components/ui/data-table';
import type { EvaluatedPlan } from '@/lib/services/read-evaluation';
import type { Figure } from '@/lib/services/show-working';
import { figureWorkingAction } from './actions';

type MeasurandSectionProps = { slug: string; chosen: EvaluatedPlan; libraryVersion: string };

export function MeasurandSection({ slug, chosen, libraryVersion }: MeasurandSectionProps) {
  const { plan, evaluation } = chosen;
  const working = (figure: Figure, name: string) => (
    <FigureWorking
      title={`${name}, ${plan.itemCode} ${plan.code}`}
      version={libraryVersion}
      load={figureWorkingAction.bind(null, { round: slug, measurand: plan.id, figure })}
    />
  );
  const table = scoreTable(
    evaluation,
    plan,
    (code) => `/rounds/${slug}/evaluation?measurand=${plan.id}&working=${encodeURIComponent(code)}`,
  );
  return (
    <section className="flex flex-col gap-6" aria-labelledby="measurand">
      <h2 id="measurand">
        {plan.name} in item {plan.itemCode}
      </h2>
      <EvaluationFacts evaluation={evaluation} plan={plan} working={working} />
      <NotesList notes={evaluation.notes} />
      <Caution kind="score" />
      <ScoresChart plan={plan} evaluation={evaluation} />
      <ResultsChart plan={plan} evaluation={evaluation} />
      <EstimatesTable
        robust={evaluation.robust}
        unit={plan.unit}
        decimals={plan.decimals}
        working={working}
      />
      <DataTable
        caption={`Scores of all participants for ${plan.name} in item ${plan.itemCode}`}
        columns={table.columns}
        rows={table.rows}
        sortBy={{ key: 'code' }}
        filterLabel="Filter codes"
      />
      <p className="text-sm text-ink-soft">Press a code to open the working of its scores.</p>
    </section>
  );
}
