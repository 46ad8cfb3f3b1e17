import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { createClient } from './client';
import { makeOpenRound, type FixtureRound } from './round-fixture';
import { closeServerDatabase, openServerDatabase } from './server-database';

const LINES = [
  'item,measurand,result,expanded_uncertainty,comment',
  'M1,AFT,12.5,2.5,Überprüft',
  'M1,DON,0.85,0.2,',
  'M2,AFT,<2.0,,below our limit',
  'M2,DON,1.2,0.3,',
];
const COMMA = LINES.join('\r\n');
const SEMICOLON = LINES.map((line) => line.replaceAll(',', ';').replaceAll('.', ',')).join('\r\n');

function utf16(text: string, isBigEndian: boolean): Uint8Array {
  const bytes = Buffer.from(`\ufeff${text}`, 'utf16le');
  return isBigEndian ? bytes.swap16() : bytes;
}

const FILES: [string, Uint8Array][] = [
  ['UTF-8', Buffer.from(COMMA)],
  ['UTF-8 with a byte-order mark', Buffer.from(`\ufeff${COMMA}`)],
  ['UTF-16 little endian', utf16(COMMA, false)],
  ['UTF-16 big endian', utf16(COMMA, true)],
  ['Windows-1252', Buffer.from(COMMA, 'latin1')],
  ['semicolons and decimal commas', Buffer.from(SEMICOLON)],
  ['tabs', Buffer.from(COMMA.replaceAll(',', '\t'))],
  ['carriage returns only', Buffer.from(COMMA.replaceAll('\r\n', '\r'))],
];

let connection: Knex;
let round: FixtureRound;

beforeAll(async () => {
  connection = openServerDatabase(inject('dataDir'));
  round = await makeOpenRound(connection, FILES.length);
});
afterAll(() => closeServerDatabase(connection));

describe('good results in every guise are taken as the same numbers', () => {
  test.each(FILES.map(([name, bytes], index) => ({ name, bytes, index })))(
    '$name',
    async ({ bytes, index }) => {
      const laboratory = round.laboratories[index];
      if (!laboratory) throw new Error('too few laboratories');
      const client = createClient({ token: laboratory.token });
      const path = `/api/rounds/${round.slug}/results`;
      const check = await client.upload(`${path}?check=1`, bytes);
      expect(check.status, await check.clone().text()).toBe(200);
      const response = await client.upload(path, bytes, { asForm: true });
      expect(response.status, await response.clone().text()).toBe(201);
      const receipt = (await response.json()) as { receipt: string; sha256: string; resultCount: number };
      expect(receipt.resultCount).toBe(4);

      const rows = await connection('results')
        .join('submissions', 'submissions.id', 'results.submission_id')
        .where('submissions.receipt_code', receipt.receipt)
        .orderBy('results.line')
        .select('results.kind', 'results.value', 'results.expanded_uncertainty', 'results.comment');
      expect(rows.map((row) => [row.kind, row.value, row.expanded_uncertainty])).toEqual([
        ['value', 12.5, 2.5],
        ['value', 0.85, 0.2],
        ['below', 2, null],
        ['value', 1.2, 0.3],
      ]);
      expect(rows[0].comment).toBe('Überprüft');
      const kept = await connection('uploads').where({ sha256: receipt.sha256 }).first();
      expect(Buffer.compare(kept.bytes, Buffer.from(bytes))).toBe(0);

      const again = await client.upload(path, bytes);
      expect(again.status).toBe(200);
      expect(await again.json()).toMatchObject({ receipt: receipt.receipt, repeat: true });
    },
  );
});
