import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { NEXT_BIN, readJson, ROOT, SCRATCH, writeJson } from './project.mjs';
import { seconds, step } from './report.mjs';
import { runOrStop } from './run.mjs';
import { refuseWhileServing } from './serving.mjs';

const SOURCES = [
  'app',
  'components',
  'lib',
  'db',
  'public',
  'proxy.ts',
  'instrumentation.ts',
  'next.config.mjs',
  'postcss.config.mjs',
  'tailwind.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];
const BUILD_ID = path.join(ROOT, '.next/BUILD_ID');
const STAMP = path.join(ROOT, '.next/assize-build.json');
const LOCK = path.join(SCRATCH, 'build.lock');
const LOCK_POLL_MS = 500;

/** Builds the application, unless the build that is there was made from exactly these sources by this Node. */
export async function buildWhenStale() {
  await step('Build', async (announce) => {
    if (!isBuildStale()) return 'up to date';
    const release = await takeLock(announce);
    try {
      if (!isBuildStale()) return 'up to date';
      refuseWhileServing('builds the application');
      announce('building, about a minute');
      const since = Date.now();
      await build();
      return `done in ${seconds(since)}`;
    } finally {
      release();
    }
  });
}

export function isBuildStale() {
  const stamp = readJson(STAMP);
  return stamp === null || stamp.buildId !== readBuildId() || stamp.sources !== hashOfSources();
}

function readBuildId() {
  return fs.existsSync(BUILD_ID) ? fs.readFileSync(BUILD_ID, 'utf8').trim() : null;
}

async function build() {
  const sources = hashOfSources();
  const dataDir = path.join(SCRATCH, 'build-data');
  fs.rmSync(STAMP, { force: true });
  try {
    // A build evaluates modules; it has no business with anyone's data.
    await runOrStop(process.execPath, [NEXT_BIN, 'build'], {
      env: { NODE_ENV: 'production', ASSIZE_DATA_DIR: dataDir },
      message: 'The build failed; what the compiler said stands above.',
    });
  } finally {
    fs.rmSync(dataDir, { recursive: true, force: true });
  }
  writeJson(STAMP, { sources, buildId: readBuildId() });
}

/** Changes with every source file, setting and package, and with the version of Node. */
export function hashOfSources() {
  const hash = createHash('sha256').update(process.version);
  for (const file of SOURCES.flatMap((name) => listFiles(path.join(ROOT, name)))) {
    hash.update(`\n${path.relative(ROOT, file)}\n`).update(fs.readFileSync(file));
  }
  return hash.digest('hex');
}

export function listFiles(place) {
  if (!fs.existsSync(place)) return [];
  if (fs.statSync(place).isFile()) return [place];
  const entries = fs.readdirSync(place).filter((name) => !name.startsWith('.'));
  return entries.sort().flatMap((name) => listFiles(path.join(place, name)));
}

/** One build at a time in a folder; a lock whose owner is gone counts for nothing. */
async function takeLock(announce) {
  fs.mkdirSync(SCRATCH, { recursive: true });
  let hasWaited = false;
  for (;;) {
    try {
      fs.writeFileSync(LOCK, String(process.pid), { flag: 'wx' });
      return () => fs.rmSync(LOCK, { force: true });
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    if (!isAlive(Number(fs.readFileSync(LOCK, 'utf8')))) {
      fs.rmSync(LOCK, { force: true });
      continue;
    }
    if (!hasWaited) announce('waiting for another build in this folder');
    hasWaited = true;
    await sleep(LOCK_POLL_MS);
  }
}

function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return pid > 0;
  } catch {
    return false;
  }
}
