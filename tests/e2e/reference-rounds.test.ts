import type { Knex } from 'knex';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { loadChecks, loadColumn } from '../reference/proficiency/load-checks';
import { createClient } from '../server/client';
import { makePerson } from '../server/person-fixture';
import { makeLaboratory } from '../server/round-fixture';
import { closeServerDatabase, openServerDatabase } from '../server/server-database';
import { testBrowser } from './browser';
import {
  createScheme,
  enrolAtOnce,
  expectText,
  planRound,
  readTable,
  signVersion,
  takeStep,
} from './provider-steps';

const { newPage } = testBrowser();
const SIGMA = 'Robust standard deviation of this round';
const TIMEOUT = 300_000;

let connection: Knex;
let coordinator: { email: string; password: string };
let reviewer: { email: string; password: string };

beforeAll(async () => {
  connection = openServerDatabase(inject('dataDir'));
  coordinator = await makePerson(connection, 'coordinator');
  reviewer = await makePerson(connection, 'reviewer');
});
afterAll(() => closeServerDatabase(connection));

/** A figure of the reference set, by its id; source and provenance stand beside it in checks.json. */
function reference(id: string): number {
  const check = loadChecks().find((entry) => entry.id === id);
  if (!check) throw new Error(`no reference figure ${id}`);
  return check.value;
}

interface Expected {
  algorithmA: { location: number; scale: number };
  median: number;
  madE: number;
  nIqr: number | null;
  decimals: number;
}

async function expectEstimates(page: Page, expected: Expected): Promise<void> {
  const rows = await readTable(page, 'Estimates from');
  const shown = Object.fromEntries(rows.map((row) => [row['Statistic'], row['Value']]));
  const text = (value: number) => value.toFixed(expected.decimals);
  expect(shown['x*']).toBe(text(expected.algorithmA.location));
  expect(shown['s*']).toBe(text(expected.algorithmA.scale));
  expect(shown['median']).toBe(text(expected.median));
  expect(shown['MADe']).toBe(text(expected.madE));
  if (expected.nIqr !== null) expect(shown['nIQR']).toBe(text(expected.nIqr));
}

/** z of each result against the reference's own x* and s*, to the two decimals of the page. */
async function expectScores(page: Page, values: readonly number[], expected: Expected): Promise<void> {
  const { location, scale } = expected.algorithmA;
  const rows = await readTable(page, 'Scores of all participants');
  const shown = rows.map((row) => /-?\d+\.\d+/.exec(row['z'] ?? '')?.[0] ?? '').sort();
  const wanted = values
    .map((value) => ((value - location) / scale).toFixed(2).replace('-0.00', '0.00'))
    .sort();
  expect(shown).toEqual(wanted);
}

async function evaluateSignPublish(page: Page, slug: string): Promise<void> {
  await takeStep(page, slug, 'Close the round', 'Close it');
  await takeStep(page, slug, 'Evaluate', 'Evaluate it');
  await signVersion(await newPage({ as: reviewer }), slug, 1);
  await takeStep(page, slug, 'Publish', 'Publish them');
  await expectText(page, 'published');
}

test(
  'atrazine: 34 laboratories upload, and the published page shows the figures of the reference',
  async () => {
    const values = loadColumn('iso13528_atrazine.csv', 'value');
    expect(values).toHaveLength(34);
    const page = await newPage({ as: coordinator });
    const measurand = { code: 'ATR', name: 'Atrazine', unit: 'ug/L', decimals: 4, sigmaRule: SIGMA };
    await createScheme(page, 'Atrazine in water', measurand);
    const slug = await planRound(page, { scheme: 'Atrazine in water', name: 'Atrazine example', item: 'W1' });
    await takeStep(page, slug, 'Open the round', 'Open it');
    const laboratories = [];
    for (const index of values.keys()) {
      laboratories.push(await makeLaboratory(connection, `Atrazine laboratory ${index + 1}`));
    }
    await enrolAtOnce(page, slug, 'Atrazine laboratory', values.length);
    for (const [index, laboratory] of laboratories.entries()) {
      const client = createClient({ token: laboratory.token });
      const file = `item,measurand,result,unit\r\nW1,ATR,${values[index]},ug/L\r\n`;
      const response = await client.upload(`/api/rounds/${slug}/results`, file);
      expect(response.status, await response.text()).toBe(201);
    }
    await evaluateSignPublish(page, slug);

    const expected: Expected = {
      algorithmA: { location: reference('atrazine-algA-x'), scale: reference('atrazine-algA-s') },
      median: reference('atrazine-median'),
      madE: reference('atrazine-MADe'),
      nIqr: reference('atrazine-nIQR-type7'),
      decimals: 6,
    };
    await page.goto(`/rounds/${slug}/evaluation`);
    await expectEstimates(page, expected);
    await expectText(page, `${reference('atrazine-algA-u').toFixed(6)} \u00b5g/L`);
    await expectScores(page, values, expected);

    const analyst = await makePerson(connection, 'analyst', laboratories[0]?.id ?? 0);
    const own = await newPage({ as: analyst });
    await own.goto(`/laboratory/rounds/${slug}`);
    const z = (values[0] ?? 0) - expected.algorithmA.location;
    await expectText(own, (z / expected.algorithmA.scale).toFixed(2).replace('-', '\u2212'));
  },
  TIMEOUT,
);

test(
  'copper: a past round with ties and one result nine times too high, loaded as a whole',
  async () => {
    const values = loadColumn('amc_copper_chem.csv', 'value');
    expect(values).toHaveLength(24);
    const page = await newPage({ as: coordinator });
    const measurand = { code: 'CU', name: 'Copper', unit: 'mg/kg', decimals: 2, sigmaRule: SIGMA };
    await createScheme(page, 'Copper in flour', measurand);
    const plan = { scheme: 'Copper in flour', name: 'Copper example', item: 'F1', isPast: true };
    const slug = await planRound(page, plan);
    await takeStep(page, slug, 'Open the round', 'Open it');
    const rows = values.map((value, index) => `Flour laboratory ${index + 1},F1,CU,${value}`);
    const file = ['laboratory,item,measurand,result', ...rows].join('\n');
    await page.goto(`/rounds/${slug}/participants`);
    await page.locator('input[type=file]').setInputFiles({
      name: 'copper.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(file),
    });
    await page.getByRole('button', { name: 'Load the whole round' }).click();
    await page.waitForURL(`**/rounds/${slug}/results`);
    await evaluateSignPublish(page, slug);

    const expected: Expected = {
      algorithmA: { location: reference('chem-algA-x'), scale: reference('chem-algA-s') },
      median: reference('chem-median'),
      madE: reference('chem-MADe'),
      nIqr: null,
      decimals: 4,
    };
    await page.goto(`/rounds/${slug}/evaluation`);
    await expectEstimates(page, expected);
    await expectText(page, `${((1.25 * expected.algorithmA.scale) / Math.sqrt(24)).toFixed(4)} mg/kg`);
    await expectScores(page, values, expected);
  },
  TIMEOUT,
);
