import type { Knex } from 'knex';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { setUserDisabled } from '@/db/user-store';
import { mailLink } from '@/lib/services/link-mail';
import { askForReset, findLinkHolder, setPasswordByLink } from '@/lib/services/passwords';
import { signIn } from '@/lib/services/sign-in';
import { hashToken } from '@/lib/token-hash';
import { testDatabase } from '../../db/test-database';
import { actorOf, addPerson, emailOf, lastLinkToken, logOf, PASSWORD } from '../people-fixture';

const NEW_PASSWORD = 'the mill by the river';
const EMAIL = emailOf('Bo Miller');

let db: Knex;

beforeEach(async () => {
  vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-12-01T10:00:00Z') });
  db = await testDatabase();
});
afterEach(() => vi.useRealTimers());

async function inviteBo(): Promise<{ id: number; token: string }> {
  const id = await addPerson(db, { name: 'Bo Miller', invited: true });
  await mailLink(db, { id, name: 'Bo Miller', email: EMAIL }, 'welcome', 'Lower Mill');
  return { id, token: await lastLinkToken(db) };
}

it('writes a mail with the link and keeps only its hash', async () => {
  const { token } = await inviteBo();
  const mail = await db('outbox').first();
  expect(mail).toMatchObject({ to_address: EMAIL, state: 'waiting' });
  expect(mail.body).toContain('access to Assize for Lower Mill');
  expect(mail.body).toContain('until 8 Dec 2026, 10:00 UTC');
  const stored = await db('one_time_links').first();
  expect(stored.token_hash).toBe(hashToken(token));
  expect(JSON.stringify(stored)).not.toContain(token);
});

it('lets an invited person choose a password once', async () => {
  const { id, token } = await inviteBo();
  const { sessionId } = await setPasswordByLink({ token, purpose: 'welcome', password: NEW_PASSWORD });
  expect(await db('sessions').where({ id: sessionId }).first()).toMatchObject({
    user_id: id,
    ended_at: null,
  });
  await expect(signIn({ email: EMAIL, password: NEW_PASSWORD })).resolves.toMatchObject({ userId: id });
  await expect(
    setPasswordByLink({ token, purpose: 'welcome', password: 'another good password' }),
  ).rejects.toMatchObject({ code: 'not-found' });
  await expect(signIn({ email: EMAIL, password: NEW_PASSWORD })).resolves.toMatchObject({ userId: id });
});

it('is not used up by looking at the page', async () => {
  const { token } = await inviteBo();
  for (let look = 0; look < 3; look += 1) {
    expect(await findLinkHolder(token, 'welcome')).toMatchObject({ name: 'Bo Miller' });
  }
});

it('lets one of two clicks at the same moment through', async () => {
  const { token } = await inviteBo();
  const clicks = await Promise.allSettled([
    setPasswordByLink({ token, purpose: 'welcome', password: NEW_PASSWORD }),
    setPasswordByLink({ token, purpose: 'welcome', password: 'another good password' }),
  ]);
  expect(clicks.map((click) => click.status).sort()).toEqual(['fulfilled', 'rejected']);
});

it('is good for seven days as an invitation and one hour as a reset', async () => {
  const { token } = await inviteBo();
  await addPerson(db, { name: 'Ada Brook' });
  await askForReset(emailOf('Ada Brook'));
  const reset = await lastLinkToken(db);
  vi.setSystemTime(new Date('2026-12-01T10:59:59Z'));
  expect(await findLinkHolder(reset, 'reset')).not.toBeNull();
  vi.setSystemTime(new Date('2026-12-01T11:00:00Z'));
  expect(await findLinkHolder(reset, 'reset')).toBeNull();
  vi.setSystemTime(new Date('2026-12-08T09:59:59Z'));
  expect(await findLinkHolder(token, 'welcome')).not.toBeNull();
  vi.setSystemTime(new Date('2026-12-08T10:00:00Z'));
  expect(await findLinkHolder(token, 'welcome')).toBeNull();
});

it('works only for its own purpose, and not for a disabled account', async () => {
  const { id, token } = await inviteBo();
  expect(await findLinkHolder(token, 'reset')).toBeNull();
  await setUserDisabled(db, id, true);
  expect(await findLinkHolder(token, 'welcome')).toBeNull();
  await expect(
    setPasswordByLink({ token, purpose: 'welcome', password: NEW_PASSWORD }),
  ).rejects.toMatchObject({ code: 'not-found' });
});

it('refuses a weak password and stays good', async () => {
  const { token } = await inviteBo();
  await expect(
    setPasswordByLink({ token, purpose: 'welcome', password: 'password1234' }),
  ).rejects.toMatchObject({ code: 'invalid', fieldErrors: { password: expect.stringContaining('guessed') } });
  expect(await findLinkHolder(token, 'welcome')).not.toBeNull();
});

it('resets: ends every session, frees a held-back sign-in and closes the other links', async () => {
  const id = await addPerson(db, { name: 'Bo Miller' });
  const { sessionId: old } = await actorOf(db, id);
  for (let time = 0; time < 10; time += 1)
    await signIn({ email: EMAIL, password: 'wrong' }).catch(() => null);
  await askForReset(EMAIL);
  const first = await lastLinkToken(db);
  await askForReset(EMAIL);
  const { sessionId } = await setPasswordByLink({
    token: await lastLinkToken(db),
    purpose: 'reset',
    password: NEW_PASSWORD,
  });
  expect(await db('sessions').whereNull('ended_at').pluck('id')).toEqual([sessionId]);
  expect(await db('sessions').where({ id: old }).first()).toMatchObject({ ended_at: expect.any(String) });
  expect(await findLinkHolder(first, 'reset')).toBeNull();
  await expect(signIn({ email: EMAIL, password: NEW_PASSWORD })).resolves.toMatchObject({ userId: id });
  await expect(signIn({ email: EMAIL, password: PASSWORD })).rejects.toMatchObject({ code: 'invalid' });
});

it('says nothing about whether an address has an account', async () => {
  await expect(askForReset('nobody@basin.example')).resolves.toBeUndefined();
  const disabled = await addPerson(db, { name: 'Di Weir' });
  await setUserDisabled(db, disabled, true);
  await expect(askForReset(emailOf('Di Weir'))).resolves.toBeUndefined();
  expect(await db('outbox').select()).toEqual([]);
  expect((await logOf(db)).map(({ action, outcome }) => [action, outcome])).toEqual([
    ['password.reset-asked', 'refused'],
    ['password.reset-asked', 'refused'],
  ]);
});

it('sends at most three resets an hour to one person', async () => {
  await addPerson(db, { name: 'Ada Brook' });
  for (let time = 0; time < 5; time += 1) await askForReset(emailOf('Ada Brook'));
  expect(await db('outbox').select()).toHaveLength(3);
  vi.setSystemTime(new Date('2026-12-01T11:00:01Z'));
  await askForReset(emailOf('Ada Brook'));
  expect(await db('outbox').select()).toHaveLength(4);
});
