import type { Knex } from 'knex';
import { beforeEach, describe, expect, it } from 'vitest';
import { addAuditEntry } from '@/db/audit-store';
import {
  createLaboratory,
  findLaboratoryByName,
  listLaboratories,
  listLaboratoryNames,
} from '@/db/laboratory-store';
import { addMembership, countOtherHolders, removeMembership } from '@/db/membership-store';
import { addMail, claimMail } from '@/db/outbox-store';
import { removeSessionsExpiredBefore } from '@/db/session-store';
import { findSetting, setSetting } from '@/db/settings-store';
import { inTransaction } from '@/db/transaction';
import { createUser, findPasswordHash, findUser, findUserByEmail } from '@/db/user-store';
import { testDatabase } from '../test-database';

let db: Knex;
beforeEach(async () => {
  db = await testDatabase();
});

describe('users', () => {
  it('are found by e-mail whatever its capitals, and never with the hash', async () => {
    const id = await createUser(db, { email: 'Ada@Basin.Example', name: 'Ada', passwordHash: 'hash' });
    expect(await findUserByEmail(db, 'ADA@basin.example')).toEqual({
      id,
      email: 'ada@basin.example',
      name: 'Ada',
      isDisabled: false,
      hasPassword: true,
      createdAt: expect.stringMatching(/^\d{4}-.*Z$/),
    });
    expect(await findPasswordHash(db, id)).toBe('hash');
    expect(
      (await findUser(db, await createUser(db, { email: 'b@x.example', name: 'Bo' })))?.hasPassword,
    ).toBe(false);
    expect(await findUser(db, 99)).toBeNull();
    expect(await findPasswordHash(db, 99)).toBeNull();
  });

  it('have one account an address', async () => {
    await createUser(db, { email: 'ada@basin.example', name: 'Ada' });
    await expect(createUser(db, { email: 'ADA@basin.example', name: 'Ada' })).rejects.toThrow(/UNIQUE/);
    await expect(
      db('users').insert({ email: 'Upper@x.example', name: 'U', created_at: 'now' }),
    ).rejects.toThrow(/users_email_lower/);
  });
});

describe('memberships', () => {
  it('are held once, also at the provider, where no laboratory tells two rows apart', async () => {
    const userId = await createUser(db, { email: 'ada@basin.example', name: 'Ada' });
    const role = { userId, laboratoryId: null, role: 'reviewer' } as const;
    expect(await addMembership(db, role)).toBe(true);
    expect(await addMembership(db, role)).toBe(false);
    expect(await db('memberships').select()).toHaveLength(1);
    expect(await removeMembership(db, role)).toBe(true);
    expect(await removeMembership(db, role)).toBe(false);
  });

  it('put a role only where it belongs', async () => {
    const userId = await createUser(db, { email: 'ada@basin.example', name: 'Ada' });
    const laboratoryId = await createLaboratory(db, { name: 'Mill' });
    await expect(addMembership(db, { userId, laboratoryId, role: 'reviewer' })).rejects.toThrow(/CHECK/);
    await expect(addMembership(db, { userId, laboratoryId: null, role: 'analyst' })).rejects.toThrow(/CHECK/);
    await expect(addMembership(db, { userId, laboratoryId: 99, role: 'analyst' })).rejects.toThrow(
      /FOREIGN KEY/,
    );
  });

  it('count the others who can sign in', async () => {
    const count = (exceptUserId: number) =>
      countOtherHolders(db, { role: 'administrator', laboratoryId: null, exceptUserId });
    const ada = await createUser(db, { email: 'ada@basin.example', name: 'Ada', passwordHash: 'hash' });
    const bo = await createUser(db, { email: 'bo@basin.example', name: 'Bo' });
    for (const userId of [ada, bo])
      await addMembership(db, { userId, laboratoryId: null, role: 'administrator' });
    expect(await count(ada)).toBe(0);
    expect(await count(bo)).toBe(1);
  });
});

describe('laboratories', () => {
  it('take the defaults of the table and are listed by name', async () => {
    const mill = await createLaboratory(db, { name: 'mill' });
    const dairy = await createLaboratory(db, {
      name: 'Dairy',
      kind: 'dairy',
      town: 'Ford',
      contactEmail: 'd@x.example',
    });
    expect(await listLaboratories(db)).toMatchObject([
      { id: dairy, kind: 'dairy', town: 'Ford', contactEmail: 'd@x.example', isActive: true },
      { id: mill, kind: 'other', town: '', contactEmail: null, isActive: true },
    ]);
    expect(await listLaboratoryNames(db)).toEqual([
      { id: mill, name: 'mill' },
      { id: dairy, name: 'Dairy' },
    ]);
    expect((await findLaboratoryByName(db, 'MILL'))?.id).toBe(mill);
    expect(await findLaboratoryByName(db, 'mil')).toBeNull();
  });
});

describe('the outbox', () => {
  const mail = { dedupeKey: 'k', to: 'a@x.example', subject: 's', body: 'b' };

  it('keeps a key once', async () => {
    await addMail(db, mail);
    await addMail(db, { ...mail, subject: 'another' });
    expect(await db('outbox').pluck('subject')).toEqual(['s']);
  });

  it('gives each mail to one claimant until the lease is over', async () => {
    await addMail(db, mail);
    const now = new Date(Date.now() + 1_000).toISOString();
    const leaseUntil = new Date(Date.now() + 60_000).toISOString();
    expect(await claimMail(db, { now, leaseUntil })).toMatchObject({ attempts: 1, subject: 's' });
    expect(await claimMail(db, { now, leaseUntil })).toBeNull();
    expect(await claimMail(db, { now: leaseUntil, leaseUntil })).toMatchObject({ attempts: 2 });
  });
});

describe('settings', () => {
  it('are written over', async () => {
    expect(await findSetting(db, 'k')).toBeNull();
    await setSetting(db, 'k', 'one');
    await setSetting(db, 'k', 'two');
    expect(await findSetting(db, 'k')).toBe('two');
  });
});

describe('sessions', () => {
  it('go once they are long expired', async () => {
    const userId = await createUser(db, { email: 'ada@basin.example', name: 'Ada' });
    const row = { user_id: userId, created_at: '2026-01-01' };
    await db('sessions').insert({ ...row, id: 'old', expires_at: '2026-01-01T00:00:00.000Z' });
    await db('sessions').insert({ ...row, id: 'new', expires_at: '2026-03-01T00:00:00.000Z' });
    await removeSessionsExpiredBefore(db, '2026-02-01T00:00:00.000Z');
    expect(await db('sessions').pluck('id')).toEqual(['new']);
  });
});

describe('the log', () => {
  it('is written once', async () => {
    await addAuditEntry(db, { action: 'sign-in', detail: 'x'.repeat(2_000) });
    expect((await db('audit_log').first()).detail).toHaveLength(1_000);
    await expect(db('audit_log').update({ detail: '' })).rejects.toThrow(/written once: no update/);
    await expect(db('audit_log').delete()).rejects.toThrow(/written once: no delete/);
  });

  it('stands or falls with what it tells of', async () => {
    const work = inTransaction(db, async (trx) => {
      await addAuditEntry(trx, { action: 'sign-in' });
      await inTransaction(trx, async (inner) => addAuditEntry(inner, { action: 'joined' }));
      throw new Error('the work failed');
    });
    await expect(work).rejects.toThrow('the work failed');
    expect(await db('audit_log').select()).toEqual([]);
  });
});
