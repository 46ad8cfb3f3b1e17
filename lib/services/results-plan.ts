import 'server-only';
import type { Db } from '@/db/connection';
import type { Round } from '@/db/round-store';
import { listPlanRows } from '@/db/views/results-plan-view';
import type { PlanLaboratory, ResultsPlan } from '@/lib/results-file';

export async function getResultsPlan(
  connection: Db,
  round: Round,
  laboratories?: readonly PlanLaboratory[],
): Promise<ResultsPlan> {
  const rows = await listPlanRows(connection, round.id);
  const items = new Map(rows.map((row) => [row.item, { code: row.item, name: row.itemName }]));
  return { round: round.name, items: [...items.values()], measurands: rows, methods: null, laboratories };
}
