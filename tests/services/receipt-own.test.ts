import { describe, expect, it } from 'vitest';
import { findReceiptByCode, getOwnFile, getOwnReceipt, normaliseReceiptCode } from '@/lib/services/receipts';
import { loadWholeRound } from '@/lib/services/whole-round';
import { testDatabase } from '../db/test-database';
import { at, csvOf, fileOf, openWithManagers, send } from './laboratory-fixture';
import { inDays } from './round-fixture';

describe('a receipt', () => {
  it('tells its own laboratory what was received and what replaced it', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 2);
    const { laboratoryId } = at(open, 0);
    const first = await send(open, 0, csvOf('<2.0'));
    const second = await send(open, 0, csvOf('8.6'));
    const old = await getOwnReceipt(open.round, laboratoryId, first.receiptCode);
    expect(old.head).toMatchObject({
      state: 'superseded',
      replacedBy: second.receiptCode,
      userName: 'Mona 1',
      laboratoryName: 'Mill 1',
      fileName: 'results.csv',
      byteCount: csvOf('<2.0').length,
    });
    expect(old.rows).toMatchObject([{ line: 2, item: 'M1', measurand: 'AFT', resultText: '<2.0', value: 2 }]);
    const now = await getOwnReceipt(open.round, laboratoryId, second.receiptCode);
    expect(now.head).toMatchObject({ state: 'submitted', replaces: first.receiptCode, replacedBy: null });
  });

  it('is not found for another laboratory, another round or another code', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 2);
    const own = at(open, 0).laboratoryId;
    const { receiptCode } = await send(open, 0, csvOf('8.4'));
    const attempts = [
      [open.round, at(open, 1).laboratoryId, receiptCode],
      [open.round, own, '0000-0000-0000'],
      ['no-such-round', own, receiptCode],
      [open.round, 0, receiptCode],
    ] as const;
    for (const [slug, laboratoryId, code] of attempts) {
      await expect(getOwnReceipt(slug, laboratoryId, code)).rejects.toMatchObject({ code: 'not-found' });
      await expect(getOwnFile(slug, laboratoryId, code)).rejects.toMatchObject({ code: 'not-found' });
    }
  });

  it('gives the file back byte for byte', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const text = '\uFEFFitem;measurand;result\r\nM1;AFT;8,4\r\n';
    const { receiptCode } = await send(open, 0, text);
    const file = await getOwnFile(open.round, at(open, 0).laboratoryId, receiptCode);
    expect(Buffer.from(file.bytes).equals(Buffer.from(text, 'utf8'))).toBe(true);
    expect(file.fileName).toBe('results.csv');
  });

  it('never hands out a file with the whole round, which holds the results of others', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 2, {
      isPast: true,
      opensAt: inDays(-30),
      dispatchAt: inDays(-30),
      closesAt: inDays(-10),
      publishAt: inDays(-1),
    });
    const text = 'laboratory,item,measurand,result\nMill 1,M1,AFT,8.4\nMill 2,M1,AFT,9.1\n';
    await loadWholeRound(open.coordinator, open.round, fileOf(text));
    const rows: { receipt_code: string }[] = await db('submissions').select('receipt_code');
    expect(rows).toHaveLength(2);
    for (const { receipt_code: code } of rows) {
      for (const laboratoryId of open.laboratoryIds) {
        await expect(getOwnFile(open.round, laboratoryId, code)).rejects.toMatchObject({ code: 'not-found' });
      }
    }
  });
});

describe('checking a code in public', () => {
  it('tells round, time and SHA-256, and neither the laboratory nor a result', async () => {
    const db = await testDatabase();
    const open = await openWithManagers(db, 1);
    const receipt = await send(open, 0, csvOf('8.4'));
    const found = await findReceiptByCode(receipt.receiptCode.toLowerCase().replaceAll('-', ' '));
    expect(found).toEqual({
      receiptCode: receipt.receiptCode,
      roundName: 'Maize 1',
      schemeName: 'Mycotoxins',
      submittedAt: receipt.submittedAt,
      sha256: receipt.sha256,
      replacedAt: null,
    });
    const amended = await send(open, 0, csvOf('8.5'));
    expect(await findReceiptByCode(receipt.receiptCode)).toMatchObject({ replacedAt: amended.submittedAt });
  });

  it('reads a code as people type it and refuses what cannot be one', () => {
    expect(normaliseReceiptCode(' 7qk2-oxnb-4trm ')).toBe('7QK2-0XNB-4TRM');
    expect(normaliseReceiptCode('7QK2 0XNB 4TRI')).toBe('7QK2-0XNB-4TR1');
    expect(normaliseReceiptCode('7QK2\u20130XNB\u20134TRM')).toBe('7QK2-0XNB-4TRM');
    for (const text of ['', '7QK2-0XNB', '7QK2-0XNB-4TRU', "7QK2-0XNB-4TR'", '7QK2-0XNB-4TRM1']) {
      expect(normaliseReceiptCode(text)).toBeNull();
    }
  });

  it('knows nothing of a code that was never given', async () => {
    await testDatabase();
    expect(await findReceiptByCode('7QK2-0XNB-4TRM')).toBeNull();
    expect(await findReceiptByCode('<script>')).toBeNull();
  });
});
