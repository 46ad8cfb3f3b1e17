import { expect, it } from 'vitest';
import { addAuditEntry } from '@/db/audit-store';
import { inTransaction } from '@/db/transaction';
import { testDatabase } from './test-database';

// SQLite answers a limit on its pages with the error of a full disk (documentation of PRAGMA max_page_count).
it('undoes the whole of a change that no longer fits on the disk, and works again once there is room', async () => {
  const db = await testDatabase();
  const pages: { page_count: number }[] = await db.raw('pragma page_count');
  const used = pages[0]?.page_count ?? 0;
  const write = (detail: string) =>
    inTransaction(db, async (trx) => {
      for (let line = 0; line < 200; line += 1) await addAuditEntry(trx, { action: 'test', detail });
    });
  await db.raw(`pragma max_page_count = ${used + 4}`);
  await expect(write('x'.repeat(900))).rejects.toMatchObject({ code: 'SQLITE_FULL' });
  expect(await db('audit_log').select('id')).toEqual([]);
  await db.raw(`pragma max_page_count = ${used + 1000}`);
  await write('y');
  expect(await db('audit_log').select('id')).toHaveLength(200);
});

it('gives the connection back after a failed commit or a failure in the middle', async () => {
  const db = await testDatabase();
  for (let round = 0; round < 3; round += 1) {
    const failing = inTransaction(db, async (trx) => {
      await addAuditEntry(trx, { action: 'test' });
      throw new Error('in the middle');
    });
    await expect(failing).rejects.toThrow('in the middle');
  }
  expect(await db('audit_log').select('id')).toEqual([]);
});
