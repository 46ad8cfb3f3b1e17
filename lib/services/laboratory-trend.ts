import 'server-only';
import { db } from '@/db/connection';
import {
  listTrendMeasurands,
  listTrendPoints,
  type TrendMeasurand,
  type TrendPoint,
} from '@/db/views/laboratory-trend-view';
import { notFound } from '@/lib/errors';

export interface Trend {
  measurands: TrendMeasurand[];
  /** The one that is shown; null when the laboratory has not been scored yet. */
  chosen: TrendMeasurand | null;
  points: TrendPoint[];
}

/** A laboratory's scores over the rounds: for the measurand asked for, or for the one with the most scores. */
export async function getTrend(laboratoryId: number, measurandId: number | null): Promise<Trend> {
  const measurands = await listTrendMeasurands(db(), laboratoryId);
  const [most] = [...measurands].sort((a, b) => b.count - a.count);
  const asked = measurands.find((entry) => entry.id === measurandId);
  if (measurandId !== null && !asked) throw notFound('The measurand');
  const chosen = asked ?? most ?? null;
  const points = chosen ? await listTrendPoints(db(), laboratoryId, chosen.id) : [];
  return { measurands, chosen, points };
}
