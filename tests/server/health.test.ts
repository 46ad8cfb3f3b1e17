import fs from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { version } from '../../package.json';
import { startOtherServer } from '../server-setup';
import { createClient } from './client';

test('health answers without sign-in and is never kept by a cache', async () => {
  const response = await createClient().get('/api/health');
  expect(response.status).toBe(200);
  expect(response.headers.get('cache-control')).toBe('no-store');
  expect(await response.json()).toEqual({ status: 'ok', version, database: 'ok' });
});

test('health answers 503 without details when the database cannot be opened', async () => {
  const server = await startOtherServer({
    data: 'none',
    health: '/favicon.svg',
    prepare: (dataDir) => void fs.mkdirSync(path.join(dataDir, 'assize.sqlite')),
  });
  try {
    const response = await createClient({ baseUrl: server.baseUrl }).get('/api/health');
    expect(response.status).toBe(503);
    expect(response.headers.get('cache-control')).toBe('no-store');
    expect(await response.json()).toEqual({ status: 'unavailable', version, database: 'unreachable' });
    expect(fs.readFileSync(server.logFile, 'utf8')).toMatch(/"path":"\/api\/health".*SQLITE_CANTOPEN/);
  } finally {
    await server.remove();
  }
});
