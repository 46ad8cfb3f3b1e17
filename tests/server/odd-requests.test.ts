import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { createClient, signIn, type Client } from './client';
import { makePerson } from './person-fixture';
import { makeOpenRound, type FixtureLaboratory, type FixtureRound } from './round-fixture';
import { closeServerDatabase, openServerDatabase } from './server-database';

const FILE = 'item,measurand,result\nM1,AFT,12.5\n';

let connection: Knex;
let round: FixtureRound;
let own: FixtureLaboratory;
let closed: string;
let staff: Client;
let manager: Client;

beforeAll(async () => {
  connection = openServerDatabase(inject('dataDir'));
  round = await makeOpenRound(connection, 1);
  [own] = round.laboratories as [FixtureLaboratory];
  // Of the demonstration: under review, so that there is something to review.
  closed = (await connection('rounds').where({ state: 'closed' }).first('slug')).slug;
  const person = await makePerson(connection, 'lab_manager', own.id);
  manager = await signIn(person.email, person.password);
  const coordinator = await makePerson(connection, 'coordinator');
  await connection('memberships').insert(
    ['administrator', 'reviewer'].map((role) => ({
      user_id: coordinator.id,
      laboratory_id: null,
      role,
      created_at: new Date().toISOString(),
    })),
  );
  staff = await signIn(coordinator.email, coordinator.password);
});
afterAll(() => closeServerDatabase(connection));

const ODD_IDS = ['NaN', '-1', '0', '1.5', '1e20', '99999999999999999999', '..%2F..%2Fetc', '%00', '[object]'];

async function statusOf(client: Client, path: string): Promise<number> {
  const response = await client.get(path);
  await response.arrayBuffer();
  return response.status;
}

describe('ids that nothing has', () => {
  test.each(ODD_IDS)('%s is not found, or refused, and never a fault', async (id) => {
    const asked: [Client, string][] = [
      [staff, `/rounds/${id}`],
      [staff, `/rounds/${id}/log`],
      [staff, `/rounds/${closed}/review/${id}`],
      [staff, `/schemes/${id}`],
      [staff, `/laboratories/${id}`],
      [staff, `/admin/people/${id}`],
      [staff, `/admin/mail/${id}`],
      [staff, `/api/rounds/${id}/progress`],
      [staff, `/api/rounds/${id}/evaluation`],
      [staff, `/api/rounds/${id}/template?whole=1`],
      [manager, `/laboratory/rounds/${id}`],
      [manager, `/laboratory/rounds/${round.slug}/scores/${id}`],
      [manager, `/laboratory/rounds/${round.slug}/receipts/${id}`],
      [manager, `/laboratory/rounds/${round.slug}/receipts/${id}/file`],
      [manager, `/laboratory/trend?measurand=${id}`],
      [manager, `/api/rounds/${round.slug}/template?laboratory=${id}`],
      [createClient(), `/check/${id}`],
      [createClient(), `/welcome/${id}`],
      [createClient(), `/reset/${id}`],
    ];
    const faults: string[] = [];
    for (const [client, path] of asked) {
      const status = await statusOf(client, path);
      if (status >= 500) faults.push(`${status} ${path}`);
      const isList = /\/(check|welcome|reset)\//.test(path);
      if (!isList && ![400, 403, 404].includes(status)) faults.push(`${status} ${path}`);
    }
    expect(faults).toEqual([]);
  });

  test.each(['NaN', '-1', '1e20', '0', 'x'.repeat(5_000), '%00', '99999999'])(
    'a list asked for page or line %s is shown',
    async (odd) => {
      for (const path of ['/admin/log', '/admin/mail', '/admin/people', '/laboratories']) {
        expect(await statusOf(staff, `${path}?page=${odd}&q=${odd}%25_%5C'`), path).toBe(200);
      }
      expect(await statusOf(staff, `/rounds/${round.slug}/log?before=${odd}`)).toBe(200);
      expect(await statusOf(staff, `/rounds/${round.slug}/results?measurand=${odd}`)).toBe(200);
      expect(await statusOf(staff, `/rounds?page=${odd}&page=2&q[]=1`)).toBe(200);
    },
  );
});

describe('names of files', () => {
  test('are given back whole, and cannot add a header', async () => {
    const client = createClient({ token: own.token });
    const name = 'a"; filename="b.html\r\nSet-Cookie: x=1\r\n\u00e4\u202e\u{1F33D}.csv';
    const path = `/api/rounds/${round.slug}/results?name=${encodeURIComponent(name)}`;
    const sent = await client.upload(path, FILE);
    expect(sent.status).toBe(201);
    const { receipt } = (await sent.json()) as { receipt: string };
    const file = await manager.get(`/laboratory/rounds/${round.slug}/receipts/${receipt}/file`);
    expect(file.status).toBe(200);
    expect(file.headers.get('set-cookie')).toBeNull();
    const disposition = file.headers.get('content-disposition') ?? '';
    expect(disposition).toMatch(/^attachment; filename="[\w.-]+"; filename\*=UTF-8''[\w.%~!-]+$/);
    expect(decodeURIComponent(disposition.split("''")[1] ?? '')).toContain('\u{1F33D}.csv');
    expect(await statusOf(manager, `/laboratory/rounds/${round.slug}/receipts/${receipt}`)).toBe(200);
  });

  test('that are cut within a character do no harm', async () => {
    const client = createClient({ token: own.token });
    const name = `${'x'.repeat(199)}\u{1F33D}.csv`;
    const sent = await client.upload(
      `/api/rounds/${round.slug}/results?name=${encodeURIComponent(name)}`,
      FILE.replace('12.5', '12.6'),
    );
    const { receipt } = (await sent.json()) as { receipt: string };
    expect(await statusOf(manager, `/laboratory/rounds/${round.slug}/receipts/${receipt}/file`)).toBe(200);
  });
});

describe('bodies that are none', () => {
  test('of the sign-in route are refused and kept nowhere', async () => {
    const client = createClient();
    const { csrfToken } = (await (await client.get('/api/auth/csrf')).json()) as { csrfToken: string };
    const before = await connection('sign_in_attempts').select('id');
    const long = new URLSearchParams({
      csrfToken,
      email: `${'x'.repeat(200_000)}@y.example`,
      password: 'x',
      json: 'true',
    });
    expect((await client.post('/api/auth/callback/credentials', long)).status).toBe(413);
    expect(await connection('sign_in_attempts').select('id')).toEqual(before);
    for (const [body, type] of [
      ['{', 'application/json'],
      ['[]', 'application/json'],
      ['null', 'application/json'],
      ['x', 'multipart/form-data'],
      ['', 'text/plain'],
    ] as const) {
      const response = await client.post('/api/auth/callback/credentials', body, { 'content-type': type });
      await response.arrayBuffer();
      expect(response.status, `${type} ${body}`).toBeLessThan(500);
    }
    const short = new URLSearchParams({
      csrfToken,
      email: `${'x'.repeat(300)}@y.example`,
      password: 'x',
      json: 'true',
    });
    expect((await client.post('/api/auth/callback/credentials', short)).status).toBe(401);
    expect(await connection('sign_in_attempts').select('id')).toEqual(before);
  });

  test('of an upload are refused', async () => {
    const client = createClient({ token: own.token });
    for (const type of [
      'multipart/form-data',
      'multipart/form-data; boundary=x',
      'application/json',
      'a/b/c;;;',
    ]) {
      const response = await client.upload(`/api/rounds/${round.slug}/results`, '{"a":1}', { type });
      expect([415, 422], `${type}: ${response.status}`).toContain(response.status);
    }
  });
});
