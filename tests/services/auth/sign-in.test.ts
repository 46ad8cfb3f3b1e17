import type { Knex } from 'knex';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { setUserDisabled } from '@/db/user-store';
import { signIn } from '@/lib/services/sign-in';
import { testDatabase } from '../../db/test-database';
import { addPerson, emailOf, logOf, PASSWORD } from '../people-fixture';

const EMAIL = emailOf('Ada Brook');
const WRONG = { email: EMAIL, password: 'not the right one' };
const RIGHT = { email: EMAIL, password: PASSWORD };

let db: Knex;
let userId: number;

beforeEach(async () => {
  vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-12-01T10:00:30Z') });
  db = await testDatabase();
  userId = await addPerson(db, { name: 'Ada Brook', roles: ['coordinator'] });
});
afterEach(() => vi.useRealTimers());

async function failTimes(times: number, credentials = WRONG): Promise<void> {
  for (let time = 0; time < times; time += 1) {
    await expect(signIn(credentials)).rejects.toMatchObject({ code: 'invalid' });
  }
}

it('begins a session of twelve hours and writes it down', async () => {
  const { sessionId } = await signIn({ email: ` ${EMAIL.toUpperCase()} `, password: PASSWORD });
  expect(sessionId).toMatch(/^[A-Za-z0-9_-]{43}$/);
  expect(await db('sessions').select('id', 'user_id', 'expires_at')).toEqual([
    { id: sessionId, user_id: userId, expires_at: '2026-12-01T22:00:30.000Z' },
  ]);
  expect(await logOf(db)).toMatchObject([{ action: 'sign-in', outcome: 'done', user_id: userId }]);
});

it('gives one answer to a wrong password, an unknown e-mail, a disabled account and an unused invitation', async () => {
  await addPerson(db, { name: 'Cy Reed', invited: true });
  const disabled = await addPerson(db, { name: 'Di Weir' });
  await setUserDisabled(db, disabled, true);
  const tries = [
    WRONG,
    { email: 'nobody@basin.example', password: PASSWORD },
    { email: emailOf('Di Weir'), password: PASSWORD },
    { email: emailOf('Cy Reed'), password: PASSWORD },
  ];
  const answers: unknown[] = [];
  for (const credentials of tries) {
    answers.push(
      await signIn(credentials).catch((error: Error) => ({ code: error.name, text: error.message })),
    );
  }
  expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
  expect((await logOf(db)).map((row) => row.outcome)).toEqual(['refused', 'refused', 'refused', 'refused']);
  expect(await db('sessions').select()).toEqual([]);
});

it('takes about as long for an unknown e-mail as for a known one', async () => {
  const time = async (email: string) => {
    const start = performance.now();
    await signIn({ email, password: 'not the right one' }).catch(() => null);
    return performance.now() - start;
  };
  await time('warm-up@basin.example');
  const known = [await time(EMAIL), await time(EMAIL), await time(EMAIL)].sort((a, b) => a - b)[1] ?? 0;
  const unknown = [
    await time('a@basin.example'),
    await time('b@basin.example'),
    await time('c@basin.example'),
  ];
  // Without the decoy the ratio is below 0.1.
  expect((unknown.sort((a, b) => a - b)[1] ?? 0) / known).toBeGreaterThan(0.4);
});

it('says when to try again after ten failures, and lets the person in then', async () => {
  await failTimes(10);
  await expect(signIn(RIGHT)).rejects.toMatchObject({
    code: 'too-many',
    userMessage: expect.stringContaining('Try again after 10:16 UTC'),
  });
  expect(await db('sessions').select()).toEqual([]);
  vi.setSystemTime(new Date('2026-12-01T10:15:29Z'));
  await expect(signIn(RIGHT)).rejects.toMatchObject({ code: 'too-many' });
  vi.setSystemTime(new Date('2026-12-01T10:15:31Z'));
  await expect(signIn(RIGHT)).resolves.toMatchObject({ userId });
});

it('holds back an unknown e-mail in the same way, and nobody else', async () => {
  const nobody = { email: 'nobody@basin.example', password: 'not the right one' };
  await failTimes(10, nobody);
  await expect(signIn(nobody)).rejects.toMatchObject({ code: 'too-many' });
  await expect(signIn(RIGHT)).resolves.toMatchObject({ userId });
});

it('starts counting anew after a success', async () => {
  await failTimes(9);
  await signIn(RIGHT);
  await failTimes(9);
  await expect(signIn(RIGHT)).resolves.toMatchObject({ userId });
});

it('counts guesses made at the same moment', async () => {
  const guesses = await Promise.allSettled(Array.from({ length: 15 }, () => signIn(WRONG)));
  const codes = guesses.map((guess) =>
    guess.status === 'rejected' ? (guess.reason as { code: string }).code : 'in',
  );
  expect(codes.filter((code) => code === 'invalid')).toHaveLength(10);
  expect(codes.filter((code) => code === 'too-many')).toHaveLength(5);
});

it('does not log a password typed into the field for the e-mail', async () => {
  await signIn({ email: PASSWORD, password: 'x' }).catch(() => null);
  expect(JSON.stringify(await logOf(db))).not.toContain('dust');
  expect(await db('sign_in_attempts').select()).toEqual([]);
});

it('keeps nothing of an e-mail or a password that no one can have', async () => {
  const tries = [
    { email: `${'x'.repeat(300)}@basin.example`, password: PASSWORD },
    { email: EMAIL, password: 'x'.repeat(100_000) },
  ];
  for (const credentials of tries) {
    await expect(signIn(credentials)).rejects.toMatchObject({ code: 'invalid' });
  }
  expect(await db('sign_in_attempts').select()).toEqual([]);
  expect(JSON.stringify(await logOf(db))).not.toContain('xxx');
});
