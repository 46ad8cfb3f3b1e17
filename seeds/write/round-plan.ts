import { addAuditEntry } from '@/db/audit-store';
import type { Db } from '@/db/connection';
import { createRoundMeasurand, type RoundMeasurandPlan } from '@/db/round-measurand-store';
import { createRound } from '@/db/round-store';
import { createTestItem } from '@/db/test-item-store';
import type { Measurand } from '@/db/measurand-store';
import { defaultPlan } from '@/lib/services/plan-defaults';
import { HANDLING, INSTRUCTIONS, type PlannedItem } from '../scenario/items';
import type { MeasurandCode } from '../scenario/methods';
import type { DemoRound } from '../scenario/rounds';
import type { Calendar } from '../story/calendar';
import { roundDays } from './round-days';
import type { WrittenScheme } from './schemes';

const FEE_CENTS = 18_000;
const DISPATCH_HOUR = 14;
const CLOSING_HOUR = 16;

interface Planned {
  round: DemoRound;
  roundId: number;
  scheme: WrittenScheme;
  userId: number;
}

/** Creates the round with its items and measurands, as a coordinator would plan it. */
export async function planRound(
  trx: Db,
  calendar: Calendar,
  { round, scheme, userId }: Omit<Planned, 'roundId'>,
): Promise<number> {
  const days = roundDays(round);
  const roundId = await createRound(trx, {
    slug: round.slug,
    schemeId: scheme.id,
    name: round.name,
    isPast: false,
    opensAt: calendar.moment(days.opens),
    dispatchAt: calendar.moment(days.opens, DISPATCH_HOUR),
    closesAt: calendar.moment(days.closes, CLOSING_HOUR),
    publishAt: calendar.moment(days.publishPlanned, CLOSING_HOUR),
    instructions: INSTRUCTIONS,
    feeCents: FEE_CENTS,
    feeCurrency: 'EUR',
    createdBy: userId,
  });
  await addAuditEntry(trx, { userId, roundId, action: 'round.created', detail: round.name });
  for (const item of round.items) await planItem(trx, { round, roundId, scheme, userId }, item);
  return roundId;
}

async function planItem(trx: Db, planned: Planned, item: PlannedItem): Promise<void> {
  const { round, roundId, scheme, userId } = planned;
  const { code, name, matrix } = item;
  const testItemId = await createTestItem(trx, { roundId, code, name, matrix, handling: HANDLING });
  await addAuditEntry(trx, { userId, roundId, action: 'item.created', detail: code });
  for (const measurand of scheme.measurands) {
    if (!Object.hasOwn(item.measurands, measurand.code)) continue;
    const choice = round.choices[measurand.code as MeasurandCode];
    const plan = measurandPlan(round, measurand, choice);
    await createRoundMeasurand(trx, {
      ...plan,
      roundId,
      testItemId,
      measurandId: measurand.id,
      position: measurand.position,
    });
    if (choice === undefined && round.replicates === 1) continue;
    const detail = `${code} ${measurand.code}`;
    await addAuditEntry(trx, { userId, roundId, action: 'measurand.planned', detail });
  }
}

function measurandPlan(
  round: DemoRound,
  measurand: Measurand,
  choice: Partial<RoundMeasurandPlan> = {},
): RoundMeasurandPlan {
  return { ...defaultPlan(measurand), replicates: round.replicates, ...choice };
}
