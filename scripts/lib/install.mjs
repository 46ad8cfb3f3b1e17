import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { readJson, ROOT, writeJson } from './project.mjs';
import { seconds, step, Stop } from './report.mjs';
import { run, runNode } from './run.mjs';
import { refuseWhileServing } from './serving.mjs';

const LOCK = path.join(ROOT, 'package-lock.json');
const MODULES = path.join(ROOT, 'node_modules');
const STAMP = path.join(MODULES, '.assize-installed.json');
const COMPILER_HINT =
  'better-sqlite3 is compiled while it is installed, which needs python3, make and a C++ compiler. On Debian: apt-get update && apt-get install -y python3 make g++';

/** Installs what package-lock.json names, unless exactly that is installed already for this Node. */
export async function installPackages() {
  await step('Packages', async (announce) => {
    const wanted = stampOfLock();
    if (isInstalled(wanted)) return 'up to date';
    refuseWhileServing('installs packages');
    announce('installing, which takes a few minutes the first time');
    const since = Date.now();
    const { code, output } = await npm(['ci', '--include=dev', '--no-audit', '--no-fund']);
    if (code !== 0) throw new Stop(`npm ci failed. ${COMPILER_HINT}`, { output });
    await requireDatabaseDriver();
    writeJson(STAMP, wanted);
    return `done in ${seconds(since)}`;
  });
}

function stampOfLock() {
  const lock = createHash('sha256').update(fs.readFileSync(LOCK)).digest('hex');
  return { lock, machine: `${process.platform}-${process.arch}`, modulesVersion: process.versions.modules };
}

function isInstalled(wanted) {
  const stamp = readJson(STAMP);
  if (stamp) return Object.entries(wanted).every(([key, value]) => stamp[key] === value);
  // Installed by hand: npm's own note in node_modules tells what is there.
  if (!matchesLock()) return false;
  writeJson(STAMP, wanted);
  return true;
}

function matchesLock() {
  const wanted = readJson(LOCK)?.packages ?? {};
  const found = readJson(path.join(MODULES, '.package-lock.json'))?.packages;
  if (!found) return false;
  const names = Object.keys(wanted).filter((name) => name !== '');
  return (
    names.every((name) => found[name]?.version === wanted[name].version || isLeftOut(found, wanted, name)) &&
    Object.keys(found).every((name) => name in wanted)
  );
}

/** npm leaves out optional packages that are for other machines. */
function isLeftOut(found, wanted, name) {
  return !(name in found) && Boolean(wanted[name].optional);
}

function npm(args) {
  const script = process.env.npm_execpath;
  return script?.endsWith('.js') ? runNode([script, ...args]) : run('npm', args);
}

/** Install scripts may be switched off in a person's npm settings; then the driver is there but was never compiled. */
async function requireDatabaseDriver() {
  const load = ['-e', "new (require('better-sqlite3'))(':memory:').close()"];
  if ((await runNode(load)).code === 0) return;
  await npm(['rebuild', '--ignore-scripts=false', 'better-sqlite3']);
  const { code, output } = await runNode(load);
  if (code !== 0) throw new Stop(`The database driver does not load. ${COMPILER_HINT}`, { output });
}
