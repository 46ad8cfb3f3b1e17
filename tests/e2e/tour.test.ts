import type { Page } from 'playwright-core';
import { expect, inject, test } from 'vitest';
import { expectAccessible, expectNoSidewaysScroll, testBrowser } from './browser';

const { newPage } = testBrowser();
const DESK = { width: 1440, height: 900 };
const PHONE = { width: 390, height: 844 };
const DRAFT = '/rounds/feed-round-8';
const OPEN = '/rounds/cereals-round-8';
const CLOSED = '/rounds/feed-round-7';
const EVALUATED = '/rounds/cereals-round-7';
const PUBLISHED = '/rounds/cereals-round-6';
const ROUND_PAGES = ['plan', 'items', 'participants', 'results', 'evaluation', 'report', 'log'];

/** A laboratory with an action signal among its scores of the last feed round. */
function managerWithSignal(): { email: string; password: string } {
  const found = inject('demo').signIns.find(({ email }) => email.startsWith('agnes.arkwell@'));
  if (!found) throw new Error('the demonstration has no Agnes Arkwell');
  return found;
}

/** The rules whose outcome depends on the room there is; the others were asked on the wide screen. */
const ROOM = ['target-size', 'scrollable-region-focusable'];

/** Looks at a page on a wide screen in the light and on a phone in the dark; the whole of it there when it is short. */
async function look(page: Page, path: string, isShort = false): Promise<void> {
  await page.setViewportSize(DESK);
  await page.emulateMedia({ colorScheme: 'light' });
  await page.goto(path);
  expect(await page.locator('h1').count(), `h1 of ${path}`).toBe(1);
  await expectNoSidewaysScroll(page);
  await expectAccessible(page);
  await page.setViewportSize(PHONE);
  await page.emulateMedia({ colorScheme: 'dark' });
  await expectNoSidewaysScroll(page);
  await expectAccessible(page, isShort ? undefined : ROOM);
}

async function lookAtAll(page: Page, paths: readonly string[], areShort = false): Promise<void> {
  for (const path of paths) await look(page, path, areShort);
}

/** Where the first link of the page leads whose address begins so. */
async function addressOf(page: Page, beginning: string): Promise<string> {
  const address = await page.locator(`main a[href^="${beginning}"]`).first().getAttribute('href');
  if (!address) throw new Error(`no link to ${beginning} on ${page.url()}`);
  return address;
}

test('a visitor', async () => {
  const page = await newPage({ expected: [/404/] });
  await lookAtAll(page, ['/', '/sign-in', '/reset', '/reset/no-link', '/welcome/no-link'], true);
  await lookAtAll(page, ['/check', '/check/7QK2-0XNB-4TRM', '/no-such-page'], true);
});

test('a coordinator, at a round in each state', async () => {
  const page = await newPage({ as: 'coordinator' });
  await lookAtAll(
    page,
    ROUND_PAGES.map((name) => `${OPEN}/${name}`),
  );
  await lookAtAll(page, [DRAFT, `${CLOSED}/review`, `${PUBLISHED}/report`]);
});

test('a coordinator, at rounds, schemes and laboratories', async () => {
  const page = await newPage({ as: 'coordinator' });
  await lookAtAll(page, ['/rounds', '/rounds/new', '/schemes/new', '/laboratories/new', '/schemes']);
  await look(page, await addressOf(page, '/schemes/mycotoxins'));
  await look(page, '/laboratories');
  await look(page, await addressOf(page, '/laboratories/'));
});

test('a reviewer', async () => {
  const page = await newPage({ as: 'reviewer' });
  await lookAtAll(page, ['/rounds', `${EVALUATED}/evaluation`, `${PUBLISHED}/participants`, '/account']);
});

test('an administrator', async () => {
  const page = await newPage({ as: 'administrator' });
  await lookAtAll(page, ['/admin/mail', '/admin/log', '/admin/people']);
  await look(page, await addressOf(page, '/admin/people/'));
});

test('the manager of a laboratory', async () => {
  const page = await newPage({ as: 'lab_manager' });
  await lookAtAll(page, ['/laboratory', '/laboratory/trend', '/laboratory/people', '/laboratory/tokens']);
  await lookAtAll(
    page,
    [DRAFT, OPEN, CLOSED].map((round) => `/laboratory${round}`),
  );
});

test('the manager of a laboratory with an action signal', async () => {
  const page = await newPage({ as: managerWithSignal() });
  const round = '/laboratory/rounds/feed-round-6';
  await look(page, round);
  const receipt = await addressOf(page, `${round}/receipts/`);
  await look(page, await addressOf(page, `${round}/scores/`));
  await look(page, receipt);
  await look(page, `/check/${receipt.split('/').at(-1)}`);
});

test('an analyst', async () => {
  const page = await newPage({ as: 'analyst', expected: [/404/] });
  await lookAtAll(page, [
    '/laboratory',
    `/laboratory${OPEN}`,
    '/account',
    '/laboratory/rounds/no-such-round',
  ]);
});
