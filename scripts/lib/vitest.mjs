import fs from 'node:fs';
import path from 'node:path';
import { readJson, ROOT, SCRATCH } from './project.mjs';
import { runNode } from './run.mjs';

const VITEST = path.join(ROOT, 'node_modules/vitest/vitest.mjs');

/** Runs one project of vitest.config.ts and counts its tests from vitest's own report. */
export async function runVitest(project) {
  const report = path.join(SCRATCH, `vitest-${project}.json`);
  fs.rmSync(report, { force: true });
  const { code } = await runNode(
    [
      VITEST,
      'run',
      ...['--project', project],
      ...['--reporter', 'default', '--reporter', 'json'],
      ...['--outputFile.json', report],
    ],
    { env: { NODE_ENV: 'test', TZ: 'UTC' }, isShown: true },
  );
  return countTests(readJson(report), code);
}

/** A file that cannot be loaded holds no test to count, so it counts as one failure; so does a run that ends badly. */
export function countTests(report, code) {
  const files = report?.testResults ?? [];
  const broken = files.filter((file) => file.status === 'failed' && file.assertionResults.length === 0);
  const passed = report?.numPassedTests ?? 0;
  const failed = (report?.numFailedTests ?? 0) + broken.length;
  const leftOut = (report?.numPendingTests ?? 0) + (report?.numTodoTests ?? 0);
  return { passed, failed: code !== 0 && failed === 0 ? 1 : failed, leftOut };
}
