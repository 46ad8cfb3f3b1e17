import { execFile } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import { expect, test } from 'vitest';
import type { DemoSummary } from '@/seeds/summary';
import { testDatabase } from '../db/test-database';

const run = promisify(execFile);

async function seed(variables: Record<string, string> = {}) {
  const command = ['--import', 'tsx', '--conditions=react-server', 'seeds/run.ts'];
  const { stdout } = await run(process.execPath, command, { env: { ...process.env, ...variables } });
  const lines = stdout.trimEnd().split('\n');
  return JSON.parse(lines.at(-1) ?? '') as DemoSummary;
}

test('the command seeds once, keeps what it says for the owner alone, and says the same again', async () => {
  await testDatabase();
  const folder = process.env.ASSIZE_DATA_DIR ?? '';
  const first = await seed();
  expect(first.seeded).toBe(true);
  expect(first.openRound).toBe('cereals-round-8');
  const file = path.join(folder, 'demo.json');
  expect(fs.statSync(file).mode & 0o777).toBe(0o600);
  expect(JSON.parse(fs.readFileSync(file, 'utf8'))).toEqual(first);

  expect(await seed()).toEqual({ ...first, seeded: false });
  fs.rmSync(file);
  expect(await seed()).toEqual({ ...first, seeded: false });
  expect(fs.existsSync(file)).toBe(true);
}, 120_000);

test('a size that cannot be is refused with the sizes that can', async () => {
  await testDatabase();
  await expect(seed({ ASSIZE_DEMO_LABORATORIES: 'many' })).rejects.toMatchObject({
    stderr: expect.stringContaining('"many"; give a whole number from 33 to 333'),
  });
}, 60_000);
