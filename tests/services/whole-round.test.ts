import { expect, it } from 'vitest';
import { moveEnrolment } from '@/lib/services/enrolments';
import { listParticipantsFor } from '@/lib/services/participant-key';
import { getResultsByCode } from '@/lib/services/round-results';
import { checkWholeRoundFile, loadWholeRound } from '@/lib/services/whole-round';
import { testDatabase } from '../db/test-database';
import { csvOf, openWithManagers, send } from './laboratory-fixture';
import { logOf, loadResults, openWithLaboratories, planRound, wholeRoundFile } from './round-fixture';

const fileOf = (text: string) => ({ name: 'round.csv', bytes: Buffer.from(text) });

async function countRows(db: Awaited<ReturnType<typeof testDatabase>>, table: string): Promise<number> {
  return (await db(table).select('id')).length;
}

it('enrols known laboratories, makes new ones and keeps one submission for each', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 2);
  const load = await loadResults(planned, ['10.1', '<2', '12.40']);
  expect(load).toMatchObject({ laboratoryCount: 3, resultCount: 3, report: { newLaboratories: ['Mill 3'] } });
  const { results, missingCodes } = await getResultsByCode(planned.round);
  expect(results.map(({ resultText, kind, value }) => ({ resultText, kind, value }))).toEqual(
    expect.arrayContaining([
      { resultText: '10.1', kind: 'value', value: 10.1 },
      { resultText: '<2', kind: 'below', value: 2 },
      { resultText: '12.40', kind: 'value', value: 12.4 },
    ]),
  );
  expect(missingCodes).toEqual([]);
  expect((await logOf(db)).at(-1)).toBe('results.loaded');
});

it('checks without storing anything', async () => {
  const db = await testDatabase();
  const { round } = await openWithLaboratories(db, 1);
  const check = await checkWholeRoundFile(round, fileOf(wholeRoundFile([10, 11])));
  expect(check).toMatchObject({ laboratoryCount: 2, report: { ok: true } });
  expect([await countRows(db, 'uploads'), await countRows(db, 'laboratories')]).toEqual([0, 1]);
});

it('takes all of a file or nothing', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await openWithLaboratories(db, 1);
  const load = await loadWholeRound(coordinator, round, fileOf(wholeRoundFile(['10', 'ten'])));
  expect(load.report.ok).toBe(false);
  expect(load.report.problems[0]).toMatchObject({ line: 3, column: 'result' });
  for (const table of ['results', 'submissions', 'uploads']) expect(await countRows(db, table)).toBe(0);
  expect(await countRows(db, 'laboratories')).toBe(1);
});

it('counts the same file once and lets a mended file replace it', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 0);
  await loadResults(planned, [10, 11]);
  await loadResults(planned, [10, 11]);
  expect(await countRows(db, 'submissions')).toBe(2);
  await loadResults(planned, [10, 12]);
  const { results } = await getResultsByCode(planned.round);
  expect(results.map(({ value }) => value).sort()).toEqual([10, 12]);
  expect(await countRows(db, 'submissions')).toBe(4);
});

it('takes results only while the round is open', async () => {
  const db = await testDatabase();
  const planned = await planRound(db);
  await expect(loadResults(planned, [10])).rejects.toMatchObject({
    code: 'conflict',
    userMessage: expect.stringContaining('being planned'),
  });
});

it('leaves alone what a laboratory sent itself', async () => {
  const db = await testDatabase();
  const open = await openWithManagers(db, 2);
  await send(open, 0, csvOf('8.4'));
  const file = fileOf(wholeRoundFile([10, 11]));
  const refusal = { code: 'conflict', userMessage: expect.stringContaining('have sent their own: Mill 1.') };
  await expect(checkWholeRoundFile(open.round, file)).rejects.toMatchObject(refusal);
  await expect(loadWholeRound(open.coordinator, open.round, file)).rejects.toMatchObject(refusal);
  const [result] = (await getResultsByCode(open.round)).results;
  expect(result?.resultText).toBe('8.4');
  const others = fileOf('laboratory,item,measurand,result\nMill 2,M1,AFT,11\n');
  expect(await loadWholeRound(open.coordinator, open.round, others)).toMatchObject({ laboratoryCount: 1 });
});

it('writes down whom a file brings in and whom it brings back', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 1);
  await moveEnrolment(planned.coordinator, planned.round, planned.laboratoryIds[0] ?? 0, 'withdrawn', 'Lost');
  await loadResults(planned, [10, 11]);
  expect((await logOf(db)).slice(-4)).toEqual([
    'enrolment.enrolled',
    'laboratory.created',
    'enrolment.enrolled',
    'results.loaded',
  ]);
  const [back] = await listParticipantsFor(planned.coordinator, planned.round);
  expect(back).toMatchObject({ laboratoryName: 'Mill 1', state: 'enrolled', reason: '' });
});

it('says how many laboratories a round can have', async () => {
  const db = await testDatabase();
  const planned = await openWithLaboratories(db, 0);
  const many = Array.from({ length: 4_501 }, () => 10);
  await expect(loadResults(planned, many)).rejects.toMatchObject({
    code: 'conflict',
    userMessage: expect.stringContaining('at most 4500 laboratories, and this would make 4501'),
  });
  expect(await countRows(db, 'laboratories')).toBe(0);
});

it('refuses a name that no laboratory can have', async () => {
  const db = await testDatabase();
  const { coordinator, round } = await openWithLaboratories(db, 0);
  const text = `laboratory,item,measurand,result\n${'x'.repeat(121)},M1,AFT,11\n`;
  const { report } = await loadWholeRound(coordinator, round, fileOf(text));
  expect(report.problems).toMatchObject([{ line: 2, column: 'laboratory', code: 'cell-too-long' }]);
});
