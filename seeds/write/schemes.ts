import { addAuditEntry } from '@/db/audit-store';
import type { Db } from '@/db/connection';
import { createMeasurand, listMeasurands, type Measurand } from '@/db/measurand-store';
import { createScheme } from '@/db/scheme-store';
import { slugify } from '@/lib/slug';
import { SCHEMES, UNIT, type SchemeKey } from '../scenario/schemes';
import type { Calendar } from '../story/calendar';
import { atMoment } from '@/db/clock';

export interface WrittenScheme {
  id: number;
  measurands: readonly Measurand[];
}

const SCHEMES_MADE = -1215;

async function writeScheme(trx: Db, plan: (typeof SCHEMES)[number], userId: number): Promise<WrittenScheme> {
  const { name, description } = plan;
  const id = await createScheme(trx, { slug: slugify(name), name, description, createdBy: userId });
  await addAuditEntry(trx, { userId, action: 'scheme.created', detail: name });
  for (const measurand of plan.measurands) {
    await createMeasurand(trx, { ...measurand, schemeId: id, unit: UNIT, sigmaValue: null });
    await addAuditEntry(trx, { userId, action: 'measurand.created', detail: `${name}: ${measurand.code}` });
  }
  return { id, measurands: await listMeasurands(trx, id) };
}

/** Writes the schemes with their measurands, before the first round. */
export async function writeSchemes(
  trx: Db,
  calendar: Calendar,
  userId: number,
): Promise<ReadonlyMap<SchemeKey, WrittenScheme>> {
  const written = new Map<SchemeKey, WrittenScheme>();
  for (const plan of SCHEMES) {
    written.set(
      plan.key,
      await atMoment(calendar.moment(SCHEMES_MADE), () => writeScheme(trx, plan, userId)),
    );
  }
  return written;
}
