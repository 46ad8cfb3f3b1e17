import fs from 'node:fs';
import path from 'node:path';
import { readJson, SCRATCH, writeJson } from './project.mjs';
import { Stop } from './report.mjs';

const FOLDER = path.join(SCRATCH, 'serving');

/** Notes that a server runs from this folder, since a new build would take its files away. */
export function noteServing(server) {
  writeJson(noteOf(server.pid), server);
}

export function forgetServing(pid) {
  fs.rmSync(noteOf(pid), { force: true });
}

/** The servers that run from this folder now: pid, address and data folder of each. */
export function listServing() {
  if (!fs.existsSync(FOLDER)) return [];
  const noted = fs.readdirSync(FOLDER).map((name) => readJson(path.join(FOLDER, name)));
  return noted.filter((server) => {
    if (server === null) return false;
    if (isNextServer(server.pid)) return true;
    forgetServing(server.pid);
    return false;
  });
}

export function refuseWhileServing(doing) {
  const [server] = listServing();
  if (!server) return;
  throw new Stop(
    `Assize is running from this folder at ${server.address} (process ${server.pid}). Stop it first: this step ${doing}, which would take files away from it.`,
  );
}

function noteOf(pid) {
  return path.join(FOLDER, `${pid}.json`);
}

/** After a restart of the machine another program may have the number, so its name is asked for where that is possible. */
function isNextServer(pid) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    if (error.code !== 'EPERM') return false;
  }
  const commandLine = `/proc/${pid}/cmdline`;
  return (
    !fs.existsSync('/proc/self/cmdline') ||
    (fs.existsSync(commandLine) && /next/.test(fs.readFileSync(commandLine, 'utf8')))
  );
}
