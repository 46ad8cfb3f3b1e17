import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { confirmReceipt, moveEnrolment } from '@/lib/services/enrolments';
import { laboratoryTemplate } from '@/lib/services/results-template';
import { closeRound } from '@/lib/services/round-steps';
import { checkResultsFile, submitResultsFile } from '@/lib/services/submit-results';
import { todayAnywhere } from '@/lib/services/today-anywhere';
import { testDatabase } from '../db/test-database';
import { at, csvOf, fileOf, openWithManagers, send, submitAs } from './laboratory-fixture';
import { addLaboratory, logOf as fullLogOf } from './people-fixture';
import { inDays } from './round-fixture';

type Db = Awaited<ReturnType<typeof testDatabase>>;

async function counts(db: Db) {
  const count = async (table: string) => (await db(table).select('id')).length;
  return {
    uploads: await count('uploads'),
    submissions: await count('submissions'),
    results: await count('results'),
  };
}

describe('checking a file', () => {
  it('submits nothing, keeps the bytes once and says what it would replace', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const { actor, laboratoryId } = at(open, 0);
    const file = fileOf(csvOf('8.4'));
    const first = await checkResultsFile(actor, open.round, laboratoryId, file);
    expect(first.report.ok).toBe(true);
    expect(first.current).toBeNull();
    await checkResultsFile(actor, open.round, laboratoryId, file);
    expect(await counts(db)).toEqual({ uploads: 1, submissions: 0, results: 0 });
    const receipt = await send(open, 0, csvOf('8.4'));
    const again = await checkResultsFile(actor, open.round, laboratoryId, fileOf(csvOf('8.5')));
    expect(again.current).toMatchObject({ receiptCode: receipt.receiptCode });
  });

  it('keeps nothing of a bad file but a line in the log', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const { actor, laboratoryId } = at(open, 0);
    const { report } = await checkResultsFile(actor, open.round, laboratoryId, fileOf(csvOf('=1+1')));
    expect(report.ok).toBe(false);
    expect(await counts(db)).toEqual({ uploads: 0, submissions: 0, results: 0 });
    expect((await fullLogOf(db)).at(-1)).toMatchObject({ action: 'results.refused', outcome: 'refused' });
  });
});

describe('submitting a file', () => {
  it('keeps the bytes as sent, with their SHA-256, and the text beside the number', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const text = '\uFEFFitem;measurand;result;unit\r\nM1;AFT;0,0084;mg/kg\r\n';
    const { receipt } = await submitAs(open, 0, text, 'Ergebnisse März.csv');
    const sha256 = createHash('sha256').update(text, 'utf8').digest('hex');
    expect(receipt).toMatchObject({ sha256, resultCount: 1, isRepeat: false, replacedReceiptCode: null });
    const [upload] = await db('uploads');
    expect(Buffer.from(upload.bytes).equals(Buffer.from(text, 'utf8'))).toBe(true);
    const [result] = await db('results');
    expect(result).toMatchObject({ result_text: '0,0084', own_unit: 'mg/kg', own_value: 0.0084 });
    expect(result.value).toBeCloseTo(8.4, 12);
    expect(await db('submissions').first('file_name')).toEqual({ file_name: 'Ergebnisse März.csv' });
  });

  it('counts the same file sent twice once', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const first = await send(open, 0, csvOf('8.4'));
    const second = await send(open, 0, csvOf('8.4'));
    expect(second).toMatchObject({ receiptCode: first.receiptCode, isRepeat: true });
    expect(await counts(db)).toEqual({ uploads: 1, submissions: 1, results: 1 });
  });

  it('counts the same file sent twice at the same moment once', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const receipts = await Promise.all([1, 2, 3, 4].map(() => send(open, 0, csvOf('8.4'))));
    expect(new Set(receipts.map(({ receiptCode }) => receiptCode)).size).toBe(1);
    expect(await counts(db)).toEqual({ uploads: 1, submissions: 1, results: 1 });
    expect(await db('outbox').where('subject', 'like', 'Receipt %')).toHaveLength(1);
  });

  it('lets an amended file take the place of the earlier one, which stays', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const first = await send(open, 0, csvOf('8.4'));
    const second = await send(open, 0, csvOf('8.6'));
    expect(second.replacedReceiptCode).toBe(first.receiptCode);
    const kept = await db('submissions').orderBy('id').select('receipt_code', 'state', 'supersedes_id', 'id');
    expect(kept).toMatchObject([
      { receipt_code: first.receiptCode, state: 'superseded', supersedes_id: null },
      { receipt_code: second.receiptCode, state: 'submitted', supersedes_id: kept[0].id },
    ]);
    expect(await counts(db)).toEqual({ uploads: 2, submissions: 2, results: 2 });
    const back = await send(open, 0, csvOf('8.4'));
    expect(back.isRepeat).toBe(false);
    expect(await counts(db)).toEqual({ uploads: 2, submissions: 3, results: 3 });
  });

  it('takes all of a file or nothing', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const { receipt, report } = await submitAs(open, 0, 'item,measurand,result\nM1,AFT,8.4\nM9,AFT,8.1\n');
    expect(receipt).toBeNull();
    expect(report.problems).toMatchObject([{ line: 3, column: 'item', code: 'unknown-item' }]);
    expect(await counts(db)).toEqual({ uploads: 0, submissions: 0, results: 0 });
  });

  it('writes nothing when a row cannot be written after all', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    await send(open, 0, csvOf('8.4'));
    await db.raw(
      "create trigger results_full before insert on results begin select raise(abort, 'disk full'); end",
    );
    await expect(submitAs(open, 0, csvOf('8.6'))).rejects.toThrow('disk full');
    expect(await counts(db)).toEqual({ uploads: 1, submissions: 1, results: 1 });
    expect(await db('submissions').first('state')).toEqual({ state: 'submitted' });
  });
});

describe('who may send, and when', () => {
  it('refuses a closed round', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    await send(open, 0, csvOf('8.4'));
    await closeRound(open.coordinator, open.round);
    await expect(submitAs(open, 0, csvOf('8.6'))).rejects.toMatchObject({
      code: 'conflict',
      userMessage: 'Maize 1 takes no results: it is closed and under review.',
    });
    expect(await counts(db)).toEqual({ uploads: 1, submissions: 1, results: 1 });
    expect((await fullLogOf(db)).at(-1)).toMatchObject({
      action: 'results.refused',
      outcome: 'refused',
      detail: expect.stringMatching(/takes no results.*SHA-256/),
    });
  });

  it('refuses after the closing time, even before the coordinator closes', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    await db('rounds').update({ opens_at: inDays(-3), dispatch_at: inDays(-3), closes_at: inDays(-1) });
    await expect(submitAs(open, 0, csvOf('8.4'))).rejects.toMatchObject({ code: 'conflict' });
    expect(await counts(db)).toEqual({ uploads: 0, submissions: 0, results: 0 });
  });

  it('does not know the round for a laboratory that has no part in it', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const stranger = await addLaboratory(db, 'Elsewhere');
    const { actor } = at(open, 0);
    for (const [slug, laboratoryId] of [
      [open.round, stranger],
      ['no-such-round', at(open, 0).laboratoryId],
    ] as const) {
      await expect(submitResultsFile(actor, slug, laboratoryId, fileOf(csvOf('8.4')))).rejects.toMatchObject({
        code: 'not-found',
      });
    }
    expect(await counts(db)).toEqual({ uploads: 0, submissions: 0, results: 0 });
  });

  it('does not know a round that the provider loads after the event', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1, { isPast: true });
    const { actor, laboratoryId } = at(open, 0);
    const missing = { code: 'not-found' };
    await expect(submitAs(open, 0, csvOf('8.4'))).rejects.toMatchObject(missing);
    await expect(laboratoryTemplate(open.round, laboratoryId, ',')).rejects.toMatchObject(missing);
    await expect(confirmReceipt(actor, open.round, laboratoryId)).rejects.toMatchObject(missing);
    expect(await counts(db)).toEqual({ uploads: 0, submissions: 0, results: 0 });
  });

  it('takes a date that is today where the day begins first, and none after it', () => {
    expect(todayAnywhere(new Date('2026-12-01T09:59:59Z'))).toBe('2026-12-01');
    expect(todayAnywhere(new Date('2026-12-01T10:00:00Z'))).toBe('2026-12-02');
  });

  it('refuses a laboratory that was withdrawn', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    await moveEnrolment(open.coordinator, open.round, at(open, 0).laboratoryId, 'withdrawn', 'Asked for it');
    await expect(submitAs(open, 0, csvOf('8.4'))).rejects.toMatchObject({ code: 'conflict' });
  });
});
