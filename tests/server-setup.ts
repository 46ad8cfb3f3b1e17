import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { inject } from 'vitest';
import type { TestProject } from 'vitest/node';
import { buildWhenStale } from '../scripts/lib/build.mjs';
import { hasSeeds, migrate, seed, type Demo } from '../scripts/lib/database.mjs';
import { startServer, type Server } from '../scripts/lib/server.mjs';

declare module 'vitest' {
  interface ProvidedContext {
    /** The address of the server that all tests share. */
    baseUrl: string;
    dataDir: string;
    /** What the shared server has printed. */
    logFile: string;
    /** The demonstration's sign-ins and tokens; empty lists when there is none. */
    demo: Demo;
    /** Prepared data folders to copy: migrated and empty, and with the demonstration. */
    templates: { empty: string; demo: string };
  }
}

const LOGS = path.resolve('.tmp/logs');
/** A person's own settings must not reach the servers under test. */
const OWN_SETTINGS = {
  ASSIZE_PUBLIC_URL: undefined,
  ASSIZE_DEMO: undefined,
  NEXTAUTH_URL: undefined,
  NEXTAUTH_SECRET: undefined,
};
const NO_DEMO: Demo = { signIns: [], tokens: [], openRound: null, seeded: false };

/** Builds when stale, prepares the data and runs one server for all files of the project. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  await buildWhenStale();
  const root = makeTemporaryFolder();
  const empty = path.join(root, 'empty');
  const seeded = path.join(root, 'demo');
  const dataDir = path.join(root, 'shared');
  const logFile = path.join(LOGS, 'server-tests.log');
  let server: Server | undefined;
  const tearDown = async () => {
    await server?.stop();
    fs.rmSync(root, { recursive: true, force: true });
  };
  try {
    await migrate(makeFolder(empty));
    fs.cpSync(empty, seeded, { recursive: true });
    const demo = hasSeeds() ? await seed(seeded) : NO_DEMO;
    fs.cpSync(seeded, dataDir, { recursive: true });
    server = await startServer({ dataDir, logFile, env: OWN_SETTINGS });
    project.provide('baseUrl', server.baseUrl);
    project.provide('dataDir', dataDir);
    project.provide('logFile', logFile);
    project.provide('demo', demo);
    project.provide('templates', { empty, demo: seeded });
  } catch (error) {
    await tearDown();
    throw error;
  }
  return tearDown;
}

export interface OtherServer extends Server {
  dataDir: string;
  logFile: string;
  /** Starts again on the same data folder and port, after kill or stop. */
  restart(): Promise<OtherServer>;
  /** Stops the server and removes its data folder. */
  remove(): Promise<void>;
}

export interface OtherServerOptions {
  /** Which prepared data folder it begins with; `none` leaves the folder bare. Default demo. */
  data?: 'demo' | 'empty' | 'none';
  env?: Record<string, string | undefined>;
  /** Changes the data folder before the server starts. */
  prepare?: (dataDir: string) => void | Promise<void>;
  /** Path that answers with 200 once it is ready; default /api/health. */
  health?: string;
}

/** A server of the caller's own, for tests that kill it or need another beginning; call `remove` afterwards. */
export async function startOtherServer(options: OtherServerOptions = {}): Promise<OtherServer> {
  const { data = 'demo', env = {}, prepare, health } = options;
  const root = makeTemporaryFolder();
  const dataDir = path.join(root, 'data');
  if (data === 'none') makeFolder(dataDir);
  else fs.cpSync(inject('templates')[data], dataDir, { recursive: true });
  await prepare?.(dataDir);
  const demoSetting = data === 'demo' ? {} : { ASSIZE_DEMO: '0' };
  const start = async (port?: number): Promise<OtherServer> => {
    const logFile = path.join(LOGS, `${path.basename(root)}.log`);
    const settings = { ...OWN_SETTINGS, ...demoSetting, ...env };
    const server = await startServer({ dataDir, logFile, port, health, env: settings });
    return {
      ...server,
      dataDir,
      logFile,
      restart: () => start(Number(new URL(server.baseUrl).port)),
      remove: async () => {
        await server.stop();
        fs.rmSync(root, { recursive: true, force: true });
      },
    };
  };
  return start();
}

function makeTemporaryFolder(): string {
  return fs.mkdtempSync(path.join(os.tmpdir(), 'assize-server-'));
}

function makeFolder(folder: string): string {
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  return folder;
}
