import path from 'node:path';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const root = import.meta.dirname;
const alias = { '@': root, 'server-only': path.join(root, 'tests/empty-module.ts') };
const shared = { plugins: [react()], resolve: { alias } };
/** Tests that talk to the running server; beside their fixtures they are called *.server.test.ts. */
const NEEDS_SERVER = ['tests/{server,e2e}/**/*.test.ts', 'tests/**/*.server.test.ts'];
const env = { TZ: 'UTC', NODE_ENV: 'test' as const };

export default defineConfig({
  test: {
    projects: [
      {
        ...shared,
        test: {
          name: 'unit',
          env,
          include: ['tests/**/*.test.{ts,tsx}'],
          exclude: NEEDS_SERVER.concat('tests/slow/**'),
          setupFiles: ['tests/setup-node.ts'],
          execArgv: ['--import', 'tsx'],
          // Guards against hanging, not against slowness: a machine may be busy with a build as well.
          testTimeout: 30_000,
        },
      },
      {
        ...shared,
        test: {
          name: 'server',
          env,
          include: NEEDS_SERVER,
          globalSetup: ['tests/server-setup.ts'],
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        ...shared,
        test: {
          name: 'slow',
          env,
          include: ['tests/slow/**/*.test.ts'],
          fileParallelism: false,
          testTimeout: 600_000,
        },
      },
    ],
  },
});
