import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { createClient, signIn, type Client } from './client';
import { makePerson } from './person-fixture';
import { makeOpenRound, NOBODY, type FixtureLaboratory, type FixtureRound } from './round-fixture';
import { closeServerDatabase, countStored, openServerDatabase } from './server-database';
import { enrolLaboratories } from '@/lib/services/enrolments';
import { submitResultsFile } from '@/lib/services/submit-results';

const FILE = 'item,measurand,result\nM1,AFT,12.5\nM2,AFT,34.5\n';

let connection: Knex;
let round: FixtureRound;
let otherRound: FixtureRound;
let inside: FixtureLaboratory;
let stranger: FixtureLaboratory;
let receipt: string;
let strangerClients: [string, Client][];

beforeAll(async () => {
  connection = openServerDatabase(inject('dataDir'));
  round = await makeOpenRound(connection, 2);
  otherRound = await makeOpenRound(connection, 1);
  [inside] = round.laboratories as [FixtureLaboratory];
  [stranger] = otherRound.laboratories as [FixtureLaboratory];
  const actor = { ...NOBODY, laboratoryId: inside.id };
  const file = { bytes: Buffer.from(FILE), name: 'mine.csv' };
  const submitted = await submitResultsFile(actor, round.slug, inside.id, file);
  receipt = submitted.receipt?.receiptCode ?? '';
  const manager = await makePerson(connection, 'lab_manager', stranger.id);
  const analyst = await makePerson(connection, 'analyst', stranger.id);
  strangerClients = [
    ['a token of another laboratory', createClient({ token: stranger.token })],
    ['a manager of another laboratory', await signIn(manager.email, manager.password)],
    ['an analyst of another laboratory', await signIn(analyst.email, analyst.password)],
  ];
});
afterAll(() => closeServerDatabase(connection));

async function lastLogId(): Promise<number> {
  const row = await connection('audit_log').max<{ id: number | null }>('id as id').first();
  return row?.id ?? 0;
}

/** The answer is one of `statuses` and holds nothing of the round's participants. */
async function expectRefused(response: Response, statuses: number[]): Promise<void> {
  const text = await response.text();
  expect(statuses, `${response.status} ${response.url}`).toContain(response.status);
  const asked = decodeURIComponent(response.url);
  for (const secret of [inside.name, inside.participantCode, receipt, '12.5', '34.5']) {
    // A page that says what is missing may repeat the address it was asked for.
    if (asked.includes(secret)) continue;
    expect(text, `what ${response.url} answered`).not.toContain(secret);
  }
}

describe('who has no part in a round gets 403 or 404, a line in the log and no data', () => {
  const reads = () => [
    `/api/rounds/${round.slug}/evaluation`,
    `/api/rounds/${round.slug}/template`,
    `/api/rounds/${round.slug}/template?laboratory=${inside.id}`,
    `/api/rounds/${round.slug}/template?whole=1`,
    `/api/rounds/${round.slug}/progress`,
  ];
  const pages = () => [
    `/laboratory/rounds/${round.slug}`,
    `/laboratory/rounds/${round.slug}/receipts/${receipt}`,
    ...['', '/plan', '/participants', '/results', '/evaluation', '/report', '/log'].map(
      (page) => `/rounds/${round.slug}${page}`,
    ),
    `/laboratories/${inside.id}`,
    '/admin/people',
    '/admin/log',
    '/admin/mail',
  ];

  test('reading through the API', async () => {
    for (const [, client] of strangerClients) {
      for (const path of reads()) {
        const before = await lastLogId();
        await expectRefused(await client.get(path), [403, 404]);
        expect(await lastLogId(), `a line in the log for ${path}`).toBeGreaterThan(before);
      }
    }
  });

  test('pages', async () => {
    for (const [name, client] of strangerClients.slice(1)) {
      for (const path of pages()) {
        const response = await client.get(path);
        expect([403, 404], `${name}: ${path}`).toContain(response.status);
        await expectRefused(response, [403, 404]);
      }
    }
  });

  test('sending results to a round of others, or in the name of others', async () => {
    const before = await countStored(connection);
    for (const [, client] of strangerClients) {
      for (const path of [
        `/api/rounds/${round.slug}/results`,
        `/api/rounds/${round.slug}/results?check=1`,
        `/api/rounds/${round.slug}/results?laboratory=${inside.id}`,
        `/api/rounds/${otherRound.slug}/results?laboratory=${inside.id}`,
        `/api/rounds/no-such-round/results`,
        `/api/rounds/${round.slug}/whole-round`,
      ]) {
        const log = await lastLogId();
        await expectRefused(await client.upload(path, FILE), [403, 404]);
        expect(await lastLogId(), `a line in the log for ${path}`).toBeGreaterThan(log);
      }
    }
    expect(await countStored(connection)).toEqual(before);
  });

  test('a participant sees no evaluation before publication', async () => {
    const client = createClient({ token: inside.token });
    await expectRefused(await client.get(`/api/rounds/${round.slug}/evaluation`), [404]);
  });

  test('without signing in, and with a token that is not in force', async () => {
    for (const client of [createClient(), createClient({ token: 'assize_nothing' })]) {
      await expectRefused(await client.get(`/api/rounds/${round.slug}/evaluation`), [401]);
      await expectRefused(await client.upload(`/api/rounds/${round.slug}/results`, FILE), [401]);
    }
    const page = await createClient().get(`/rounds/${round.slug}`);
    expect(page.status).toBe(307);
    expect(page.headers.get('location')).toContain('/sign-in');
  });

  test('a form of another site cannot send results with a person’s cookie', async () => {
    const [, manager] = strangerClients[1] as [string, Client];
    const path = `/api/rounds/${otherRound.slug}/results`;
    const response = await manager.upload(path, FILE, { headers: { 'sec-fetch-site': 'cross-site' } });
    expect(response.status).toBe(403);
  });

  test('a laboratory that is invited but has not accepted sends nothing', async () => {
    await enrolLaboratories(NOBODY, round.slug, [stranger.id], 'invited');
    const client = createClient({ token: stranger.token });
    const response = await client.upload(`/api/rounds/${round.slug}/results`, FILE);
    expect(response.status).toBe(409);
    expect(await response.text()).toMatch(/invited/);
  });
});
