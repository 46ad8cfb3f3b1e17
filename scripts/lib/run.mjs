import { spawn } from 'node:child_process';
import { ROOT } from './project.mjs';
import { Stop } from './report.mjs';

const SIGNALS = { SIGINT: 130, SIGTERM: 143 };
const running = new Set();
let passesSignalsOn = false;

/** Keeps track of a child, so that a signal to the script reaches it and the script ends after it. */
export function track(child) {
  passSignalsOn();
  running.add(child);
  child.once('close', () => running.delete(child));
  return child;
}

function passSignalsOn() {
  if (passesSignalsOn) return;
  passesSignalsOn = true;
  for (const [signal, code] of Object.entries(SIGNALS)) {
    process.on(signal, () => {
      process.exitCode = code;
      if (running.size === 0) process.exit(code);
      for (const child of running) {
        child.kill(signal);
        child.once('close', (childCode) => running.size === 0 && process.exit(childCode ?? code));
      }
    });
  }
}

/** Runs a program to its end and keeps what it prints; with `isShown` it prints as it goes. */
export function run(command, args, { env = {}, cwd = ROOT, isShown = false } = {}) {
  return new Promise((resolve, reject) => {
    const child = track(
      spawn(command, args, {
        cwd,
        env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1', ...colours(isShown), ...env },
        stdio: ['ignore', 'pipe', 'pipe'],
      }),
    );
    let stdout = '';
    let output = '';
    child.stdout.on('data', (chunk) => {
      stdout += chunk;
      output += chunk;
      if (isShown) process.stdout.write(chunk);
    });
    child.stderr.on('data', (chunk) => {
      output += chunk;
      if (isShown) process.stderr.write(chunk);
    });
    child.once('error', reject);
    child.once('close', (code, signal) => resolve({ code: code ?? 1, signal, stdout, output }));
  });
}

/** Output passes through a pipe, where a program cannot see whether a person watches; what is read by us is plain. */
function colours(isShown) {
  const areWanted = isShown && process.stdout.isTTY && !process.env.NO_COLOR;
  return areWanted ? { FORCE_COLOR: '1' } : { NO_COLOR: '1', FORCE_COLOR: undefined };
}

/** As run, and stops with `message` when the program fails. */
export async function runOrStop(command, args, { message, ...options }) {
  const result = await run(command, args, options);
  if (result.code !== 0) throw new Stop(message, { output: result.output });
  return result;
}

export function runNode(args, options) {
  return run(process.execPath, args, options);
}
