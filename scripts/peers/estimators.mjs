/**
 * Holds the robust estimators against R (MASS, robustbase, definitions) on seeded random data: sizes 3 to 2000, ties,
 * outliers, huge and small scales.
 * usage: node --import tsx scripts/peers/estimators.mjs [--record]
 * With --record the smaller data sets and R's figures become the fixture of the tests.
 */
import { execFileSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { peerEstimates } from './peer-estimates.ts';

const SIZES = [3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 20, 31, 60, 200, 999, 2000];
const RECORDED_SIZE = 31;
const LIMIT = 1e-9;
/** robustbase's own Qn is good to single precision only (see estimators.R). */
const LIMITS = { qnRobustbase: 1e-7 };
const generator = xoroshiro128plus(20261201);
const normal = () => {
  const radius = Math.sqrt(-2 * Math.log(1 - uniformFloat64(generator)));
  return radius * Math.cos(2 * Math.PI * uniformFloat64(generator));
};
const KINDS = {
  plain: () => 50 + 3 * normal(),
  ties: () => Math.round(20 + 4 * normal()) / 10,
  outliers: () => (uniformFloat64(generator) < 0.2 ? 1000 * normal() : 10 + normal()),
  huge: () => 1e140 * (3 + normal()),
  tiny: () => 1e-140 * (3 + normal()),
  skew: () => Math.exp(normal()),
};

const sets = Object.entries(KINDS).flatMap(([kind, draw]) =>
  SIZES.map((n) => ({ name: `${kind} ${n}`, values: Array.from({ length: n }, draw) })),
);
const lines = sets.map(({ name, values }) => `${name};${values.join(',')}`).join('\n');
const script = fileURLToPath(new URL('estimators.R', import.meta.url));
const output = execFileSync('Rscript', [script], { input: `${lines}\n`, maxBuffer: 1e8 })
  .toString()
  .trim();
const program = output.split('\n').at(-1).slice(1);
const rows = output.split('\n').filter((line) => !line.startsWith('#'));

let compared = 0;
const worst = {};
const recorded = [];
rows.forEach((row, i) => {
  const { name, values } = sets[i];
  const expected = Object.fromEntries(
    row
      .split(';')
      .slice(1)
      .map((pair) => pair.split('='))
      .filter(([, text]) => text !== 'NA')
      .map(([key, text]) => [key, Number(text)]),
  );
  const found = peerEstimates(values);
  for (const [key, value] of Object.entries(expected)) {
    const size = Math.max(Math.abs(value), Number.MIN_VALUE);
    const error = value === found[key] ? 0 : Math.abs(found[key] - value) / size;
    compared += 1;
    if (!(error <= (worst[key]?.error ?? 0)))
      worst[key] = { error, name, found: found[key], expected: value };
  }
  if (values.length <= RECORDED_SIZE) recorded.push({ name, values, expected });
});
for (const [key, { error, name, found, expected }] of Object.entries(worst)) {
  console.log(`${key}: worst ${error.toExponential(1)} (${name}: ${found}, R ${expected})`);
}
const failed = Object.entries(worst).filter(([key, { error }]) => !(error <= (LIMITS[key] ?? LIMIT))).length;
console.log(`${compared} figures compared with ${program}; ${failed} estimators off by more than ${LIMIT}`);
if (process.argv.includes('--record')) {
  const fixture = {
    source: 'robust estimates of seeded random data',
    program,
    script: 'scripts/peers/estimators.mjs',
    madeOn: new Date().toISOString().slice(0, 10),
    rtol: LIMIT,
    sets: recorded,
  };
  writeFileSync(
    new URL('../../tests/stats/fixtures/estimators-r.json', import.meta.url),
    `${JSON.stringify(fixture)}\n`,
  );
}
process.exitCode = failed > 0 ? 1 : 0;
