import { db } from '@/db/connection';
import { findRound } from '@/db/round-store';
import { createUser } from '@/db/user-store';
import type { Actor } from '@/lib/rules/roles';
import { addRound, addTestItem, getRoundPlan } from '@/lib/services/round-plan';
import { closeRound, openRound } from '@/lib/services/round-steps';
import { addMeasurand, addScheme } from '@/lib/services/schemes';
import { makeData } from './stats-data';

export const LARGE_ROUND = { laboratories: 2_000, measurands: 50, replicates: 2 };

const DAY_MS = 86_400_000;
const AT_ONCE = 500;

/** An invented closed round of the size above in the database of db(), which is made here. */
export async function writeLargeRound(): Promise<{ slug: string; roundId: number; actor: Actor }> {
  await db().migrate.latest();
  const userId = await createUser(db(), { name: 'Bench', email: 'bench@basin.example' });
  const actor: Actor = {
    userId,
    name: 'Bench',
    email: 'bench@basin.example',
    memberships: [],
  } as unknown as Actor;
  const slug = await planRound(actor);
  const roundId = (await findRound(db(), slug))?.id ?? 0;
  await openRound(actor, slug);
  await writeSubmissions(roundId, userId);
  await closeRound(actor, slug);
  return { slug, roundId, actor };
}

async function planRound(actor: Actor): Promise<string> {
  const { slug: scheme } = await addScheme(actor, { name: 'Bench', description: '' });
  for (let k = 1; k <= LARGE_ROUND.measurands; k += 1) {
    await addMeasurand(actor, scheme, {
      code: `M${k}`,
      name: `Measurand ${k}`,
      unit: 'ug/kg',
      decimals: 3,
      decisionLimit: null,
      decisionLimitSource: null,
      sigmaRule: 'percent',
      sigmaValue: null,
      sigmaPercent: 10,
    });
  }
  const inDays = (days: number) => new Date(Date.now() + days * DAY_MS).toISOString();
  const { slug } = await addRound(actor, scheme, {
    name: 'Large',
    isPast: false,
    opensAt: inDays(-1),
    dispatchAt: inDays(0),
    closesAt: inDays(20),
    publishAt: inDays(30),
    instructions: '',
    feeCents: 0,
    feeCurrency: 'EUR',
  });
  const { choices } = await getRoundPlan(slug);
  const item = { code: 'A', name: 'Ground maize', matrix: 'maize', handling: '' };
  await addTestItem(
    actor,
    slug,
    item,
    choices.map(({ id }) => id),
  );
  return slug;
}

async function writeSubmissions(roundId: number, userId: number): Promise<void> {
  const { laboratories, measurands, replicates } = LARGE_ROUND;
  const now = new Date().toISOString();
  const plans: { id: number }[] = await db()('round_measurands').where({ round_id: roundId }).select('id');
  const ids = Array.from({ length: laboratories }, (_, i) => i + 1);
  const insert = (table: string, rows: object[]) => db().batchInsert(table, rows, AT_ONCE);
  await insert(
    'laboratories',
    ids.map((id) => ({ id, name: `Mill ${id}`, created_at: now })),
  );
  await insert(
    'enrolments',
    ids.map((id) => ({
      id,
      round_id: roundId,
      laboratory_id: id,
      participant_code: String(1000 + id),
      state: 'enrolled',
      created_at: now,
    })),
  );
  await insert('uploads', [
    { id: 1, sha256: '0'.repeat(64), byte_count: 0, bytes: Buffer.alloc(0), created_at: now },
  ]);
  await insert(
    'submissions',
    ids.map((id) => ({
      id,
      round_id: roundId,
      enrolment_id: id,
      upload_id: 1,
      file_name: 'results.csv',
      state: 'submitted',
      channel: 'browser',
      receipt_code: `R${id}`,
      result_count: measurands * replicates,
      user_id: userId,
      submitted_at: now,
    })),
  );
  const values = makeData(laboratories * measurands * replicates).y;
  const rows = values.map((value, i) => ({
    submission_id: 1 + Math.floor(i / (measurands * replicates)),
    round_measurand_id: plans[Math.floor(i / replicates) % measurands]?.id,
    replicate: 1 + (i % replicates),
    line: 2 + (i % (measurands * replicates)),
    result_text: value.toFixed(3),
    kind: 'value',
    value: Number(value.toFixed(3)),
    own_value: Number(value.toFixed(3)),
    own_unit: 'ug/kg',
    expanded_uncertainty: 3,
    coverage_factor: 2,
  }));
  await insert('results', rows);
}
