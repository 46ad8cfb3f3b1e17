/**
 * Recomputes the main figures of the statistics library with R (base, MASS, robustbase) and with Python (scipy, and
 * definitions written out) on seeded random data: sizes 3 to 2000, ties, outliers, large and small scales. Prints a
 * table; ends with 1 when a figure is off by more than its tolerance, with 2 when a peer is missing.
 * usage: npm run verify:peers [-- --record]
 * With --record a sample (inputs and the peers' figures) becomes the fixture of tests/reference/peers.
 */
import { writeFileSync } from 'node:fs';
import { peerCases } from './verify/cases.ts';
import { compare } from './verify/compare.ts';
import { SEED } from './verify/data.ts';
import { PEERS, programOf, runPeer } from './verify/peers.mjs';
import { ruleOf } from './verify/rules.ts';
import { sampleOf } from './verify/sample.ts';

const FIXTURE = new URL('../../tests/reference/peers/peers.json', import.meta.url);
const cases = peerCases();
const rows = new Map();
const missing = [];
const programs = [];
const recorded = [];

for (const peer of PEERS) {
  const program = programOf(peer);
  if (!program) {
    missing.push(peer);
    continue;
  }
  const { version, results } = runPeer(peer, program, cases);
  programs.push(`${peer.name}: ${version}`);
  for (const [entry, expected] of results) {
    recorded.push({ peer: peer.name, ...entry, expected });
    for (const comparison of compare(entry, peer.name, expected)) note(peer.name, entry, comparison);
  }
}

function note(peer, entry, comparison) {
  const key = `${entry.task} ${comparison.figure} ${peer}`;
  const row = rows.get(key) ?? { peer, task: entry.task, figure: comparison.figure, cases: 0, worst: null };
  row.cases += 1;
  if (!(comparison.difference <= (row.worst?.difference ?? -1)))
    row.worst = { ...comparison, name: entry.name };
  rows.set(key, row);
}

const failed = [...rows.values()].filter(({ worst }) => !(worst.difference <= worst.tolerance));
const columns = [37, 12, 7, 12, 11];
const print = (cells) => console.log(cells.map((cell, i) => String(cell).padEnd(columns[i] ?? 0)).join(''));
print(['Function and figure', 'Peer', 'Cases', 'Worst', 'Tolerance', 'Verdict']);
for (const row of rows.values()) {
  const { difference, tolerance, name, found, expected } = row.worst;
  const fine = difference <= tolerance;
  const verdict = fine ? 'agrees' : `MISS at ${name}: found ${found}, peer ${expected}`;
  const name2 = `${row.task}.${row.figure}`;
  print([name2, row.peer, row.cases, difference.toExponential(1), tolerance.toExponential(0), verdict]);
}
console.log('\nTolerances other than 1e-9 of the value:');
const reasons = new Map();
for (const { peer, task, figure } of rows.values()) {
  const { why } = ruleOf(peer, task, figure);
  if (why) reasons.set(why, [...(reasons.get(why) ?? []), `${task}.${figure} (${peer})`]);
}
for (const [why, figures] of reasons) console.log(`  ${why}\n    ${figures.join(', ')}`);
const total = [...rows.values()].reduce((sum, row) => sum + row.cases, 0);
console.log(
  `\n${programs.join('\n')}\nSeed ${SEED}. ${total} figures of ${rows.size} kinds compared, ${failed.length} kinds off.`,
);
for (const { name, tasks, install } of missing) {
  console.log(`Not compared: ${tasks.join(', ')}. ${name} is missing on this machine: ${install}`);
}
if (process.argv.includes('--record') && missing.length === 0) {
  const fixture = {
    source: `random data, seed ${SEED} (xoroshiro128+)`,
    programs,
    script: 'scripts/peers/verify.mjs',
    madeOn: new Date().toISOString().slice(0, 10),
    tolerance: 'relative 1e-9, or as scripts/peers/verify/rules.ts says with its reason',
    cases: sampleOf(recorded),
  };
  writeFileSync(FIXTURE, `${JSON.stringify(fixture)}\n`);
}
process.exitCode = failed.length > 0 ? 1 : missing.length > 0 ? 2 : 0;
