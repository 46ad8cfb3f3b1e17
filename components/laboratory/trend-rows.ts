import type { TrendPoint as ChartPoint } from '@/components/charts/chart-types';
import type { DataColumn, DataRow } from '@/components/ui/data-table';
import { formatDate, type ScoreKind } from '@/lib/format';
import { SCORE_NAMES } from './score-names';

export interface TrendScore {
  roundSlug: string;
  roundName: string;
  closesAt: string;
  roundMeasurandId: number;
  item: string;
  value: number | null;
  assignedValue: number | null;
  sigmaPt: number | null;
  scoreKind: Exclude<ScoreKind, 'p-a'>;
  score: number | null;
  signal: ChartPoint['signal'];
}

/** z, z' and zeta share the lines at 2 and 3; E_n has a line of its own at 1 and does not belong on the same axis. */
export function isOnTrendAxis({ scoreKind }: Pick<TrendScore, 'scoreKind'>): boolean {
  return scoreKind !== 'e-n';
}

/** The name of the axis: of the one score in use, or of those that are mixed. */
export function trendScoreName(points: readonly TrendScore[]): string {
  const kinds = [...new Set(points.filter(isOnTrendAxis).map((point) => point.scoreKind))];
  return kinds.length === 0 ? 'z' : kinds.map((kind) => SCORE_NAMES[kind]).join(', ');
}

/** The points of the chart, oldest first, labelled by month so that they fit; the round's name is in the note. */
export function trendChartPoints(points: readonly TrendScore[]): ChartPoint[] {
  const onAxis = points.filter(isOnTrendAxis);
  const isMixed = new Set(onAxis.map((point) => point.scoreKind)).size > 1;
  return onAxis.map((point) => ({
    key: `${point.roundSlug}-${point.roundMeasurandId}`,
    label: monthOf(point.closesAt),
    score: point.score,
    signal: point.signal,
    note: [`${point.roundName}, item ${point.item}`, isMixed && SCORE_NAMES[point.scoreKind]]
      .filter(Boolean)
      .join('; '),
  }));
}

function monthOf(iso: string): string {
  return formatDate(iso).replace(/^\d+ /, '');
}

export function trendTable(
  points: readonly TrendScore[],
  { unit, decimals }: { unit: string; decimals: number },
): { columns: DataColumn[]; rows: DataRow[] } {
  const columns: DataColumn[] = [
    { key: 'round', label: 'Round', kind: 'link' },
    { key: 'score', label: 'Score', kind: 'score' },
    { key: 'kind', label: 'Kind', kind: 'text' },
    { key: 'closes', label: 'Results due', kind: 'date' },
    { key: 'item', label: 'Item', kind: 'text' },
    { key: 'value', label: `Your result in ${unit}`, kind: 'number', decimals },
    { key: 'assigned', label: 'x_pt', kind: 'number', decimals: decimals + 1 },
    { key: 'sigma', label: 'sigma_pt', kind: 'number', decimals: decimals + 2 },
  ];
  // The newest round first: it is what a reader looks for.
  const rows = [...points].reverse().map((point) => ({
    id: String(point.roundMeasurandId),
    cells: {
      round: {
        text: point.roundName,
        href: `/laboratory/rounds/${point.roundSlug}/scores/${point.roundMeasurandId}`,
      },
      closes: point.closesAt,
      item: point.item,
      value: point.value,
      assigned: point.assignedValue,
      sigma: point.sigmaPt,
      kind: SCORE_NAMES[point.scoreKind],
      score: { score: point.score, signal: point.signal },
    },
  }));
  return { columns, rows };
}
