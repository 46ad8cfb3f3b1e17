import { expect } from 'vitest';
import type { Page } from 'playwright-core';

/** What a coordinator and a reviewer do by clicking, in the order of a round's life. */

export interface MeasurandChoice {
  code: string;
  name: string;
  unit: string;
  decimals: number;
  /** The option's label. */
  sigmaRule: string;
}

export async function createScheme(page: Page, name: string, measurand: MeasurandChoice): Promise<void> {
  await page.goto('/schemes/new');
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByRole('button', { name: 'Create scheme' }).click();
  await page.getByRole('heading', { level: 1, name }).waitFor();
  await page.getByRole('button', { name: 'Add measurand' }).first().click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Code').fill(measurand.code);
  await dialog.getByLabel('Name').fill(measurand.name);
  await dialog.getByLabel('Unit').fill(measurand.unit);
  await dialog.getByLabel('Decimals').fill(String(measurand.decimals));
  await dialog.getByLabel('How sigma_pt is set').selectOption({ label: measurand.sigmaRule });
  await dialog.getByRole('button', { name: 'Add measurand' }).click();
  await dialog.waitFor({ state: 'hidden' });
  await expectText(page, measurand.name);
}

/** Plans a round with one item that holds every measurand of the scheme; gives its slug. */
export async function planRound(
  page: Page,
  choice: { scheme: string; name: string; item: string; isPast?: boolean },
): Promise<string> {
  await page.goto('/rounds/new');
  await page.getByLabel('Scheme').selectOption({ label: choice.scheme });
  await page.getByLabel('Name of the round').fill(choice.name);
  if (choice.isPast) await page.getByLabel('This is a past round').check();
  await page.getByRole('button', { name: 'Create round' }).click();
  await page.waitForURL(/\/rounds\/(?!new)[^/]+/);
  const slug = /\/rounds\/([^/]+)/.exec(page.url())?.[1] ?? '';
  await page.goto(`/rounds/${slug}/plan`);
  await page.getByRole('button', { name: 'Add test item' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Code on the label').fill(choice.item);
  await dialog.getByLabel('What it is').fill('Material of the published example');
  for (const box of await dialog.getByRole('checkbox').all()) await box.check();
  await dialog.getByRole('button', { name: 'Add item' }).click();
  await dialog.waitFor({ state: 'hidden' });
  await page.getByRole('region', { name: `Item ${choice.item}`, exact: true }).waitFor();
  return slug;
}

/** Presses the button of the next step and confirms it. */
export async function takeStep(page: Page, slug: string, step: string, confirm: string): Promise<void> {
  await page.goto(`/rounds/${slug}`);
  await page.getByRole('button', { name: step, exact: true }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByRole('button', { name: confirm, exact: true }).click();
  await dialog.waitFor({ state: 'hidden' });
}

export async function enrolAtOnce(page: Page, slug: string, search: string, count: number): Promise<void> {
  await page.goto(`/rounds/${slug}/participants`);
  await page.getByRole('button', { name: 'Add laboratories' }).first().click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Search laboratories').fill(search);
  await dialog.getByRole('button', { name: 'Tick all shown' }).click();
  await dialog.getByLabel('enrolled at once').check();
  await dialog.getByRole('button', { name: `Add ${count} laboratories` }).click();
  await dialog.waitFor({ state: 'hidden' });
}

export async function signVersion(page: Page, slug: string, version: number): Promise<void> {
  await page.goto(`/rounds/${slug}/evaluation`);
  await page.getByLabel('Comment').first().fill('Read and redone by hand.');
  await page.getByRole('button', { name: `Sign version ${version}` }).click();
  await expectText(page, `Version ${version} is signed.`);
}

export async function expectText(page: Page, text: string): Promise<void> {
  await page.getByText(text).first().waitFor();
}

/** Rows of the table whose caption holds `caption`, each as its cells' texts by header, minus signs as hyphens. */
export async function readTable(page: Page, caption: string): Promise<Record<string, string>[]> {
  const table = page.locator('table', { has: page.locator('caption', { hasText: caption }) }).first();
  await table.waitFor();
  const texts = await table
    .locator('tr')
    .evaluateAll((rows) =>
      rows.map((row) => [...row.querySelectorAll('th,td')].map((cell) => cell.textContent ?? '')),
    );
  const [header = [], ...rows] = texts.map((cells) =>
    cells.map((cell) => cell.replaceAll('\u2212', '-').replace(/\s+/g, ' ').trim()),
  );
  expect(rows.length, `rows of ${caption}`).toBeGreaterThan(0);
  return rows.map((cells) => Object.fromEntries(header.map((name, index) => [name, cells[index] ?? ''])));
}
