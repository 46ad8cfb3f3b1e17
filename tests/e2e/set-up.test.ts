import { afterAll, beforeAll, expect, test } from 'vitest';
import { startOtherServer, type OtherServer } from '../server-setup';
import { createClient } from '../server/client';
import { expectAccessible, testBrowser } from './browser';

const { newPage } = testBrowser();
const PASSWORD = 'barley kiln lantern meadow';

let server: OtherServer;

beforeAll(async () => {
  server = await startOtherServer({ data: 'empty' });
});
afterAll(() => server.remove());

test('an empty installation leads the first administrator through set-up, once', async () => {
  const { baseUrl } = server;
  const page = await newPage({ baseUrl });
  await page.goto('/');
  await page.waitForURL('**/set-up');
  await expectAccessible(page);
  await page.getByLabel('Your name').fill('Ada Lind');
  await page.getByLabel('E-mail').fill('ada@provider.example');
  await page.getByLabel('New password').fill('short');
  await page.getByLabel('The same password again').fill('short');
  await page.getByRole('button', { name: 'Set up and sign in' }).click();
  await page
    .getByText(/at least 12 characters/)
    .first()
    .waitFor();
  expect(await page.getByLabel('Your name').inputValue()).toBe('Ada Lind');
  await page.getByLabel('New password').fill(PASSWORD);
  await page.getByLabel('The same password again').fill(PASSWORD);
  await page.getByRole('button', { name: 'Set up and sign in' }).click();
  await page.waitForURL((url) => url.pathname !== '/set-up');

  await page.goto('/rounds');
  expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('Rounds');
  await page.goto('/schemes');
  await page.getByText('No scheme yet').waitFor();
  await page.goto('/admin/people');
  await page.locator('main').getByText('ada@provider.example').filter({ visible: true }).first().waitFor();

  const again = await createClient({ baseUrl }).get('/set-up');
  expect([303, 307, 404]).toContain(again.status);
  const visitor = await newPage({ baseUrl });
  await visitor.goto('/sign-in');
  await visitor.getByLabel('E-mail').fill('ada@provider.example');
  await visitor.getByLabel('Password').fill('not the password at all');
  await visitor.getByRole('button', { name: 'Sign in' }).click();
  // Not by its role: the framework's own announcer of routes is an alert as well, and always there.
  await visitor.getByText('The e-mail or the password is not right.').first().waitFor();
  expect(await visitor.getByLabel('E-mail').inputValue()).toBe('ada@provider.example');
  await visitor.getByLabel('Password').fill(PASSWORD);
  await visitor.getByRole('button', { name: 'Sign in' }).click();
  await visitor.waitForURL((url) => url.pathname !== '/sign-in');
});
