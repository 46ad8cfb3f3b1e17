import { afterEach, expect, test } from 'vitest';
import { createClient } from './client';
import { makeOpenRound, type FixtureLaboratory } from './round-fixture';
import { closeServerDatabase, openServerDatabase } from './server-database';
import { startOtherServer, type OtherServer } from '../server-setup';

const LABORATORIES = 40;
const KILLS = 3;

let server: OtherServer | undefined;

afterEach(async () => {
  await server?.remove();
  server = undefined;
});

function fileOf(index: number, turn: number): string {
  const value = (10 + index + turn / 10).toFixed(1);
  return `item,measurand,result\nM1,AFT,${value}\nM2,AFT,${value}\n`;
}

/** Uploads until the server is gone; gives back the receipts that were acknowledged. */
async function uploadAll(baseUrl: string, slug: string, laboratories: FixtureLaboratory[], turn: number) {
  const receipts: string[] = [];
  const upload = async (laboratory: FixtureLaboratory, index: number) => {
    try {
      const client = createClient({ baseUrl, token: laboratory.token });
      const response = await client.upload(`/api/rounds/${slug}/results`, fileOf(index, turn));
      if (response.status !== 201) return;
      receipts.push(((await response.json()) as { receipt: string }).receipt);
    } catch {
      // The server was killed under this request: it acknowledged nothing.
    }
  };
  const queue = laboratories.map((laboratory, index) => ({ laboratory, index }));
  const worker = async () => {
    for (let next = queue.shift(); next; next = queue.shift()) await upload(next.laboratory, next.index);
  };
  await Promise.all([worker(), worker(), worker(), worker()]);
  return receipts;
}

test('whatever was acknowledged before the server was killed is there, and nothing is half stored', async () => {
  server = await startOtherServer({ data: 'empty', env: { ASSIZE_LOG_LEVEL: 'silent' } });
  const connection = openServerDatabase(server.dataDir);
  const round = await makeOpenRound(connection, LABORATORIES);
  await closeServerDatabase(connection);
  const acknowledged: string[] = [];
  for (let turn = 1; turn <= KILLS; turn += 1) {
    const uploads = uploadAll(server.baseUrl, round.slug, round.laboratories, turn);
    await new Promise((resolve) => setTimeout(resolve, 60 * turn));
    await server.kill();
    acknowledged.push(...(await uploads));
    server = await server.restart();
  }
  acknowledged.push(...(await uploadAll(server.baseUrl, round.slug, round.laboratories, KILLS + 1)));
  expect(acknowledged.length).toBeGreaterThanOrEqual(LABORATORIES);

  const after = openServerDatabase(server.dataDir);
  const kept = await after('submissions').select('receipt_code', 'id', 'result_count');
  expect(kept.map((row) => row.receipt_code)).toEqual(expect.arrayContaining(acknowledged));
  for (const { id, result_count: count } of kept) {
    const row = await after('results').where({ submission_id: id }).count<{ n: number }[]>('* as n').first();
    expect(row?.n).toBe(count);
  }
  const current = await after('submissions')
    .where({ state: 'submitted' })
    .count<{ n: number }[]>('* as n')
    .first();
  expect(current?.n).toBe(LABORATORIES);
  expect(await after.raw('pragma integrity_check')).toEqual([{ integrity_check: 'ok' }]);
  await closeServerDatabase(after);
});
