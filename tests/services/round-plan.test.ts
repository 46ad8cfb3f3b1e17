import { expect, it } from 'vitest';
import { checkbox, requiredNote, requiredText } from '@/lib/schemas/fields';
import { roundMeasurandSchema, roundSchema } from '@/lib/schemas/rounds';
import {
  addRoundMeasurand,
  addTestItem,
  changeRound,
  changeRoundMeasurand,
  changeTestItem,
  dropRoundMeasurand,
  dropTestItem,
  getRound,
  getRoundPlan,
} from '@/lib/services/round-plan';
import { openRound } from '@/lib/services/round-steps';
import { testDatabase } from '../db/test-database';
import { openWithManagers } from './laboratory-fixture';
import { inDays, logOf, planRound, ROUND } from './round-fixture';

const ITEM = { code: 'M2', name: 'Ground maize, high', matrix: '', handling: '' };
const PLAN = roundMeasurandSchema.parse({
  replicates: '2',
  assignedMethod: 'stated',
  statedValue: '12.5',
  statedUncertainty: '0.4',
  statedSource: 'Certificate 7',
  sigmaRule: 'percent',
  sigmaPercent: '20',
  scoreKind: 'z',
  zPrimeWhenNeeded: 'on',
});

it("gives an item's measurands the sigma_pt rule of the scheme", async () => {
  const db = await testDatabase();
  const { round } = await planRound(db);
  const { items, measurands } = await getRoundPlan(round);
  expect(items.map(({ code }) => code)).toEqual(['M1']);
  expect(measurands).toMatchObject([
    { itemCode: 'M1', code: 'AFT', sigmaRule: 'prescribed', sigmaValue: 2, assignedMethod: 'algorithm-a' },
  ]);
});

it('changes, adds and removes items and measurands while the round is planned, and logs it', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  await addTestItem(coordinator, round, ITEM, []);
  const before = await getRoundPlan(round);
  const second = before.items[1]?.id ?? 0;
  await addRoundMeasurand(coordinator, round, second, before.choices[0]?.id ?? 0);
  await changeTestItem(coordinator, round, second, { ...ITEM, name: 'Maize, high' });
  const added = (await getRoundPlan(round)).measurands.find((entry) => entry.testItemId === second);
  await changeRoundMeasurand(coordinator, round, added?.id ?? 0, PLAN);
  expect((await getRoundPlan(round)).measurands[1]).toMatchObject({ ...PLAN, itemName: 'Maize, high' });
  await dropRoundMeasurand(coordinator, round, added?.id ?? 0);
  await dropTestItem(coordinator, round, second);
  expect(await getRoundPlan(round)).toMatchObject({ items: [{ code: 'M1' }], measurands: [{ code: 'AFT' }] });
  expect((await logOf(db)).slice(-5)).toEqual([
    'measurand.added',
    'item.changed',
    'measurand.planned',
    'measurand.removed',
    'item.removed',
  ]);
});

it('refuses a second item of one code and a measurand twice in one item', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  const { items, choices } = await getRoundPlan(round);
  await expect(addTestItem(coordinator, round, { ...ITEM, code: 'm1' }, [])).rejects.toMatchObject({
    fieldErrors: { code: expect.stringContaining('M1 is in the plan already') },
  });
  await expect(
    addRoundMeasurand(coordinator, round, items[0]?.id ?? 0, choices[0]?.id ?? 0),
  ).rejects.toMatchObject({ code: 'conflict' });
});

it('fixes the plan once the round is open; only the later dates and the instructions still move', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await planRound(db);
  await openRound(coordinator, round);
  const { items } = await getRoundPlan(round);
  await expect(addTestItem(coordinator, round, ITEM, [])).rejects.toMatchObject({ code: 'conflict' });
  await expect(dropTestItem(coordinator, round, items[0]?.id ?? 0)).rejects.toMatchObject({
    code: 'conflict',
  });
  const change = { name: 'Other', opensAt: inDays(-9), closesAt: inDays(22), publishAt: inDays(40) };
  await changeRound(coordinator, round, { ...ROUND, ...change, instructions: 'Two replicates.' });
  expect(await getRound(round)).toMatchObject({
    name: ROUND.name,
    opensAt: ROUND.opensAt,
    closesAt: change.closesAt,
    publishAt: change.publishAt,
    instructions: 'Two replicates.',
  });
});

it('holds the dates of an open round against those that are stored, and tells of a new closing date', async () => {
  const db = await testDatabase();
  const open = await openWithManagers(db, 1);
  const old = {
    opensAt: inDays(-40),
    dispatchAt: inDays(-40),
    closesAt: inDays(-30),
    publishAt: inDays(-20),
  };
  await expect(changeRound(open.coordinator, open.round, { ...ROUND, ...old })).rejects.toMatchObject({
    code: 'invalid',
    fieldErrors: { closesAt: 'The close must not be before the dispatch.' },
  });
  for (const days of [22, 23, 22]) {
    await changeRound(open.coordinator, open.round, { ...ROUND, closesAt: inDays(days) });
  }
  const { closesAt } = await getRound(open.round);
  await changeRound(open.coordinator, open.round, { ...ROUND, closesAt, instructions: 'Two.' });
  expect(await db('outbox').where('subject', 'New closing date of Maize 1')).toHaveLength(3);
});

it('takes a fee in whole cents', () => {
  const form = {
    name: 'Maize 2',
    opensAt: '2027-01-04',
    dispatchAt: '2027-01-04',
    closesAt: '2027-01-04',
    publishAt: '2027-01-04',
  };
  expect(roundSchema.parse({ ...form, fee: '0.29' }).feeCents).toBe(29);
  expect(roundSchema.parse({ ...form, fee: '999999,99' }).feeCents).toBe(99_999_999);
  expect(roundSchema.safeParse({ ...form, fee: '1.005' }).error?.issues).toMatchObject([{ path: ['fee'] }]);
});

it('takes names in one line and reasons in several', () => {
  for (const name of ['Mill\nClick here: http://evil.example', 'a\u0000b', 'a\u202eb', 'a\u2028b']) {
    expect(requiredText('a name').safeParse(name).success, JSON.stringify(name)).toBe(false);
    expect(requiredNote('a reason', 500).safeParse(name).success).toBe(true);
  }
  expect(requiredText('a name').parse(' M\u00fchle Nord & S\u00f6hne \n')).toBe(
    'M\u00fchle Nord & S\u00f6hne',
  );
});

it('reads the dates of a form as UTC and wants them in order', () => {
  const form = {
    name: 'Maize 2',
    opensAt: '2027-01-04T08:00',
    dispatchAt: '2027-01-11T08:00',
    closesAt: '2027-02-08T17:00',
    publishAt: '2027-02-22T12:00',
    fee: '120,50',
  };
  expect(roundSchema.parse(form)).toMatchObject({
    closesAt: '2027-02-08T17:00:00.000Z',
    feeCents: 12_050,
    isPast: false,
  });
  const late = roundSchema.safeParse({ ...form, closesAt: '2027-01-05T08:00' });
  expect(late.error?.issues).toMatchObject([{ path: ['closesAt'] }]);
});

it('takes a tick box as a form sends it and as a form library keeps it', () => {
  const taken = ['on', 'true', '1', true, false, undefined].map((value) => checkbox.parse(value));
  expect(taken).toEqual([true, true, true, true, false, false]);
});
