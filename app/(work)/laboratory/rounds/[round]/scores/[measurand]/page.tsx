import { OrderedScoresChart } from '@/components/charts/ordered-scores-chart';
import { RoundBars } from '@/components/charts/round-bars';
import { codesTable, resultPoints, scorePoints } from '@/components/laboratory/round-points';
import { OwnScoreFacts } from '@/components/laboratory/own-score-facts';
import { SCORE_NAMES } from '@/components/laboratory/score-names';
import { FigureWorking } from '@/components/rounds/figure-working';
import { SignalAdvice } from '@/components/laboratory/signal-advice';
import { Caution } from '@/components/ui/caution';
import { DataTable } from '@/components/ui/data-table';
import { Working } from '@/components/ui/working';
import { participantWorking } from '@/lib/stats';
import { getOwnEntry, type OwnEntry } from '@/lib/services/own-scores';
import { findOwn, requireOwnPlace } from '../../../../own-place';
import { RoundHead } from '../../round-head';
import { ownFigureWorkingAction } from '../../actions';

export const metadata = { title: 'Where the result stands' };

export default async function OwnScorePage({
  params,
}: PageProps<'/laboratory/rounds/[round]/scores/[measurand]'>) {
  const place = await requireOwnPlace();
  const { round: slug, measurand } = await params;
  const { round, ownCode, entry } = await findOwn(place, `scores ${measurand} of ${slug}`, () =>
    getOwnEntry(slug, place.laboratoryId, Number(measurand)),
  );
  const { plan, scored } = entry;
  const signal = scored?.signal;
  return (
    <>
      <RoundHead
        round={round}
        now={new Date().toISOString()}
        here="scores"
        title={`${plan.itemCode} ${plan.code}: ${plan.name}`}
      />
      <OwnScoreFacts entry={entry} workings={workingsOf(entry, slug, place.laboratoryId)} />
      {(signal === 'warning' || signal === 'action') && <SignalAdvice signal={signal} level={2} />}
      <Charts entry={entry} ownCode={ownCode} />
      <DataTable
        caption="All codes of the round"
        filterLabel="Filter codes"
        {...codesTable(entry.evaluation, plan, ownCode)}
      />
      <OwnWorking entry={entry} ownCode={ownCode} />
      <Notes entry={entry} />
      <Caution kind="score" />
    </>
  );
}

const FIGURES = {
  assigned: 'x_pt',
  uncertainty: 'u(x_pt)',
  sigma: 'sigma_pt',
} as const;

function workingsOf({ plan, evaluation }: OwnEntry, round: string, laboratory: number) {
  const button = (figure: keyof typeof FIGURES) => (
    <FigureWorking
      title={FIGURES[figure]}
      version={evaluation.libraryVersion}
      load={ownFigureWorkingAction.bind(null, { round, laboratory, measurand: plan.id, figure })}
    />
  );
  return {
    assigned: evaluation.assigned.value !== null && button('assigned'),
    uncertainty: evaluation.assigned.standardUncertainty !== null && button('uncertainty'),
    sigma: evaluation.sigmaPt.value !== null && button('sigma'),
  };
}

interface PartProps {
  entry: OwnEntry;
  ownCode: string;
}

function Charts({ entry: { plan, evaluation }, ownCode }: PartProps) {
  const { assigned, sigmaPt, scoreKind } = evaluation;
  const what = `${plan.name} in ${plan.itemCode}`;
  return (
    <>
      {assigned.value !== null && sigmaPt.value !== null && (
        <RoundBars
          title={`Where your result stands: ${what}`}
          results={resultPoints(evaluation, ownCode)}
          assigned={{ value: assigned.value, sigmaPt: sigmaPt.value }}
          unit={plan.unit}
          decimals={plan.decimals}
          leftOut={evaluation.censored.length}
          fileName={`${plan.itemCode}-${plan.code}-own-result`}
        />
      )}
      <OrderedScoresChart
        title={`Scores in order: ${what}`}
        points={scorePoints(evaluation, ownCode)}
        scoreName={SCORE_NAMES[scoreKind]}
        scoreKind={scoreKind}
        fileName={`${plan.itemCode}-${plan.code}-scores`}
      />
    </>
  );
}

function OwnWorking({ entry: { evaluation, scored, censored }, ownCode }: PartProps) {
  if (!scored && !censored) return null;
  return (
    <Working
      label="Show the working of your score"
      steps={participantWorking(evaluation, ownCode)}
      version={evaluation.libraryVersion}
    />
  );
}

function Notes({ entry: { evaluation } }: { entry: OwnEntry }) {
  if (evaluation.notes.length === 0) return null;
  return (
    <section aria-label="Notes on this evaluation" className="max-w-measure">
      <h2 className="text-lg">Notes on this evaluation</h2>
      <ul className="mt-1 list-disc pl-5">
        {evaluation.notes.map((note) => (
          <li key={note}>{note}</li>
        ))}
      </ul>
    </section>
  );
}
