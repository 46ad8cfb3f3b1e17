import type { Knex } from 'knex';
import { beforeEach, describe, expect, it } from 'vitest';
import { addAuditEntry } from '@/db/audit-store';
import { createLaboratory } from '@/db/laboratory-store';
import { addMembership } from '@/db/membership-store';
import { addMail } from '@/db/outbox-store';
import { createUser } from '@/db/user-store';
import { listEnrolmentsOfLaboratory, listLaboratoryLines } from '@/db/views/laboratories-view';
import { listLog } from '@/db/views/log-view';
import { listMail } from '@/db/views/mail-view';
import { findPerson, listPeople } from '@/db/views/people-view';
import { testDatabase } from '../test-database';

let db: Knex;
beforeEach(async () => {
  db = await testDatabase();
});

async function addUsers(count: number): Promise<void> {
  for (let index = 1; index <= count; index += 1) {
    const number = String(index).padStart(3, '0');
    await createUser(db, { email: `p${number}@basin.example`, name: `Person ${number}` });
  }
}

describe('the list of people', () => {
  it('comes in pages of fifty, and a page past the end is the last', async () => {
    await addUsers(120);
    const first = await listPeople(db, { text: '', page: 1 });
    expect([first.rows.length, first.total, first.page, first.pageCount]).toEqual([50, 120, 1, 3]);
    const last = await listPeople(db, { text: '', page: 99 });
    expect([last.rows.length, last.page, last.rows[0]?.name]).toEqual([20, 3, 'Person 101']);
    expect((await listPeople(db, { text: '', page: -1 })).page).toBe(1);
  });

  it('finds text in any case and takes wildcards as letters', async () => {
    await createUser(db, { email: 'ada_brook@basin.example', name: 'Ada 100% Brook' });
    await createUser(db, { email: 'bo@basin.example', name: "Bo O'Hara \\ Sons" });
    const names = async (text: string) =>
      (await listPeople(db, { text, page: 1 })).rows.map(({ name }) => name);
    expect(await names('BROOK')).toEqual(['Ada 100% Brook']);
    expect(await names('100%')).toEqual(['Ada 100% Brook']);
    expect(await names('a_b')).toEqual(['Ada 100% Brook']);
    expect(await names('%')).toEqual(['Ada 100% Brook']);
    expect(await names("o'h")).toEqual(["Bo O'Hara \\ Sons"]);
    expect(await names('\\')).toEqual(["Bo O'Hara \\ Sons"]);
    expect(await names("'; drop table users; --")).toEqual([]);
  });

  it('shows every role with its place', async () => {
    const userId = await createUser(db, { email: 'ada@basin.example', name: 'Ada' });
    const mill = await createLaboratory(db, { name: 'Mill' });
    await addMembership(db, { userId, laboratoryId: mill, role: 'analyst' });
    await addMembership(db, { userId, laboratoryId: null, role: 'reviewer' });
    expect(await findPerson(db, userId)).toEqual({
      id: userId,
      name: 'Ada',
      email: 'ada@basin.example',
      isDisabled: false,
      hasPassword: false,
      memberships: [
        { role: 'reviewer', laboratoryId: null, laboratoryName: null },
        { role: 'analyst', laboratoryId: mill, laboratoryName: 'Mill' },
      ],
    });
    expect(await findPerson(db, 99)).toBeNull();
  });
});

describe('the log', () => {
  it('is newest first and is searched in every column', async () => {
    const userId = await createUser(db, { email: 'ada@basin.example', name: 'Ada Brook' });
    const laboratoryId = await createLaboratory(db, { name: 'Lower Mill' });
    await addAuditEntry(db, { userId, action: 'sign-in' });
    await addAuditEntry(db, { laboratoryId, action: 'token.created', detail: 'LIMS' });
    await addAuditEntry(db, { userId, action: 'round:view', outcome: 'refused' });
    const actions = async (text: string) =>
      (await listLog(db, { text, page: 1 })).rows.map(({ action }) => action);
    expect(await actions('')).toEqual(['round:view', 'token.created', 'sign-in']);
    expect(await actions('brook')).toEqual(['round:view', 'sign-in']);
    expect(await actions('lower mill')).toEqual(['token.created']);
    expect(await actions('lims')).toEqual(['token.created']);
    expect(await actions('refused')).toEqual(['round:view']);
    expect((await listLog(db, { text: 'nothing', page: 1 })).total).toBe(0);
  });
});

describe('the list of mail', () => {
  it('is newest first and holds no text', async () => {
    for (const name of ['a', 'b']) {
      await addMail(db, {
        dedupeKey: name,
        to: `${name}@x.example`,
        subject: `To ${name}`,
        body: 'a secret link',
      });
    }
    const { rows } = await listMail(db, { text: '', page: 1 });
    expect(rows.map(({ subject }) => subject)).toEqual(['To b', 'To a']);
    expect(JSON.stringify(rows)).not.toContain('secret');
    expect((await listMail(db, { text: 'A@x', page: 1 })).total).toBe(1);
    expect((await listMail(db, { text: 'waiting', page: 1 })).total).toBe(2);
  });
});

describe('laboratories', () => {
  async function addRound(slug: string, closesAt: string): Promise<number> {
    const [scheme] = await db('schemes').insert({ slug: `s-${slug}`, name: slug, created_at: closesAt });
    const [round] = await db('rounds').insert({
      slug,
      scheme_id: scheme,
      name: `Round ${slug}`,
      state: 'open',
      opens_at: '2026-01-01',
      dispatch_at: '2026-01-01',
      closes_at: closesAt,
      publish_at: closesAt,
      created_at: closesAt,
    });
    return round ?? 0;
  }

  it('are listed with their people and the rounds they take part in', async () => {
    const mill = await createLaboratory(db, { name: 'Mill', town: 'Ford' });
    await createLaboratory(db, { name: 'Dairy' });
    const userId = await createUser(db, { email: 'ada@basin.example', name: 'Ada' });
    await addMembership(db, { userId, laboratoryId: mill, role: 'analyst' });
    await addMembership(db, { userId, laboratoryId: mill, role: 'lab_manager' });
    const early = await addRound('early', '2026-02-01');
    const late = await addRound('late', '2026-05-01');
    const enrolment = { laboratory_id: mill, created_at: '2026-01-01' };
    await db('enrolments').insert({
      ...enrolment,
      round_id: early,
      participant_code: 'A1',
      state: 'enrolled',
    });
    await db('enrolments').insert({
      ...enrolment,
      round_id: late,
      participant_code: 'B2',
      state: 'declined',
    });
    const { rows } = await listLaboratoryLines(db, { text: '', page: 1 });
    expect(rows.map(({ name, peopleCount, roundCount }) => [name, peopleCount, roundCount])).toEqual([
      ['Dairy', 0, 0],
      ['Mill', 1, 1],
    ]);
    expect((await listLaboratoryLines(db, { text: 'ford', page: 1 })).total).toBe(1);
    const enrolments = await listEnrolmentsOfLaboratory(db, mill);
    expect(enrolments).toMatchObject([
      { roundSlug: 'late', state: 'declined', hasSubmitted: false },
      { roundSlug: 'early', state: 'enrolled', hasSubmitted: false },
    ]);
    expect(JSON.stringify(enrolments)).not.toMatch(/A1|B2/);
  });
});
