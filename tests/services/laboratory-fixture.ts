import type { Knex } from 'knex';
import type { Actor } from '@/lib/rules/roles';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { closeRound, publishRound } from '@/lib/services/round-steps';
import { signEvaluation } from '@/lib/services/sign-evaluation';
import { submitResultsFile, type Receipt } from '@/lib/services/submit-results';
import { newActor } from './people-fixture';
import { openWithLaboratories } from './round-fixture';

export interface OpenRound {
  coordinator: Actor;
  round: string;
  laboratoryIds: number[];
  /** A manager of each laboratory, in the same order. */
  managers: Actor[];
}

/** An open round with laboratories that have a manager each. */
export async function openWithManagers(
  db: Knex,
  count: number,
  change: Parameters<typeof openWithLaboratories>[2] = {},
): Promise<OpenRound> {
  const { coordinator, round, laboratoryIds } = await openWithLaboratories(db, count, change);
  const managers: Actor[] = [];
  for (const [index, id] of laboratoryIds.entries()) {
    managers.push(await newActor(db, { name: `Mona ${index + 1}`, roles: [['lab_manager', id]] }));
  }
  return { coordinator, round, laboratoryIds, managers };
}

export function csvOf(result: string | number): string {
  return `item,measurand,result\nM1,AFT,${result}\n`;
}

export function fileOf(text: string, name = 'results.csv') {
  return { bytes: new TextEncoder().encode(text), name };
}

/** Sends one result for the laboratory at this place of the list; the receipt. */
export async function send(open: OpenRound, place: number, text: string): Promise<Receipt> {
  const { receipt, report } = await submitAs(open, place, text);
  if (!receipt) throw new Error(`the file was refused: ${report.problems[0]?.message}`);
  return receipt;
}

export function submitAs(open: OpenRound, place: number, text: string, name?: string) {
  const { actor, laboratoryId } = at(open, place);
  return submitResultsFile(actor, open.round, laboratoryId, fileOf(text, name));
}

export function at(open: OpenRound, place: number): { actor: Actor; laboratoryId: number } {
  const actor = open.managers[place];
  const laboratoryId = open.laboratoryIds[place];
  if (!actor || laboratoryId === undefined) throw new Error(`the fixture has no laboratory ${place}`);
  return { actor, laboratoryId };
}

/** Closes, evaluates, signs and publishes. */
export async function publish(db: Knex, open: Pick<OpenRound, 'coordinator' | 'round'>): Promise<void> {
  await closeRound(open.coordinator, open.round);
  await evaluateRound(open.coordinator, open.round);
  const [known] = await db('users').where({ name: 'Rhys Alder' }).select('id');
  const reviewer = known
    ? { ...open.coordinator, userId: known.id, memberships: [reviewing] }
    : await newActor(db, { name: 'Rhys Alder', roles: ['reviewer'] });
  await signEvaluation(reviewer, open.round, 1, 'Read.');
  await publishRound(open.coordinator, open.round);
}

const reviewing = { role: 'reviewer', laboratoryId: null, laboratoryName: null } as const;
