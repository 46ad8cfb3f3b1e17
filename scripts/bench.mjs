import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { buildWhenStale } from './lib/build.mjs';
import { hasSeeds, migrate, seed } from './lib/database.mjs';
import { installPackages } from './lib/install.mjs';
import { requireNode, ROOT, SCRATCH } from './lib/project.mjs';
import { main, say, sayStep, step, Stop, talkOn } from './lib/report.mjs';
import { runOrStop } from './lib/run.mjs';
import { startServer } from './lib/server.mjs';

const SIGN_INS = 20;
const OWN_SETTINGS = { ASSIZE_PUBLIC_URL: undefined, NEXTAUTH_URL: undefined, ASSIZE_LOG_LEVEL: 'warn' };

/** Measures the application beside a bare Next.js app on the same machine in the same run. */
async function bench() {
  requireNode();
  const isJson = process.argv.includes('--json');
  if (isJson) talkOn(process.stderr);
  await installPackages();
  if (wantsOnlyStats()) return benchStatsAlone(isJson);
  if (!hasSeeds()) throw new Stop('There is no seeds/run.ts; the measurements need the demonstration.');
  // Loaded only now, since it needs the packages.
  const bareApp = await import('./bench/bare-app.mjs');
  await buildWhenStale();
  await bareApp.buildBareApp();
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'assize-bench-'));
  const servers = [];
  try {
    const figures = await measureAll(folder, servers, bareApp);
    process.stdout.write(
      `${isJson ? JSON.stringify(figures, null, 2) : (await import('./bench/table.mjs')).describe(figures)}\n`,
    );
    return sayFailures(figures);
  } finally {
    for (const server of servers) await server.stop();
    fs.rmSync(folder, { recursive: true, force: true });
  }
}

/** `--only stats` measures the statistics alone, which needs no build. */
function wantsOnlyStats() {
  const at = process.argv.findIndex((argument) => argument === '--only' || argument.startsWith('--only='));
  if (at < 0) return false;
  const what = process.argv[at].split('=')[1] ?? process.argv[at + 1];
  if (what === 'stats') return true;
  throw new Stop(`--only knows stats, found ${what ?? 'nothing'}.`);
}

async function benchStatsAlone(isJson) {
  const stats = await measureStats();
  const { describeStats } = await import('./bench/stats-table.mjs');
  const text = isJson
    ? JSON.stringify({ machine: await describeMachine(), stats }, null, 2)
    : describeStats(stats);
  process.stdout.write(`${text}\n`);
  return sayFailures({ rows: [], firstLoad: [], signInToPage: {}, evaluation: {}, stats });
}

async function measureAll(folder, servers, { startBareApp }) {
  const dataDir = path.join(folder, 'app');
  const bareDir = path.join(folder, 'bare');
  for (const made of [dataDir, bareDir]) fs.mkdirSync(made, { mode: 0o700 });
  await step('Database', () => migrate(dataDir));
  let demo;
  await step('Demonstration', async () => {
    demo = await seed(dataDir);
    return 'seeded';
  });
  const app = await startServer({
    dataDir,
    env: OWN_SETTINGS,
    logFile: path.join(SCRATCH, 'logs/bench-app.log'),
  });
  servers.push(app);
  const bare = await startBareApp(bareDir, path.join(SCRATCH, 'logs/bench-bare.log'));
  servers.push(bare);

  const { readCast, findRounds, listRows } = await import('./bench/rows.mjs');
  const cast = await readCast(app.baseUrl, demo);
  const rounds = await findRounds(app.baseUrl, cast);
  const plan = await listRows(app.baseUrl, bare.baseUrl, cast, rounds);
  return {
    machine: await describeMachine(),
    rows: await measureRows(plan),
    signInToPage: await measureSignIn(app.baseUrl, cast.coordinator),
    firstLoad: await measureFirstLoad(app.baseUrl, bare.baseUrl, plan),
    evaluation: await attempt(measureEvaluation),
    stats: await measureStats(),
  };
}

async function describeMachine() {
  const { CONNECTIONS } = await import('./bench/load.mjs');
  return { node: `Node ${process.versions.node}`, cpus: os.cpus().length, connections: CONNECTIONS };
}

/** The bare rows are measured before and after the others, and their mean is what the others are compared with. */
async function measureRows(plan) {
  const { measureLoad } = await import('./bench/load.mjs');
  const bare = plan.filter((row) => row.beside === null);
  const again = bare.map((row) => ({ ...row, name: `${row.name}, again` }));
  const rows = [];
  for (const row of [...plan, ...again]) {
    sayStep('Measuring', row.name);
    rows.push({ name: row.name, beside: row.beside, ...(await attempt(() => measureLoad(row))) });
  }
  const mean = (name) => {
    const rates = rows.filter((row) => row.name.startsWith(name) && !row.error).map((row) => row.perSecond);
    return rates.length > 0 ? rates.reduce((sum, rate) => sum + rate, 0) / rates.length : null;
  };
  const base = { page: mean('bare page'), row: mean('bare row') };
  return rows.map(({ beside, ...row }) => {
    const compared = beside && base[beside];
    return { ...row, share: compared && !row.error ? row.perSecond / compared : null };
  });
}

async function measureSignIn(baseUrl, person) {
  sayStep('Measuring', 'sign-in to page');
  const { timeSignIns } = await import('./bench/session.mjs');
  const { percentiles } = await import('./bench/load.mjs');
  return attempt(async () => ({
    ...percentiles(await timeSignIns(baseUrl, person, '/rounds', SIGN_INS)),
    count: SIGN_INS,
  }));
}

async function measureFirstLoad(app, bare, plan) {
  sayStep('Measuring', 'first-load scripts');
  const { firstLoadKilobytes } = await import('./bench/first-load.mjs');
  const base = await firstLoadKilobytes(bare, '/');
  const rows = [{ name: 'bare page', kilobytes: base, above: 0 }];
  for (const { name, path: page, headers } of plan.filter((row) => row.isPage)) {
    const measured = await attempt(async () => {
      const kilobytes = await firstLoadKilobytes(app, page, headers.cookie);
      return { kilobytes, above: kilobytes - base };
    });
    rows.push({ name, ...measured });
  }
  return rows;
}

async function measureEvaluation() {
  sayStep('Measuring', 'an evaluation of 30 laboratories');
  const { stdout } = await runOrStop(process.execPath, ['--import', 'tsx', 'scripts/bench/evaluation.ts'], {
    message: 'The evaluation could not be timed.',
    cwd: ROOT,
  });
  return JSON.parse(stdout);
}

/** The functions of lib/stats beside their peers, and the evaluation of a large round. */
async function measureStats() {
  const ask = async (script, message, ...conditions) => {
    const args = ['--import', 'tsx', ...conditions, script];
    const { stdout } = await runOrStop(process.execPath, args, { message, cwd: ROOT });
    return JSON.parse(stdout.slice(stdout.lastIndexOf('\n{') + 1));
  };
  sayStep('Measuring', 'the statistics beside R and scipy, about two minutes');
  const functions = await attempt(() => ask('scripts/bench/stats.ts', 'The statistics could not be timed.'));
  sayStep('Measuring', 'the evaluation of a large round');
  const round = await attempt(() =>
    ask('scripts/bench/stats-round.ts', 'The large round could not be timed.', '--conditions=react-server'),
  );
  return { functions, round };
}

/** A measurement that fails says so in its row and lets the others go on. */
async function attempt(work) {
  try {
    return await work();
  } catch (error) {
    return { error: error.message };
  }
}

function sayFailures({ rows, signInToPage, firstLoad, evaluation, stats }) {
  const all = [...rows, ...firstLoad, signInToPage, evaluation, stats.functions, stats.round];
  const failed = all.filter((row) => row.error).length;
  if (failed > 0) say(`\n${failed} ${failed === 1 ? 'measurement' : 'measurements'} failed.`);
  return failed > 0 ? 1 : 0;
}

await main(bench);
