import type { Knex } from 'knex';
import { beforeEach, expect, it } from 'vitest';
import type { Actor } from '@/lib/rules/roles';
import { addLaboratory, changeLaboratory, getLaboratory } from '@/lib/services/laboratories';
import { testDatabase } from '../../db/test-database';
import { logOf, newActor } from '../people-fixture';

const INPUT = { name: 'Lower Mill', kind: 'mill' as const, town: 'Lowerford', contactEmail: null };

let db: Knex;
let actor: Actor;
beforeEach(async () => {
  db = await testDatabase();
  actor = await newActor(db, { name: 'Ada Brook', roles: ['coordinator'] });
});

it('adds and changes a laboratory, and writes both down', async () => {
  const { id } = await addLaboratory(actor, INPUT);
  expect(await getLaboratory(id)).toMatchObject({ ...INPUT, isActive: true });
  await changeLaboratory(actor, { ...INPUT, id, town: 'Upperford', isActive: false });
  expect(await getLaboratory(id)).toMatchObject({ town: 'Upperford', isActive: false });
  expect(await logOf(db)).toMatchObject([
    { action: 'laboratory.created', laboratory_id: id },
    { action: 'laboratory.changed', laboratory_id: id },
  ]);
});

it('refuses a name that is taken, whatever its capitals', async () => {
  const { id } = await addLaboratory(actor, INPUT);
  await expect(addLaboratory(actor, { ...INPUT, name: 'LOWER mill' })).rejects.toMatchObject({
    code: 'conflict',
    fieldErrors: { name: expect.stringContaining('Lower Mill exists') },
  });
  await changeLaboratory(actor, { ...INPUT, id, name: 'Lower mill', isActive: true });
  expect((await getLaboratory(id)).name).toBe('Lower mill');
});

it('knows no laboratory that is not there', async () => {
  await expect(getLaboratory(9)).rejects.toMatchObject({ code: 'not-found' });
  await expect(changeLaboratory(actor, { ...INPUT, id: 9, isActive: true })).rejects.toMatchObject({
    code: 'not-found',
  });
  expect(await logOf(db)).toEqual([]);
});
