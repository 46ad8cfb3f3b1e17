import type { Knex } from 'knex';
import type { Transporter } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { addMail } from '@/db/outbox-store';
import { sendNextMail, startMailSender, stopMailSender } from '@/lib/mail/sender';
import { openTransport } from '@/lib/mail/smtp';
import { getMail, isMailSent, sendMailAgain } from '@/lib/services/mail';
import { testDatabase } from '../../db/test-database';
import { logOf, newActor } from '../people-fixture';
import { startFakeSmtp, type FakeSmtp } from './fake-smtp';

const LINK = 'http://127.0.0.1:3000/welcome/abcdefghijklmnopqrstuvwxyz0123456789';
const MINUTE_MS = 60_000;

let db: Knex;
let smtp: FakeSmtp;
let transport: Transporter;

beforeEach(async () => {
  vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-12-01T10:00:00Z') });
  db = await testDatabase();
  smtp = await startFakeSmtp();
  transport = openTransport(smtp.url);
});
afterEach(async () => {
  stopMailSender();
  transport.close();
  await smtp.stop();
  vi.unstubAllEnvs();
  vi.useRealTimers();
});

async function queue(name = 'Bo', key = `test-${name}`): Promise<void> {
  await addMail(db, {
    dedupeKey: key,
    to: `${name.toLowerCase()}@mill.example`,
    subject: `Grüße an ${name}`,
    body: `Dear ${name},\n\nChoose a password here: ${LINK}`,
  });
}

async function sendAll(): Promise<number> {
  let count = 0;
  while (await sendNextMail(transport)) count += 1;
  return count;
}

function rows(): Promise<{ state: string; attempts: number; last_error: string; body: string }[]> {
  return db('outbox').orderBy('id').select('state', 'attempts', 'last_error', 'body');
}

describe('sending', () => {
  it('hands each mail over once, in the order written', async () => {
    await queue('Bo');
    await queue('Cy');
    await queue('Bo');
    expect(await sendAll()).toBe(2);
    expect(await sendAll()).toBe(0);
    expect(smtp.received.map(({ to }) => to)).toEqual([['bo@mill.example'], ['cy@mill.example']]);
    expect(smtp.received[0]?.text).toContain('welcome/abcdef');
    expect(smtp.received[0]?.headers).toMatch(/^Message-ID: <[0-9a-f]{32}@127\.0\.0\.1>$/im);
    expect(smtp.received[0]?.headers).toMatch(/^Auto-Submitted: auto-generated$/im);
  });

  it('keeps no one-time link of what has been sent', async () => {
    await queue();
    await sendAll();
    expect(await rows()).toMatchObject([{ state: 'sent', attempts: 1 }]);
    expect((await rows())[0]?.body).toContain('/welcome/(link taken out)');
    expect((await rows())[0]?.body).not.toContain('abcdef');
  });

  it('takes a mail once, however many ask at the same moment', async () => {
    for (const name of ['Bo', 'Cy', 'Di']) await queue(name);
    smtp.delayMs = 30;
    await Promise.all([sendAll(), sendAll(), sendAll()]);
    expect(smtp.received.map(({ to }) => to[0]).sort()).toEqual([
      'bo@mill.example',
      'cy@mill.example',
      'di@mill.example',
    ]);
  });

  it('leaves a mail in hand alone, and takes it up again if its sender died', async () => {
    await queue();
    await db('outbox').update({ attempts: 1, next_attempt_at: '2026-12-01T10:10:00.000Z' });
    expect(await sendAll()).toBe(0);
    vi.setSystemTime(new Date('2026-12-01T10:10:00Z'));
    expect(await sendAll()).toBe(1);
    expect(smtp.received).toHaveLength(1);
  });
});

describe('failing', () => {
  it('waits longer and longer while the server is away, then gives up', async () => {
    await queue();
    smtp.answer = { code: 451, text: 'Try later' };
    const waits: number[] = [];
    for (;;) {
      await sendAll();
      const row = await db('outbox').first();
      if (row.state === 'failed') break;
      expect(row.last_error).toContain('Try later');
      waits.push((Date.parse(row.next_attempt_at) - Date.now()) / MINUTE_MS);
      vi.setSystemTime(new Date(row.next_attempt_at));
    }
    expect(waits).toEqual([1, 5, 15, 60, 240, 720, 1_440]);
    expect(await rows()).toMatchObject([{ state: 'failed', attempts: 8 }]);
    expect(smtp.received).toEqual([]);
  });

  it('arrives once the server is back', async () => {
    await queue();
    smtp.answer = { code: 421, text: 'Closing' };
    await sendAll();
    smtp.answer = null;
    expect(await sendAll()).toBe(0);
    vi.setSystemTime(new Date('2026-12-01T10:01:01Z'));
    expect(await sendAll()).toBe(1);
    expect(await rows()).toMatchObject([{ state: 'sent', attempts: 2, last_error: '' }]);
  });

  it('gives up at once on an address that is refused for good, and does not hold up the others', async () => {
    await queue('Gone');
    await queue('Bo');
    smtp.refusedAddress = 'gone@mill.example';
    await sendAll();
    expect(await rows()).toMatchObject([{ state: 'failed', attempts: 1 }, { state: 'sent' }]);
  });

  it('can be sent again by hand, and only then', async () => {
    const admin = await newActor(db, { name: 'Ada Brook', roles: ['administrator'] });
    await queue('Gone');
    await expect(sendMailAgain(admin, 1)).rejects.toMatchObject({ code: 'conflict' });
    smtp.refusedAddress = 'gone@mill.example';
    await sendAll();
    smtp.refusedAddress = null;
    await sendMailAgain(admin, 1);
    expect(await sendAll()).toBe(1);
    expect(smtp.received).toHaveLength(1);
    expect(await logOf(db)).toMatchObject([{ action: 'mail.sent-again', detail: 'mail 1' }]);
  });
});

describe('reading', () => {
  it('shows working links only where no mail leaves the installation', async () => {
    await queue();
    vi.stubEnv('ASSIZE_SMTP_URL', '');
    expect(isMailSent()).toBe(false);
    expect((await getMail(1)).body).toContain(LINK);
    vi.stubEnv('ASSIZE_SMTP_URL', smtp.url);
    expect(isMailSent()).toBe(true);
    expect((await getMail(1)).body).not.toContain('abcdef');
    await expect(getMail(99)).rejects.toMatchObject({ code: 'not-found' });
  });
});

describe('the loop', () => {
  it('does not start without a server', async () => {
    vi.stubEnv('ASSIZE_SMTP_URL', '');
    vi.useFakeTimers({ toFake: ['setInterval', 'clearInterval', 'Date'] });
    startMailSender();
    expect(vi.getTimerCount()).toBe(0);
  });

  it('starts once and sends what is due', async () => {
    vi.stubEnv('ASSIZE_SMTP_URL', smtp.url);
    vi.useFakeTimers({
      toFake: ['setInterval', 'clearInterval', 'Date'],
      now: new Date('2026-12-01T10:00:00Z'),
    });
    await queue();
    startMailSender();
    const timers = vi.getTimerCount();
    startMailSender();
    expect(vi.getTimerCount()).toBe(timers);
    vi.advanceTimersByTime(5_000);
    vi.advanceTimersByTime(5_000);
    await vi.waitFor(async () => expect(await rows()).toMatchObject([{ state: 'sent', attempts: 1 }]));
    expect(smtp.received).toHaveLength(1);
  });
});
