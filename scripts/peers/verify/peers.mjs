import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const script = (name) => fileURLToPath(new URL(`../${name}`, import.meta.url));
const CAPACITY = 2e9;

/** What each peer can recompute, how it is started and how it comes onto a Debian machine. */
export const PEERS = [
  {
    name: 'R',
    programs: ['Rscript'],
    probe: ['-e', 'library(MASS)'],
    script: script('verify.R'),
    tasks:
      'location hubers density line correlation twoGroups anova iso5725 kruskal normal studentT chiSquare f beta binomial proportion mcNemar',
    install: 'apt-get install r-base-core r-cran-mass',
  },
  {
    name: 'robustbase',
    programs: ['Rscript'],
    probe: ['-e', 'library(MASS); library(robustbase)'],
    script: script('estimators.R'),
    tasks: 'robust',
    install: 'apt-get install r-base-core r-cran-mass r-cran-robustbase',
    // This script is older and takes the values alone.
    line: ({ inputs }, index) => `${index};${inputs.x.join(',')}`,
  },
  {
    name: 'Python',
    programs: ['/usr/bin/python3', 'python3'],
    probe: ['-c', 'import numpy, scipy.stats'],
    script: script('verify.py'),
    tasks: 'rankLines deming york passingBablok iso5725 line correlation',
    install: 'apt-get install python3-scipy',
  },
].map((peer) => ({ ...peer, tasks: peer.tasks.split(' ') }));

/** The program that runs a peer, or null when the machine has none with the packages it needs. */
export function programOf({ programs, probe }) {
  for (const program of programs) {
    try {
      execFileSync(program, probe, { stdio: 'ignore' });
      return program;
    } catch {
      // the next one
    }
  }
  return null;
}

const plainLine = ({ task, inputs }, index) =>
  [index, task, ...Object.entries(inputs).map(([name, values]) => `${name}=${values.join(',')}`)].join(';');

function figures(fields) {
  const pairs = fields.map((field) => field.split('='));
  return Object.fromEntries(
    pairs.map(([key, text]) => [key, text === 'NA' || text === 'NaN' ? null : Number(text)]),
  );
}

/** Runs a peer over its cases. Returns its version and [case, figures] for each. */
export function runPeer(peer, program, cases) {
  const own = cases.filter(({ task }) => peer.tasks.includes(task));
  const input = own.map(peer.line ?? plainLine).join('\n');
  const output = execFileSync(program, [peer.script], {
    input: `${input}\n`,
    maxBuffer: CAPACITY,
    stdio: 'pipe',
  }).toString();
  const rows = output.trim().split('\n');
  const version = rows.pop().slice(1);
  return {
    version,
    results: rows.map((row) => {
      const [index, ...fields] = row.split(';');
      return [own[Number(index)], figures(fields)];
    }),
  };
}
