import fs from 'node:fs';
import path from 'node:path';
import { buildWhenStale } from './lib/build.mjs';
import { requireChromium } from './lib/chromium.mjs';
import { installPackages } from './lib/install.mjs';
import { NEXT_BIN, requireNode, ROOT } from './lib/project.mjs';
import { main, say, sayFailure, sayStep, seconds, step, Stop } from './lib/report.mjs';
import { runNode } from './lib/run.mjs';
import { runVitest } from './lib/vitest.mjs';

const bin = (name) => path.join(ROOT, 'node_modules', name);
const CHECKS = [
  { name: 'Format', args: [bin('prettier/bin/prettier.cjs'), '--check', '--log-level', 'warn', '.'] },
  {
    name: 'Lint',
    args: [bin('eslint/bin/eslint.js'), '--max-warnings', '0', '--ignore-pattern', '.tmp/**', '.'],
  },
  { name: 'Route types', args: [NEXT_BIN, 'typegen'] },
  { name: 'Types', args: [bin('typescript/bin/tsc'), '--noEmit'] },
];
const FAILED_CHECK = { passed: 0, failed: 1, leftOut: 0 };

/** Runs every check and every test, and goes on after a failure so that one run tells all. */
async function test() {
  requireNode();
  process.env.NEXT_TELEMETRY_DISABLED = '1';
  await installPackages();
  await requireChromium();
  const outcomes = [];
  const keep = async (name, work) => {
    const since = Date.now();
    outcomes.push({ name, ...(await work()), took: seconds(since) });
  };
  for (const check of CHECKS) await keep(check.name, () => runCheck(check));
  await keep('Unit tests', () => runProject('unit'));
  if (process.argv.includes('--slow')) await keep('Slow tests', () => runProject('slow'));
  await keep('Server and end-to-end tests', async () =>
    (await isBuilt()) ? runProject('server') : FAILED_CHECK,
  );
  return summarise(outcomes);
}

async function runCheck({ name, args }) {
  try {
    await step(name, async () => {
      const { code, output } = await runNode(args);
      if (code !== 0) throw new Stop(`${name}: what is wrong stands above.`, { output });
      return 'fine';
    });
  } catch (error) {
    sayFailure(error);
    return FAILED_CHECK;
  }
  return { passed: 0, failed: 0, leftOut: 0 };
}

async function isBuilt() {
  try {
    await buildWhenStale();
    return true;
  } catch (error) {
    sayFailure(error);
    return false;
  }
}

async function runProject(project) {
  sayStep('Tests', project);
  if (project === 'slow' && !hasSlowTests()) {
    say('There are no slow tests.');
    return { passed: 0, failed: 0, leftOut: 0 };
  }
  return runVitest(project);
}

function hasSlowTests() {
  return fs.existsSync(path.join(ROOT, 'tests/slow'));
}

/** A check that fails counts as one failure beside the tests, so that the last line never says 0 failed wrongly. */
function summarise(outcomes) {
  const sum = (key) => outcomes.reduce((total, outcome) => total + outcome[key], 0);
  say('\nSummary');
  for (const { name, passed, failed, leftOut, took } of outcomes) {
    const counts = passed || leftOut ? `${passed} passed, ${failed} failed` : failed ? 'failed' : 'fine';
    say(`  ${name.padEnd(30)}${counts}${leftOut ? `, ${leftOut} left out` : ''} (${took})`);
  }
  say(`\n${sum('passed')} passed, ${sum('failed')} failed`);
  return sum('failed') > 0 ? 1 : 0;
}

await main(test);
