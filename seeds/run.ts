import fs from 'node:fs';
import path from 'node:path';
import knex from 'knex';
import { knexConfig } from '@/db/config';
import { dataDirectory } from '@/lib/env';
import { FEWEST_LABORATORIES, MOST_LABORATORIES } from './scenario/laboratories';
import { seedDemonstration } from './seed-demonstration';
import type { DemoSummary } from './summary';

const SUMMARY_FILE = 'demo.json';
const OWNER_ONLY = 0o600;

function laboratoryCount(): number {
  const text = process.env.ASSIZE_DEMO_LABORATORIES;
  if (!text) return FEWEST_LABORATORIES;
  const count = Number(text);
  if (Number.isInteger(count) && count >= FEWEST_LABORATORIES && count <= MOST_LABORATORIES) return count;
  throw new Error(
    `ASSIZE_DEMO_LABORATORIES is "${text}"; give a whole number from ${FEWEST_LABORATORIES} to ${MOST_LABORATORIES}.`,
  );
}

/** What was kept at the first seeding, with `seeded` as of now; keeps it when the file is missing. */
function keepSummary(summary: DemoSummary): DemoSummary {
  const file = path.join(dataDirectory(), SUMMARY_FILE);
  if (summary.openRound === null) return summary;
  if (!summary.seeded && fs.existsSync(file)) {
    return { ...(JSON.parse(fs.readFileSync(file, 'utf8')) as DemoSummary), seeded: false };
  }
  const draft = `${file}.new`;
  fs.rmSync(draft, { force: true });
  fs.writeFileSync(draft, `${JSON.stringify(summary, null, 2)}\n`, { mode: OWNER_ONLY });
  fs.renameSync(draft, file);
  return summary;
}

const connection = knex(knexConfig());
try {
  const options = { now: new Date(), laboratoryCount: laboratoryCount() };
  if (!(await connection.schema.hasTable('users'))) {
    throw new Error('The database has no tables yet. Run npm run migrate first.');
  }
  console.log(JSON.stringify(keepSummary(await seedDemonstration(connection, options))));
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  await connection.destroy();
}
