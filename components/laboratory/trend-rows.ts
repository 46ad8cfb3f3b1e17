import type { TrendPoint as ChartPoint } from '@/components/charts/chart-types';
import type { DataColumn, DataRow } from '@/components/ui/data-table';
import type { ScoreKind } from '@/lib/format';
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

/** The points of the chart, oldest first; a round with several items for the measurand gives one each. */
export function trendChartPoints(points: readonly TrendScore[]): ChartPoint[] {
  const perRound = new Map<string, number>();
  for (const { roundSlug } of points) perRound.set(roundSlug, (perRound.get(roundSlug) ?? 0) + 1);
  const isMixed = new Set(points.filter(isOnTrendAxis).map((point) => point.scoreKind)).size > 1;
  return points.filter(isOnTrendAxis).map((point) => ({
    key: `${point.roundSlug}-${point.roundMeasurandId}`,
    label: (perRound.get(point.roundSlug) ?? 1) > 1 ? `${point.roundName} ${point.item}` : point.roundName,
    score: point.score,
    signal: point.signal,
    note: isMixed ? SCORE_NAMES[point.scoreKind] : undefined,
  }));
}

export function trendTable(
  points: readonly TrendScore[],
  { unit, decimals }: { unit: string; decimals: number },
): { columns: DataColumn[]; rows: DataRow[] } {
  const columns: DataColumn[] = [
    { key: 'round', label: 'Round', kind: 'link' },
    { key: 'closes', label: 'Results due', kind: 'date' },
    { key: 'item', label: 'Item', kind: 'text' },
    { key: 'value', label: `Your result in ${unit}`, kind: 'number', decimals },
    { key: 'assigned', label: 'x_pt', kind: 'number', decimals: decimals + 1 },
    { key: 'sigma', label: 'sigma_pt', kind: 'number', decimals: decimals + 2 },
    { key: 'kind', label: 'Score', kind: 'text' },
    { key: 'score', label: 'Value', kind: 'score' },
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
