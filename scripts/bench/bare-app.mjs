import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { listFiles } from '../lib/build.mjs';
import { NEXT_BIN, readJson, ROOT, SCRATCH, writeJson } from '../lib/project.mjs';
import { seconds, step } from '../lib/report.mjs';
import { runOrStop } from '../lib/run.mjs';
import { startServer } from '../lib/server.mjs';

const SOURCE = path.join(ROOT, 'scripts/bench/bare-app');
const BUILT = path.join(SCRATCH, 'bare-app');
const STAMP = path.join(BUILT, '.next/assize-build.json');
export const BARE_PAGE = '/';
export const BARE_ROW = '/api/row';

/** Builds, when that is still to be done, the app that does as little as a Next.js app can: a page and a row. */
export async function buildBareApp() {
  await step('Bare app', async (announce) => {
    const sources = hashOfSource();
    if (readJson(STAMP)?.sources === sources) return 'up to date';
    announce('building');
    const since = Date.now();
    fs.rmSync(BUILT, { recursive: true, force: true });
    fs.cpSync(SOURCE, BUILT, { recursive: true });
    await runOrStop(process.execPath, [NEXT_BIN, 'build'], {
      cwd: BUILT,
      env: { NODE_ENV: 'production' },
      message: 'The bare app could not be built.',
    });
    writeJson(STAMP, { sources });
    return `done in ${seconds(since)}`;
  });
}

export function startBareApp(dataDir, logFile) {
  return startServer({ dataDir, logFile, dir: BUILT, health: BARE_ROW });
}

function hashOfSource() {
  const hash = createHash('sha256').update(process.version);
  for (const file of [...listFiles(SOURCE), path.join(ROOT, 'package-lock.json')]) {
    hash.update(`\n${path.relative(ROOT, file)}\n`).update(fs.readFileSync(file));
  }
  return hash.digest('hex');
}
