import type { Knex } from 'knex';
import type { Actor } from '@/lib/rules/roles';
import type { MeasurandInput } from '@/lib/schemas/schemes';
import type { RoundInput } from '@/lib/schemas/rounds';
import { enrolLaboratories } from '@/lib/services/enrolments';
import { addRound, addTestItem, getRoundPlan } from '@/lib/services/round-plan';
import { openRound } from '@/lib/services/round-steps';
import { addMeasurand, addScheme } from '@/lib/services/schemes';
import { loadWholeRound } from '@/lib/services/whole-round';
import { addLaboratory, newActor } from './people-fixture';

export const DAY_MS = 86_400_000;

/** Days from now as ISO text. */
export function inDays(days: number): string {
  return new Date(Date.now() + days * DAY_MS).toISOString();
}

export const ROUND: RoundInput = {
  name: 'Maize 1',
  isPast: false,
  opensAt: inDays(-1),
  dispatchAt: inDays(0),
  closesAt: inDays(20),
  publishAt: inDays(30),
  instructions: '',
  feeCents: 0,
  feeCurrency: 'EUR',
};

export const MEASURAND: MeasurandInput = {
  code: 'AFT',
  name: 'Aflatoxins, total',
  unit: 'ug/kg',
  decimals: 1,
  decisionLimit: null,
  decisionLimitSource: null,
  sigmaRule: 'prescribed',
  sigmaValue: 2,
  sigmaPercent: null,
};

export interface Planned {
  coordinator: Actor;
  scheme: string;
  round: string;
}

/** A scheme with one measurand and a round with one item that has it; still being planned. */
export async function planRound(db: Knex, change: Partial<RoundInput> = {}): Promise<Planned> {
  const coordinator = await newActor(db, { name: 'Cora Lind', roles: ['coordinator'] });
  const { slug: scheme } = await addScheme(coordinator, { name: 'Mycotoxins', description: '' });
  await addMeasurand(coordinator, scheme, MEASURAND);
  const { slug: round } = await addRound(coordinator, scheme, { ...ROUND, ...change });
  const { choices } = await getRoundPlan(round);
  const item = { code: 'M1', name: 'Ground maize', matrix: 'maize', handling: '' };
  await addTestItem(
    coordinator,
    round,
    item,
    choices.map(({ id }) => id),
  );
  return { coordinator, scheme, round };
}

/** The same, open, with so many laboratories enrolled. */
export async function openWithLaboratories(
  db: Knex,
  count: number,
  change: Partial<RoundInput> = {},
): Promise<Planned & { laboratoryIds: number[] }> {
  const planned = await planRound(db, change);
  await openRound(planned.coordinator, planned.round);
  const laboratoryIds: number[] = [];
  for (let number = 1; number <= count; number += 1)
    laboratoryIds.push(await addLaboratory(db, `Mill ${number}`));
  if (count > 0) await enrolLaboratories(planned.coordinator, planned.round, laboratoryIds, 'enrolled');
  return { ...planned, laboratoryIds };
}

export function wholeRoundFile(results: readonly (string | number)[], item = 'M1'): string {
  const rows = results.map((result, index) => `Mill ${index + 1},${item},AFT,${result}`);
  return ['laboratory,item,measurand,result', ...rows].join('\n');
}

/** Loads one result for each of Mill 1, Mill 2 ... */
export async function loadResults({ coordinator, round }: Planned, results: readonly (string | number)[]) {
  const bytes = Buffer.from(wholeRoundFile(results));
  return loadWholeRound(coordinator, round, { name: 'round.csv', bytes });
}

export async function logOf(db: Knex): Promise<string[]> {
  const rows: { action: string }[] = await db('audit_log').orderBy('id').select('action');
  return rows.map(({ action }) => action);
}
