import { execFile } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { getSecrets } from '@/lib/secrets';

let folder: string;
let file: string;

beforeEach(() => {
  folder = path.join(fs.mkdtempSync(path.join(os.tmpdir(), 'assize-secrets-')), 'data');
  file = path.join(folder, 'secrets.json');
  vi.stubEnv('ASSIZE_DATA_DIR', folder);
});
afterEach(() => {
  vi.unstubAllEnvs();
  fs.rmSync(path.dirname(folder), { recursive: true });
});

it('makes a secret once, for its owner alone', () => {
  const { session } = getSecrets();
  expect(Buffer.from(session, 'base64url')).toHaveLength(32);
  expect(fs.statSync(file).mode & 0o777).toBe(0o600);
  expect(fs.statSync(folder).mode & 0o777).toBe(0o700);
  expect(getSecrets().session).toBe(session);
  expect(JSON.parse(fs.readFileSync(file, 'utf8'))).toEqual({ session });
  expect(fs.readdirSync(folder)).toEqual(['secrets.json']);
});

it('takes what is there', () => {
  fs.mkdirSync(folder);
  fs.writeFileSync(file, JSON.stringify({ session: 'k'.repeat(43) }));
  expect(getSecrets().session).toBe('k'.repeat(43));
});

it.each(['{}', '{"session":"short"}', 'null'])('refuses %s rather than making a new secret', (text) => {
  fs.mkdirSync(folder);
  fs.writeFileSync(file, text);
  expect(() => getSecrets()).toThrow(/no usable "session" secret/);
  expect(fs.readFileSync(file, 'utf8')).toBe(text);
});

it('gives processes that start at the same moment the same secret', { timeout: 30_000 }, async () => {
  const script = "import('./lib/secrets.ts').then((m) => console.log((m.default ?? m).getSecrets().session))";
  const args = ['--import', 'tsx', '--conditions=react-server', '-e', script];
  const env = { ...process.env, ASSIZE_DATA_DIR: folder };
  const runs = await Promise.all(
    Array.from({ length: 4 }, () => promisify(execFile)(process.execPath, args, { env })),
  );
  const secrets = new Set(runs.map(({ stdout }) => stdout.trim()));
  expect(secrets.size).toBe(1);
  expect(getSecrets().session).toBe([...secrets][0]);
});
