import fs from 'node:fs';
import path from 'node:path';
import { ROOT } from './project.mjs';
import { Stop } from './report.mjs';
import { runOrStop } from './run.mjs';

const KNEX = path.join(ROOT, 'node_modules/knex/bin/cli.js');
const MIGRATE = ['--import', 'tsx', KNEX, 'migrate:latest', '--knexfile', 'knexfile.ts'];
const SEEDS = 'seeds/run.ts';
const SEED = ['--import', 'tsx', '--conditions=react-server', SEEDS];

/** Makes the data folder when it is missing, for its owner alone. */
export function makeDataFolder(folder) {
  if (fs.existsSync(folder)) return false;
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  return true;
}

/** Brings the database up to date and says so in a few words. */
export async function migrate(dataDir) {
  const { output } = await runOrStop(process.execPath, MIGRATE, {
    env: { ASSIZE_DATA_DIR: dataDir, NODE_ENV: 'production' },
    message: 'The database could not be brought up to date; nothing was changed beyond the last whole step.',
  });
  const count = /run: (\d+) migration/.exec(output)?.[1];
  return count ? `brought up to date, ${count} ${count === '1' ? 'step' : 'steps'}` : 'up to date';
}

export function hasSeeds() {
  return fs.existsSync(path.join(ROOT, SEEDS));
}

/**
 * Seeds the demonstration into a database without users.
 * @returns {Promise<import('./database.mjs').Demo>} its sign-ins and tokens, also when it was there already
 */
export async function seed(dataDir) {
  const { stdout, output } = await runOrStop(process.execPath, SEED, {
    env: { ASSIZE_DATA_DIR: dataDir, NODE_ENV: 'production' },
    message: 'The demonstration could not be seeded.',
  });
  const line = stdout.trim().split('\n').at(-1) ?? '';
  try {
    const { signIns = [], tokens = [], openRound = null, seeded = false } = JSON.parse(line);
    return { signIns, tokens, openRound, seeded };
  } catch {
    throw new Stop(`${SEEDS} ended without the line of JSON that tells the sign-ins.`, { output });
  }
}
