import type { Knex } from 'knex';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { makePerson } from '../server/person-fixture';
import { makeOpenRound, type FixtureRound } from '../server/round-fixture';
import { closeServerDatabase, openServerDatabase } from '../server/server-database';
import { expectAccessible, expectNoSidewaysScroll, testBrowser } from './browser';

const { newPage, newTab } = testBrowser();

const HEADER = 'item,measurand,result,comment\n';
const ROWS = 'M1,AFT,12.5,\nM1,DON,0.85,\nM2,AFT,<2.0,below our limit\n';

let connection: Knex;
let round: FixtureRound;
let people: { email: string; password: string }[];

beforeAll(async () => {
  connection = openServerDatabase(inject('dataDir'));
  round = await makeOpenRound(connection, 5);
  people = [];
  for (const laboratory of round.laboratories) {
    people.push(await makePerson(connection, 'analyst', laboratory.id));
  }
});
afterAll(() => closeServerDatabase(connection));

async function openRoundPage(
  index: number,
  width: 390 | 1440 = 1440,
  expected: RegExp[] = [],
): Promise<Page> {
  const page = await newPage({ as: people[index], width, expected });
  await page.goto(`/laboratory/rounds/${round.slug}`);
  return page;
}

async function drop(page: Page, text: string, name = 'results.csv'): Promise<void> {
  const file = { name, mimeType: 'text/csv', buffer: Buffer.from(text) };
  await page.locator('input[type=file]').setInputFiles(file);
}

async function submissionsOf(index: number): Promise<number> {
  const row = await connection('submissions')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .where('enrolments.laboratory_id', round.laboratories[index]?.id ?? 0)
    .count<{ n: number }[]>('* as n')
    .first();
  return Number(row?.n ?? 0);
}

const submitButton = (page: Page) => page.getByRole('button', { name: /^Submit these results/ });

test('a file with errors shows them by line and column, then a good one gets a receipt', async () => {
  const page = await openRoundPage(0, 1440, [/422/]);
  await drop(page, `${HEADER}M1,AFT,12.5 ug/kg,\nM9,AFT,3,\n`);
  await page.getByText('Line 2, result').first().waitFor();
  await page.getByText('Line 3, item').first().waitFor();
  expect(await submitButton(page).count()).toBe(0);
  await expectAccessible(page);

  await page.getByRole('button', { name: 'Choose another file' }).click();
  await drop(page, HEADER + ROWS);
  await submitButton(page).dblclick();
  await page.waitForURL(/\/receipts\//);
  await page.getByRole('heading', { name: /^Receipt/ }).waitFor();
  await expectAccessible(page);
  expect(await submissionsOf(0)).toBe(1);

  const code = /\/receipts\/([^/?]+)/.exec(page.url())?.[1] ?? '';
  const visitor = await newPage();
  await visitor.goto(`/check/${code}`);
  const text = await visitor.locator('main').innerText();
  expect(text).toContain(code);
  expect(text).not.toContain('12.5');
  expect(text).not.toContain(round.laboratories[0]?.name ?? '');
  await expectAccessible(visitor);
});

test('an amended file takes the place of the earlier one, which stays in the list', async () => {
  const page = await openRoundPage(1);
  await drop(page, HEADER + ROWS);
  await submitButton(page).click();
  await page.waitForURL(/\/receipts\//);
  await page.goto(`/laboratory/rounds/${round.slug}`);
  await drop(page, HEADER + ROWS.replace('12.5', '12.9'));
  await page.getByText('This would be an amendment.').waitFor();
  await submitButton(page).click();
  await page.waitForURL(/\/receipts\//);
  await page.goto(`/laboratory/rounds/${round.slug}`);
  expect(await page.getByRole('link', { name: /^[0-9A-Z]{4}-[0-9A-Z]{4}-[0-9A-Z]{4}$/ }).count()).toBe(2);
  expect(await submissionsOf(1)).toBe(2);
});

test('the same file sent from two tabs is one submission', async () => {
  const page = await openRoundPage(2);
  const other = await newTab(page);
  await other.goto(`/laboratory/rounds/${round.slug}`);
  for (const tab of [page, other]) {
    await drop(tab, HEADER + ROWS);
    await submitButton(tab).waitFor();
  }
  await Promise.all([submitButton(page).click(), submitButton(other).click()]);
  await Promise.all([page.waitForURL(/\/receipts\//), other.waitForURL(/\/receipts\//)]);
  expect(new URL(page.url()).pathname).toBe(new URL(other.url()).pathname);
  expect(await submissionsOf(2)).toBe(1);
});

test('a session that ended says so and keeps the chosen file', async () => {
  const page = await openRoundPage(3, 1440, [/401/]);
  await drop(page, HEADER + ROWS, 'kept.csv');
  await submitButton(page).waitFor();
  await page.context().clearCookies();
  await submitButton(page).click();
  await page
    .getByText(/sign in/i)
    .first()
    .waitFor();
  await page.getByText('kept.csv').first().waitFor();
  expect(await submissionsOf(3)).toBe(0);
});

test('on a phone the way from file to receipt works and nothing scrolls sideways', async () => {
  const page = await openRoundPage(4, 390);
  await expectNoSidewaysScroll(page);
  await drop(page, HEADER + ROWS);
  await submitButton(page).waitFor();
  await expectNoSidewaysScroll(page);
  await submitButton(page).click();
  await page.waitForURL(/\/receipts\//);
  await expectNoSidewaysScroll(page);
});

test('the template has the rows of the plan and is taken back when filled in', async () => {
  const page = await openRoundPage(4);
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: 'Template with semicolons' }).click(),
  ]);
  const chunks: Buffer[] = [];
  for await (const chunk of await download.createReadStream()) chunks.push(chunk as Buffer);
  const text = Buffer.concat(chunks).toString('utf8');
  expect(text.trim().split('\r\n')).toHaveLength(5);
  const filled = text.replaceAll(/(;1;)(;)/g, '$112,75$2');
  await drop(page, filled);
  await submitButton(page).waitFor();
});
