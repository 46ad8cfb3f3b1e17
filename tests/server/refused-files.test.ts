import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { createClient } from './client';
import { makeOpenRound, type FixtureRound } from './round-fixture';
import { closeServerDatabase, countStored, openServerDatabase } from './server-database';

const HEADER = 'item,measurand,replicate,result\n';
const PNG = Buffer.concat([
  Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
  Buffer.alloc(2_000, 7),
]);

function manyRows(count: number): string {
  return HEADER + 'M1,AFT,1,12.5\n'.repeat(count);
}

interface Case {
  name: string;
  bytes: string | Uint8Array;
  status: number;
  says: RegExp;
}

const CASES: Case[] = [
  { name: 'an empty file', bytes: '', status: 422, says: /empty/i },
  { name: 'a header and nothing else', bytes: HEADER, status: 422, says: /no (row|result)/i },
  { name: 'a PNG named .csv', bytes: PNG, status: 415, says: /PNG/ },
  { name: '50 MB', bytes: Buffer.alloc(50_000_000, 'a'), status: 413, says: /larger than|MB/ },
  { name: '200,000 rows', bytes: manyRows(200_000), status: 413, says: /100,000|100 000/ },
  {
    name: 'a decimal point in one row and a comma in another',
    bytes: 'item;measurand;result\nM1;AFT;12.5\nM2;AFT;12,5\n',
    status: 422,
    says: /decimal/i,
  },
  {
    name: 'the same row twice',
    bytes: `${HEADER}M1,AFT,1,12.5\nM1,AFT,1,12.6\n`,
    status: 422,
    says: /[Ll]ine 3.*line 2/s,
  },
  { name: 'an unknown item', bytes: `${HEADER}M9,AFT,1,12.5\n`, status: 422, says: /M9.*M1/s },
  { name: 'a formula', bytes: `${HEADER}M1,AFT,1,=SUM(A1:A3)\n`, status: 422, says: /formula/i },
  { name: 'a NUL byte in a number', bytes: `${HEADER}M1,AFT,1,12\u0000.5\n`, status: 422, says: /NUL/ },
  { name: 'NaN', bytes: `${HEADER}M1,AFT,1,NaN\n`, status: 422, says: /NaN/ },
  { name: 'a number beyond all bounds', bytes: `${HEADER}M1,AFT,1,1e999\n`, status: 422, says: /1e999/ },
  { name: 'a missing column', bytes: 'item,result\nM1,12.5\n', status: 422, says: /measurand/ },
];

let connection: Knex;
let round: FixtureRound;

beforeAll(async () => {
  connection = openServerDatabase(inject('dataDir'));
  round = await makeOpenRound(connection, 1);
});
afterAll(() => closeServerDatabase(connection));

describe('a file that cannot be taken is refused in words, and nothing is stored but the log', () => {
  test.each(CASES)('$name', async ({ bytes, status, says }) => {
    const client = createClient({ token: round.laboratories[0]?.token });
    for (const query of ['?check=1', '']) {
      const before = await countStored(connection);
      const response = await client.upload(`/api/rounds/${round.slug}/results${query}`, bytes);
      const text = await response.text();
      expect(response.status, text).toBe(status);
      expect(response.headers.get('content-type')).toBe('application/problem+json');
      const problem = JSON.parse(text) as { detail: string; status: number };
      expect(problem.status).toBe(status);
      expect(problem.detail).toMatch(says);
      expect(await countStored(connection)).toEqual(before);
    }
  });

  test('content of another type is named', async () => {
    const client = createClient({ token: round.laboratories[0]?.token });
    const response = await client.upload(`/api/rounds/${round.slug}/results`, '{}', {
      type: 'application/json',
    });
    expect(response.status).toBe(415);
    expect(await response.text()).toMatch(/application\/json.*text\/csv/);
  });

  test('a multipart body without a file says which field is missing', async () => {
    const client = createClient({ token: round.laboratories[0]?.token });
    const form = new FormData();
    form.set('other', 'x');
    const response = await client.request(`/api/rounds/${round.slug}/results`, {
      method: 'POST',
      body: form,
    });
    expect(response.status).toBe(422);
    expect(await response.text()).toMatch(/field file/);
  });
});
