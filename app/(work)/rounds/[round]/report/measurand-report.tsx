import { EvaluationFacts } from '@/components/rounds/evaluation-facts';
import { ScoresChart } from '@/components/rounds/measurand-charts';
import { NotesList } from '@/components/rounds/notes-list';
import { ReportTable } from '@/components/rounds/report-table';
import type { EvaluatedPlan } from '@/lib/services/read-evaluation';

export function MeasurandReport({ plan, evaluation }: EvaluatedPlan) {
  const title = `${plan.name} in item ${plan.itemCode}`;
  return (
    <section className="flex flex-col gap-4 print:break-before-page" aria-label={title}>
      <h3 className="text-xl">{title}</h3>
      {plan.decisionLimit !== null && (
        <p className="max-w-measure">
          Decision limit, as an example: {plan.decisionLimit} {plan.unit}.{' '}
          <span className="text-ink-soft">{plan.decisionLimitSource ?? 'No source is given.'}</span>
        </p>
      )}
      <EvaluationFacts evaluation={evaluation} plan={plan} />
      <NotesList notes={evaluation.notes} />
      <ScoresChart plan={plan} evaluation={evaluation} />
      <ReportTable caption="Scores by participant code" evaluation={evaluation} plan={plan} />
    </section>
  );
}
