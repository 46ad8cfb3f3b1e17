import { spawn } from 'node:child_process';
import fs from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { NEXT_BIN, ROOT } from './project.mjs';
import { Stop } from './report.mjs';
import { track } from './run.mjs';
import { forgetServing, noteServing } from './serving.mjs';

export const LOCAL_HOST = '127.0.0.1';
const EVERY_ADDRESS = { '0.0.0.0': LOCAL_HOST, '::': '[::1]' };
const READY_WITHIN_MS = 60_000;
const STOP_WITHIN_MS = 5_000;
const POLL_MS = 100;

/** Where a program on this machine reaches a server that listens on `host`. */
export function addressOf(host, port) {
  const name = EVERY_ADDRESS[host] ?? (host.includes(':') ? `[${host}]` : host);
  return `http://${name}:${port}`;
}

/** Null when the port can be listened on, else the system's code, such as EADDRINUSE. */
export function tryPort(host, port) {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', (error) => resolve(error.code));
    probe.listen({ host, port, exclusive: true }, () => probe.close(() => resolve(null)));
  });
}

export function freePort() {
  return new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.once('error', reject);
    probe.listen(0, LOCAL_HOST, () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

/**
 * Starts the built application and waits until it answers. Its output goes to `logFile`, or to this process's own.
 * `env` adds to the environment; a value of undefined takes a variable away.
 */
export async function startServer({
  dataDir,
  host = LOCAL_HOST,
  port,
  env = {},
  logFile,
  dir = ROOT,
  health,
}) {
  const chosen = port ?? (await freePort());
  const baseUrl = addressOf(host, chosen);
  const output = logFile ? openLog(logFile) : 'inherit';
  const child = track(
    spawn(process.execPath, [NEXT_BIN, 'start', '-H', host, '-p', String(chosen)], {
      cwd: dir,
      env: {
        ...process.env,
        NODE_ENV: 'production',
        NEXT_TELEMETRY_DISABLED: '1',
        HOST: host,
        PORT: String(chosen),
        ASSIZE_DATA_DIR: dataDir,
        ...env,
      },
      stdio: ['ignore', output, output],
    }),
  );
  const { pid } = child;
  const exited = new Promise((resolve) => {
    child.once('error', () => resolve(1));
    child.once('close', (code) => resolve(code ?? 1));
  });
  if (logFile) fs.closeSync(output);
  if (dir === ROOT) noteServing({ pid, address: baseUrl, dataDir });
  const endWithParent = () => {
    child.kill('SIGKILL');
    forgetServing(pid);
  };
  process.once('exit', endWithParent);
  void exited.then(() => {
    process.off('exit', endWithParent);
    forgetServing(pid);
  });
  const server = { pid, baseUrl, logFile, exited, ...endings(child, exited) };
  await waitUntilReady(server, health ?? '/api/health');
  return server;
}

function openLog(logFile) {
  fs.mkdirSync(path.dirname(logFile), { recursive: true });
  return fs.openSync(logFile, 'w');
}

function endings(child, exited) {
  const kill = () => {
    child.kill('SIGKILL');
    return exited;
  };
  const stop = async () => {
    child.kill('SIGTERM');
    const timer = setTimeout(() => child.kill('SIGKILL'), STOP_WITHIN_MS);
    const code = await exited;
    clearTimeout(timer);
    return code;
  };
  return { kill, stop };
}

async function waitUntilReady({ baseUrl, exited, stop, logFile }, health) {
  let hasExited = false;
  void exited.then(() => (hasExited = true));
  const deadline = Date.now() + READY_WITHIN_MS;
  while (Date.now() < deadline && !hasExited) {
    if (await answers(baseUrl + health)) return;
    await sleep(POLL_MS);
  }
  await stop();
  const output = logFile ? fs.readFileSync(logFile, 'utf8') : '';
  const why = hasExited
    ? 'The server ended before it was ready'
    : `${baseUrl}${health} did not answer in a minute`;
  throw new Stop(`${why}; its own words stand above.`, { output });
}

export async function answers(url) {
  try {
    const response = await fetch(url, { signal: AbortSignal.timeout(STOP_WITHIN_MS) });
    await response.arrayBuffer();
    return response.ok;
  } catch {
    // Refused or slow: not ready yet.
    return false;
  }
}
