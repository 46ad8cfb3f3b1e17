import { expect, it } from 'vitest';
import { measurandSchema } from '@/lib/schemas/schemes';
import { addMeasurand, changeMeasurand, getSchemeWithMeasurands, addScheme } from '@/lib/services/schemes';
import { testDatabase } from '../db/test-database';
import { newActor } from './people-fixture';
import { MEASURAND, planRound } from './round-fixture';

it('gives schemes of one name addresses of their own, and none that stands for a page', async () => {
  const db = await testDatabase();
  const coordinator = await newActor(db, { name: 'Cora Lind', roles: ['coordinator'] });
  const slugs = [];
  for (const name of ['Maize', 'Maize', 'New']) {
    slugs.push((await addScheme(coordinator, { name, description: '' })).slug);
  }
  expect(slugs).toEqual(['maize', 'maize-2', 'new-2']);
});

it('refuses a second measurand of one code, whatever its case', async () => {
  const db = await testDatabase();
  const { coordinator, scheme } = await planRound(db);
  await expect(addMeasurand(coordinator, scheme, { ...MEASURAND, code: 'aft' })).rejects.toMatchObject({
    code: 'conflict',
    fieldErrors: { code: expect.stringContaining('AFT is already used') },
  });
});

it('keeps code and unit of a measurand that a round uses, and lets the rest change', async () => {
  const db = await testDatabase();
  const { coordinator, scheme } = await planRound(db);
  const id = (await getSchemeWithMeasurands(scheme)).measurands[0]?.id ?? 0;
  await expect(
    changeMeasurand(coordinator, scheme, id, { ...MEASURAND, unit: 'mg/kg' }),
  ).rejects.toMatchObject({ code: 'conflict' });
  await changeMeasurand(coordinator, scheme, id, { ...MEASURAND, name: 'Aflatoxins B and G' });
  expect((await getSchemeWithMeasurands(scheme)).measurands[0]).toMatchObject({
    name: 'Aflatoxins B and G',
    unit: 'ug/kg',
  });
});

it('asks for the number that the sigma_pt rule needs, and drops the others', () => {
  const form = { code: 'DON', name: 'Deoxynivalenol', unit: 'ug/kg', decimals: '0', sigmaRule: 'percent' };
  const missing = measurandSchema.safeParse(form);
  expect(missing.error?.issues.map((issue) => issue.path.join('.'))).toEqual(['sigmaPercent']);
  const given = measurandSchema.parse({ ...form, sigmaPercent: '22,5', sigmaValue: '7' });
  expect(given).toMatchObject({ sigmaPercent: 22.5, sigmaValue: null });
});

it('refuses the Horwitz function for a unit that is no mass fraction', () => {
  const form = { code: 'ATR', name: 'Atrazine', unit: 'ug/L', decimals: '3', sigmaRule: 'horwitz' };
  expect(measurandSchema.safeParse(form).error?.issues[0]?.message).toContain('needs a mass fraction');
});

it('takes one of two measurands with the same code that are added at the same moment', async () => {
  const db = await testDatabase();
  const { coordinator, scheme } = await planRound(db);
  const adding = ['DON', 'don'].map((code) => addMeasurand(coordinator, scheme, { ...MEASURAND, code }));
  const outcomes = await Promise.allSettled(adding);
  expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  expect(outcomes.find(({ status }) => status === 'rejected')).toMatchObject({
    reason: { code: 'conflict' },
  });
});
