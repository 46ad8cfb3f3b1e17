import path from 'node:path';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const root = import.meta.dirname;
const alias = { '@': root, 'server-only': path.join(root, 'tests/empty-module.ts') };
const shared = { plugins: [react()], resolve: { alias } };
const env = { TZ: 'UTC', NODE_ENV: 'test' as const };

export default defineConfig({
  test: {
    projects: [
      {
        ...shared,
        test: {
          name: 'unit',
          env,
          include: [
            'tests/{stats,reference,rules,results-file,db,services,components,layers,demo}/**/*.test.{ts,tsx}',
          ],
          setupFiles: ['tests/setup-node.ts'],
          execArgv: ['--import', 'tsx'],
        },
      },
      {
        ...shared,
        test: {
          name: 'server',
          env,
          include: ['tests/{server,e2e}/**/*.test.ts'],
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
