import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import { beforeAll, describe, expect, test } from 'vitest';
import { findActorByToken } from '@/db/views/actor-view';
import { findPasswordHash, findUserByEmail } from '@/db/user-store';
import { passwordComplaint } from '@/lib/schemas/sign-in';
import { isPassword } from '@/lib/services/password-hash';
import { hashToken } from '@/lib/token-hash';
import { seedDemonstration } from '@/seeds/seed-demonstration';
import type { DemoSummary } from '@/seeds/summary';
import { testDatabase } from '../db/test-database';

const NOW = new Date('2026-12-01T10:00:00Z');
const YEAR_MS = 365 * 86_400_000;

let connection: Knex;
let summary: DemoSummary;

beforeAll(async () => {
  connection = await testDatabase({ for: 'file' });
  summary = await seedDemonstration(connection, { now: NOW });
}, 120_000);

interface RoundRow {
  id: number;
  slug: string;
  state: string;
  opens_at: string;
  closes_at: string;
  published_at: string | null;
}

async function roundsIn(state: string): Promise<RoundRow[]> {
  return connection('rounds').where({ state }).orderBy('closes_at');
}

async function countSent(roundId: number): Promise<{ enrolled: number; sent: number }> {
  return connection('enrolments')
    .leftJoin('submissions', (join) => {
      join.on('submissions.enrolment_id', 'enrolments.id').andOnVal('submissions.state', 'submitted');
    })
    .where({ 'enrolments.round_id': roundId, 'enrolments.state': 'enrolled' })
    .first(connection.raw('count(enrolments.id) as enrolled, count(submissions.id) as sent'));
}

describe('rounds', () => {
  test('a dozen published rounds reach back three years', async () => {
    const published = await roundsIn('published');
    expect(published).toHaveLength(12);
    const first = published[0]?.published_at ?? '';
    expect(NOW.getTime() - Date.parse(first)).toBeGreaterThan(3 * YEAR_MS);
  });

  test('one round is open, one closed, one evaluated and one a draft', async () => {
    const [open, ...moreOpen] = await roundsIn('open');
    expect(moreOpen).toEqual([]);
    expect(open?.slug).toBe(summary.openRound);
    expect(open?.opens_at.slice(0, 10)).toBe('2026-11-24');
    expect(open?.closes_at.slice(0, 10)).toBe('2026-12-11');
    const { enrolled, sent } = await countSent(open?.id ?? 0);
    expect(sent / enrolled).toBeGreaterThan(0.55);
    expect(sent / enrolled).toBeLessThan(0.78);

    const closed = await roundsIn('closed');
    expect(closed.map(({ closes_at }) => closes_at.slice(0, 10))).toEqual(['2026-11-29']);
    expect(await roundsIn('evaluated')).toHaveLength(1);
    expect(await roundsIn('draft')).toHaveLength(1);
  });

  test('every step is in the log with its person and in order, and a second person signed', async () => {
    for (const { id } of await roundsIn('published')) {
      const log = await connection('audit_log').where({ round_id: id }).orderBy('id');
      const steps = log.filter(({ action }) => /^(round|evaluation)\./.test(action));
      expect(steps.map(({ action }) => action)).toEqual([
        'round.created',
        'round.opened',
        'round.closed',
        'round.evaluated',
        'evaluation.signed',
        'round.published',
      ]);
      const times = log.map(({ at }) => at);
      expect([...times].sort()).toEqual(times);
      const [evaluation] = await connection('evaluations').where({ round_id: id });
      const [signOff] = await connection('sign_offs').where({ evaluation_id: evaluation.id });
      expect(signOff.user_id).not.toBe(evaluation.created_by);
      expect(
        await connection('memberships').where({ user_id: signOff.user_id, role: 'reviewer' }),
      ).toHaveLength(1);
    }
    const [waiting] = await roundsIn('evaluated');
    const [evaluation] = await connection('evaluations').where({ round_id: waiting?.id });
    expect(await connection('sign_offs').where({ evaluation_id: evaluation.id })).toEqual([]);
  });

  test('plans vary: stated values, replicates, other scores and rules', async () => {
    const plans = await connection('round_measurands').select();
    expect(plans.some((plan) => plan.assigned_method === 'stated' && plan.stated_uncertainty > 0)).toBe(true);
    expect(plans.some((plan) => plan.replicates === 2)).toBe(true);
    expect(plans.some((plan) => plan.score_kind === 'zeta')).toBe(true);
    expect(new Set(plans.map((plan) => plan.sigma_rule)).size).toBe(5);
  });

  test('nothing has happened after the day of seeding began', async () => {
    const today = NOW.toISOString().slice(0, 10);
    for (const [table, column] of [
      ['audit_log', 'at'],
      ['submissions', 'submitted_at'],
      ['uploads', 'created_at'],
      ['sign_offs', 'at'],
    ] as const) {
      expect(await connection(table).where(column, '>=', today)).toEqual([]);
    }
  });
});

describe('files', () => {
  test('each submission points to real CSV bytes under their SHA-256', async () => {
    const files = await connection('submissions')
      .join('uploads', 'uploads.id', 'submissions.upload_id')
      .select('uploads.sha256', 'uploads.bytes', 'uploads.byte_count', 'submissions.result_count');
    expect(files.length).toBeGreaterThan(400);
    for (const { sha256, bytes, byte_count, result_count } of files) {
      expect(createHash('sha256').update(bytes).digest('hex')).toBe(sha256);
      expect(bytes.length).toBe(byte_count);
      expect(String(bytes).trimEnd().split('\r\n')).toHaveLength(result_count + 1);
    }
    const texts = files.map(({ bytes }) => String(bytes));
    expect(texts.some((text) => text.includes(';') && /\d,\d/.test(text))).toBe(true);
    expect(texts.some((text) => text.startsWith('\uFEFF'))).toBe(true);
  });
});

describe('people and laboratories', () => {
  test('at least thirty laboratories of several kinds, whose addresses can reach no one', async () => {
    const laboratories = await connection('laboratories').select();
    expect(laboratories.length).toBeGreaterThanOrEqual(30);
    expect(new Set(laboratories.map(({ kind }) => kind)).size).toBeGreaterThanOrEqual(6);
    const users = await connection('users').select('email', 'name');
    for (const address of [
      ...users.map(({ email }) => email),
      ...laboratories.map((row) => row.contact_email),
    ]) {
      expect(address).toMatch(/@[a-z0-9-]+\.example$/);
    }
    expect(new Set(users.map(({ name }) => name)).size).toBe(users.length);
    expect(await connection('outbox').select()).toEqual([]);
  });

  test('schemes and rounds say that everything is invented and limits must be confirmed', async () => {
    for (const { description } of await connection('schemes')) {
      expect(description).toMatch(/every laboratory, every person and every figure are invented/);
    }
    for (const { instructions } of await connection('rounds')) expect(instructions).toContain('invented');
    for (const row of await connection('measurands')) {
      expect(row.decision_limit_source).toMatch(
        /^Example, from memory: .*20\d\d.*must confirm the limit that applies\.$/,
      );
      expect(row.decision_limit_source.length).toBeLessThanOrEqual(200);
    }
  });

  test('every sign-in works, with a password that the rules would take', async () => {
    const roles = summary.signIns.map(({ role }) => role);
    for (const [role, least] of [
      ['administrator', 1],
      ['coordinator', 2],
      ['reviewer', 2],
      ['lab_manager', 5],
      ['analyst', 5],
    ] as const) {
      expect(roles.filter((found) => found === role).length).toBeGreaterThanOrEqual(least);
    }
    for (const { role, name, email, password } of summary.signIns) {
      const user = await findUserByEmail(connection, email);
      expect(user?.name).toBe(name);
      expect(passwordComplaint(password, { name, email })).toBeNull();
      expect(await isPassword(await findPasswordHash(connection, user?.id ?? 0), password)).toBe(true);
      expect(await connection('memberships').where({ user_id: user?.id, role })).toHaveLength(1);
    }
  });

  test('one person works at two laboratories', async () => {
    const user = await findUserByEmail(connection, 'perpetua.lisle@lirrow-freelance.example');
    const held = await connection('memberships').where({ user_id: user?.id });
    expect(new Set(held.map(({ laboratory_id }) => laboratory_id)).size).toBe(2);
  });

  test('each token is in force and its laboratory has not sent what it is offered for', async () => {
    expect(summary.tokens.length).toBeGreaterThan(0);
    for (const { laboratory, round, item, measurand, token } of summary.tokens) {
      const actor = await findActorByToken(connection, hashToken(token));
      expect(actor?.memberships[0]?.laboratoryName).toBe(laboratory);
      const planned = await connection('round_measurands')
        .join('rounds', 'rounds.id', 'round_measurands.round_id')
        .join('test_items', 'test_items.id', 'round_measurands.test_item_id')
        .join('measurands', 'measurands.id', 'round_measurands.measurand_id')
        .where({ 'rounds.slug': round, 'test_items.code': item, 'measurands.code': measurand });
      expect(planned).toHaveLength(1);
      const sent = await connection('submissions')
        .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
        .join('rounds', 'rounds.id', 'submissions.round_id')
        .where({ 'rounds.slug': round, 'enrolments.laboratory_id': actor?.laboratoryId });
      expect(sent).toEqual([]);
    }
  });
});
