import { encode } from 'next-auth/jwt';
import type { Knex } from 'knex';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { addMembership } from '@/db/membership-store';
import { endSession } from '@/db/session-store';
import { setUserDisabled } from '@/db/user-store';
import { openSessionCookie, sealSessionId, sessionCookieName, sessionCookieOptions } from '@/lib/auth/cookie';
import { findSession } from '@/lib/auth/session';
import { testDatabase } from '../../db/test-database';
import { actorOf, addLaboratory, addPerson } from '../people-fixture';

let db: Knex;
let userId: number;
let sessionId: string;
let cookie: string;

beforeEach(async () => {
  db = await testDatabase();
  userId = await addPerson(db, { name: 'Ada Brook', roles: ['coordinator'] });
  ({ sessionId } = await actorOf(db, userId));
  cookie = await sealSessionId(sessionId);
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllEnvs();
});

it('finds the person, with the roles held at this moment', async () => {
  expect((await findSession(cookie))?.actor.memberships).toMatchObject([{ role: 'coordinator' }]);
  const mill = await addLaboratory(db, 'Lower Mill');
  await addMembership(db, { userId, laboratoryId: mill, role: 'analyst' });
  expect((await findSession(cookie))?.actor).toMatchObject({
    laboratoryId: mill,
    memberships: [{ role: 'coordinator' }, { role: 'analyst', laboratoryName: 'Lower Mill' }],
  });
});

it('needs one query', async () => {
  const queries: string[] = [];
  db.on('query', ({ sql }: { sql: string }) => queries.push(sql));
  await findSession(cookie);
  expect(queries).toHaveLength(1);
});

it('finds nobody by a session that has ended or expired, or for a disabled account', async () => {
  await db('sessions').where({ id: sessionId }).update({ expires_at: '2020-01-01T00:00:00.000Z' });
  expect(await findSession(cookie)).toBeNull();
  const second = await actorOf(db, userId);
  const secondCookie = await sealSessionId(second.sessionId);
  await endSession(db, second.sessionId);
  expect(await findSession(secondCookie)).toBeNull();
  const third = await actorOf(db, userId);
  await setUserDisabled(db, userId, true);
  expect(await findSession(await sealSessionId(third.sessionId))).toBeNull();
});

it('finds nobody by a cookie that is missing, altered, foreign or too old', async () => {
  expect(await findSession(undefined)).toBeNull();
  expect(await findSession('')).toBeNull();
  expect(await findSession('not a token')).toBeNull();
  expect(await findSession(`${cookie.slice(0, -4)}AAAA`)).toBeNull();
  expect(
    await findSession(await encode({ token: { sid: sessionId }, secret: 'someone else made this' })),
  ).toBeNull();
  vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 13 * 3_600_000 });
  expect(await openSessionCookie(cookie)).toBeNull();
});

it('carries the session id and nothing else of the person', async () => {
  expect(await openSessionCookie(cookie)).toBe(sessionId);
  expect(cookie).not.toContain('ada');
  expect(cookie.length).toBeLessThan(400);
});

it('takes the secure cookie name on a site served by https', () => {
  expect([sessionCookieName(), sessionCookieOptions().secure]).toEqual(['next-auth.session-token', false]);
  vi.stubEnv('ASSIZE_PUBLIC_URL', 'https://rounds.basin.example/');
  expect([sessionCookieName(), sessionCookieOptions().secure]).toEqual([
    '__Secure-next-auth.session-token',
    true,
  ]);
  expect(sessionCookieOptions()).toMatchObject({ httpOnly: true, sameSite: 'lax', maxAge: 43_200 });
});
