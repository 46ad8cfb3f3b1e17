import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { Stop } from './report.mjs';

export const ROOT = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
/** What the scripts leave behind: logs, locks, notes of running servers. Safe to delete when nothing runs. */
export const SCRATCH = path.join(ROOT, '.tmp');
export const NEXT_BIN = path.join(ROOT, 'node_modules/next/dist/bin/next');

const OLDEST_NODE = [20, 9];

export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const [wantedMajor, wantedMinor] = OLDEST_NODE;
  if (major > wantedMajor || (major === wantedMajor && minor >= wantedMinor)) return;
  throw new Stop(
    `This is Node ${process.versions.node}. Assize needs Node ${OLDEST_NODE.join('.')} or newer; see https://nodejs.org.`,
  );
}

/** The data folder, resolved against the project's folder as the application does. */
export function dataFolder() {
  return path.resolve(ROOT, process.env.ASSIZE_DATA_DIR || './data');
}

export function isDemoWanted() {
  return process.env.ASSIZE_DEMO !== '0';
}

export function readJson(file) {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    // A note that is missing or half written is as good as none.
    return null;
  }
}

export function writeJson(file, value) {
  fs.mkdirSync(path.dirname(file), { recursive: true });
  fs.writeFileSync(file, `${JSON.stringify(value, null, 2)}\n`);
}
