import { expect, it } from 'vitest';
import { AppError, type ErrorCode } from '@/lib/errors';
import { handle, readBodyLimited } from '@/lib/http';
import { describeError } from '@/lib/log';

const URL_HERE = 'http://127.0.0.1:3000/api/thing';

async function answerOf(
  work: () => Promise<Response>,
): Promise<{ response: Response; body: Record<string, unknown> }> {
  const response = await handle(work)(new Request(URL_HERE), {});
  return { response, body: (await response.clone().json()) as Record<string, unknown> };
}

const STATUSES: [ErrorCode, number][] = [
  ['invalid', 422],
  ['not-signed-in', 401],
  ['forbidden', 403],
  ['not-found', 404],
  ['conflict', 409],
  ['too-large', 413],
  ['unsupported', 415],
  ['too-many', 429],
  ['blocked', 409],
];

it.each(STATUSES)('answers %s with %i and problem details', async (code, status) => {
  const { response, body } = await answerOf(() => Promise.reject(new AppError(code, 'Said so.')));
  expect(response.status).toBe(status);
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  expect(body).toEqual({
    type: `urn:assize:problem:${code}`,
    title: expect.any(String),
    status,
    detail: 'Said so.',
  });
  expect(response.headers.has('www-authenticate')).toBe(status === 401);
});

it('lists the fields that are wrong', async () => {
  const error = new AppError('invalid', 'No.', { fieldErrors: { name: 'Enter a name.' } });
  const { body } = await answerOf(() => Promise.reject(error));
  expect(body.errors).toEqual([{ field: 'name', detail: 'Enter a name.' }]);
});

it('says nothing of a fault but its number', async () => {
  const { response, body } = await answerOf(() =>
    Promise.reject(new Error('password_hash is $argon2id$...')),
  );
  expect(response.status).toBe(500);
  expect(JSON.stringify(body)).not.toContain('argon2');
  expect(body.faultId).toMatch(/^[0-9a-f]{8}$/);
  expect(body.detail).toContain(body.faultId);
});

it('sets careful headers on every answer, and leaves a given cache rule', async () => {
  const plain = await handle(async () => Response.json({}))(new Request(URL_HERE), {});
  expect(plain.headers.get('cache-control')).toBe('no-store');
  expect(plain.headers.get('x-content-type-options')).toBe('nosniff');
  const cached = await handle(async () => new Response('', { headers: { 'cache-control': 'max-age=60' } }))(
    new Request(URL_HERE),
    {},
  );
  expect(cached.headers.get('cache-control')).toBe('max-age=60');
});

it('reads a body up to the limit', async () => {
  const request = (body: BodyInit | null) => new Request(URL_HERE, { method: 'POST', body });
  expect(await readBodyLimited(request('12345'), 5)).toEqual(Buffer.from('12345'));
  expect(await readBodyLimited(request(null), 5)).toEqual(Buffer.alloc(0));
  await expect(readBodyLimited(request('123456'), 5)).rejects.toMatchObject({ code: 'too-large' });
});

it('stops reading a body that says nothing of its size', async () => {
  let sent = 0;
  const endless = new ReadableStream<Uint8Array>({
    pull(controller) {
      sent += 1;
      controller.enqueue(new Uint8Array(1_000));
    },
  });
  const init = { method: 'POST', body: endless, duplex: 'half' };
  await expect(readBodyLimited(new Request(URL_HERE, init), 10_000)).rejects.toMatchObject({
    code: 'too-large',
    userMessage: expect.stringContaining('10000 bytes'),
  });
  expect(sent).toBeLessThan(20);
});

it('refuses by the stated size before reading', async () => {
  const headers = { 'content-length': '5000001' };
  const request = new Request(URL_HERE, { method: 'POST', body: 'x', headers });
  await expect(readBodyLimited(request, 5_000_000)).rejects.toMatchObject({
    userMessage: expect.stringContaining('5 MB'),
  });
});

it('keeps the values of a failed database statement out of the log', () => {
  const error = Object.assign(
    new Error("insert into `users` (`password_hash`) values ('$argon2id$secret') - UNIQUE constraint failed"),
    { code: 'SQLITE_CONSTRAINT_UNIQUE' },
  );
  const described = describeError(new Error('outer', { cause: error }));
  expect(JSON.stringify(described)).not.toContain('argon2');
  expect(described.cause?.message).toBe('UNIQUE constraint failed');
});
