import { ScoreTrendChart } from '@/components/charts/score-trend-chart';
import {
  isOnTrendAxis,
  trendChartPoints,
  trendScoreName,
  trendTable,
} from '@/components/laboratory/trend-rows';
import { MeasurandChoice } from '@/components/laboratory/measurand-choice';
import { Caution } from '@/components/ui/caution';
import { DataTable } from '@/components/ui/data-table';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { formatCount } from '@/lib/format';
import { getTrend, type Trend } from '@/lib/services/laboratory-trend';
import { NoLaboratory } from '../no-laboratory';
import { findOwn, findOwnPlace } from '../own-place';

export const metadata = { title: 'Results over time' };

export default async function TrendPage({ searchParams }: PageProps<'/laboratory/trend'>) {
  const place = await findOwnPlace();
  if (!place) return <NoLaboratory />;
  const { measurand } = await searchParams;
  const asked = typeof measurand === 'string' && measurand !== '' ? Number(measurand) : null;
  const trend = await findOwn(place, `trend of measurand ${measurand}`, () =>
    getTrend(place.laboratoryId, asked),
  );
  return (
    <>
      <PageHeader
        title="Results over time"
        lead={`The scores of ${place.laboratoryName} over the rounds, for one measurand at a time.`}
      />
      {trend.chosen ? (
        <ChosenTrend trend={trend} chosen={trend.chosen} />
      ) : (
        <EmptyState title="No score yet">
          After the first published round your scores stand here, round after round, so that a drift shows
          before it becomes a signal.
        </EmptyState>
      )}
    </>
  );
}

function ChosenTrend({ trend, chosen }: { trend: Trend; chosen: NonNullable<Trend['chosen']> }) {
  const { measurands, points } = trend;
  const apart = points.filter((point) => !isOnTrendAxis(point)).length;
  return (
    <>
      <MeasurandChoice
        chosen={chosen.id}
        measurands={measurands.map(({ id, code, name, schemeName }) => ({
          id,
          label: `${schemeName}: ${code}, ${name}`,
        }))}
      />
      <ScoreTrendChart
        title={`${chosen.name} (${chosen.code}) over the rounds of ${chosen.schemeName}`}
        rounds={trendChartPoints(points)}
        scoreName={trendScoreName(points)}
        fileName={`${chosen.code}-over-time`}
      />
      {apart > 0 && (
        <p className="max-w-measure text-sm text-ink-soft">
          {formatCount(apart, 'score')} E_n, judged at 1 instead of 2 and 3, left out of the chart and listed
          below.
        </p>
      )}
      <DataTable
        caption={`Your scores for ${chosen.code}`}
        filterLabel="Filter rounds"
        {...trendTable(points, chosen)}
      />
      <Caution kind="score" />
    </>
  );
}
