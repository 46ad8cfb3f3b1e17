import fs from 'node:fs';
import path from 'node:path';
import { buildWhenStale, isBuildStale } from './lib/build.mjs';
import { hasSeeds, makeDataFolder, migrate, seed } from './lib/database.mjs';
import { sayDemo } from './lib/demo.mjs';
import { installPackages } from './lib/install.mjs';
import { dataFolder, isDemoWanted, requireNode } from './lib/project.mjs';
import { main, say, sayStep, step, Stop } from './lib/report.mjs';
import { addressOf, answers, LOCAL_HOST, startServer, tryPort } from './lib/server.mjs';
import { listServing } from './lib/serving.mjs';

const DEFAULT_PORT = 3000;
const HIGHEST_PORT = 65_535;
const NO_DEMO = { signIns: [], tokens: [], openRound: null, seeded: false };
const OWN_MACHINE = [LOCAL_HOST, 'localhost', '::1'];

/** Installs, migrates, seeds, builds and serves, doing of each only what is still to be done. */
async function up() {
  requireNode();
  process.env.NEXT_TELEMETRY_DISABLED = '1';
  const host = process.env.HOST || LOCAL_HOST;
  const port = readPort();
  const dataDir = dataFolder();

  const running = listServing().find((server) => server.dataDir === dataDir);
  if (running) return sayRunning(running, addressOf(host, port));

  await requirePort(host, port);
  await installPackages();
  await step('Data folder', async () => (makeDataFolder(dataDir) ? `made ${dataDir}` : dataDir));
  await step('Database', () => migrate(dataDir));
  const demo = await seedDemo(dataDir);
  await buildWhenStale();
  await requirePort(host, port);
  const server = await startServer({ dataDir, host, port });
  await sayReady(server.baseUrl, demo);
  sayCautions(host, dataDir);
  say('\nStop with Ctrl+C.');
  return server.exited;
}

function readPort() {
  const text = process.env.PORT || String(DEFAULT_PORT);
  const port = Number(text);
  if (/^\d+$/.test(text) && port >= 1 && port <= HIGHEST_PORT) return port;
  throw new Stop(
    `PORT is "${text}". Give a whole number from 1 to ${HIGHEST_PORT}, such as PORT=3100 npm run up.`,
  );
}

async function requirePort(host, port) {
  const problem = await tryPort(host, port);
  if (problem === null) return;
  if (problem === 'EADDRINUSE') {
    throw new Stop(
      `Port ${port} on ${host} is taken by another program. Choose another one: PORT=${port + 1 > HIGHEST_PORT ? DEFAULT_PORT : port + 1} npm run up`,
    );
  }
  if (problem === 'EACCES') {
    throw new Stop(`Port ${port} is reserved for the system's administrator. Set PORT to 1024 or more.`);
  }
  throw new Stop(
    `HOST is "${host}", where this machine cannot listen (${problem}). The usual value is ${LOCAL_HOST}.`,
  );
}

async function sayRunning(running, wanted) {
  const isReady = await answers(`${running.address}/api/health`);
  say(
    `Assize already ${isReady ? 'runs' : 'starts'} at ${running.address} on this data folder (process ${running.pid}).`,
  );
  if (isBuildStale())
    say('Its sources have changed since. Stop it and run this command again to see the change.');
  if (running.address === wanted) return 0;
  say(`To serve ${wanted} instead, stop it first; for a second one beside it, set ASSIZE_DATA_DIR as well.`);
  return 1;
}

async function seedDemo(dataDir) {
  if (!isDemoWanted() || !hasSeeds()) {
    sayStep('Demonstration', 'left out');
    return NO_DEMO;
  }
  let demo = NO_DEMO;
  await step('Demonstration', async (announce) => {
    announce('looking whether the database is empty');
    demo = await seed(dataDir);
    if (demo.seeded) return 'seeded, all of it invented';
    return demo.signIns.length > 0 ? 'there already' : 'not seeded, the database has its own people';
  });
  return demo;
}

async function sayReady(address, demo) {
  sayStep('Ready', address);
  await sayDemo(demo, address);
  if (!isDemoWanted()) {
    say(`\nOn a new installation ${address} leads the first administrator through set-up.`);
  }
}

function sayCautions(host, dataDir) {
  if (OWN_MACHINE.includes(host)) return;
  say(`\nCaution: ${host} can be reached from other machines. Put it behind a proxy that speaks https.`);
  if (fs.existsSync(path.join(dataDir, 'demo.json'))) {
    say(
      'Caution: this data folder holds the demonstration, whose passwords are public. Use ASSIZE_DEMO=0 and a new folder.',
    );
  }
}

await main(up);
