/**
 * Times functions of lib/stats, each beside its peer in R or scipy on the same data in the same run, and beside one sort.
 * usage: node --import tsx scripts/bench/stats.ts; prints JSON.
 */
import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { makeData, type BenchData } from './stats-data';
import { PEERS, PROGRAMS, STATS_ROWS, type Peer, type PeerProgram } from './stats-rows';
import { targetsOf, type StatsRow } from './stats-targets';
import { spreadOf, timesOf, type Spread } from './timing';

const SIZES = [30, 300, 3_000, 10_000, 100_000];
const PEERS_LIMIT_MS = 100_000;

interface PeerTimes {
  readonly version: string | null;
  readonly reason: string | null;
  readonly times: ReadonlyMap<string, Spread>;
}

const keyOf = (peer: Peer, n: number) => `${peer} ${n}`;

/** What each program has to time, as lines "function n". */
function jobsOf(program: PeerProgram): string[] {
  const wanted = STATS_ROWS.flatMap(({ peer }) => {
    if (peer === null || PEERS[peer].program !== program) return [];
    return SIZES.filter((n) => n <= PEERS[peer].largest).map((n) => keyOf(peer, n));
  });
  return [...new Set(wanted)];
}

function askPeers(program: PeerProgram, folder: string, bandwidths: ReadonlyMap<number, number>): PeerTimes {
  const { command, script } = PROGRAMS[program];
  const file = fileURLToPath(new URL(script, import.meta.url));
  const input = jobsOf(program)
    .map((job) => `${job} ${bandwidths.get(Number(job.split(' ')[1]))}\n`)
    .join('');
  try {
    const output = execFileSync(command, [file, folder], {
      input,
      timeout: PEERS_LIMIT_MS,
      stdio: ['pipe', 'pipe', 'pipe'],
      env: { ...process.env, OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1' },
    }).toString();
    const [version, ...lines] = output.trim().split('\n');
    const times = lines.map((line) => {
      const [peer, n, ...ms] = line.split(' ');
      return [`${peer} ${n}`, spreadOf(ms.map(Number))] as const;
    });
    return { version: version ?? null, reason: null, times: new Map(times) };
  } catch (error) {
    const said = error instanceof Error ? (error.message.split('\n')[0] ?? '') : String(error);
    return { version: null, reason: `${PROGRAMS[program].needs} not usable here: ${said}`, times: new Map() };
  }
}

function writeData(folder: string, data: readonly BenchData[]): void {
  for (const { n, x, y } of data) {
    fs.writeFileSync(path.join(folder, `x-${n}.bin`), Float64Array.from(x));
    fs.writeFileSync(path.join(folder, `y-${n}.bin`), Float64Array.from(y));
  }
}

function peerOf(peer: Peer | null, n: number, answers: Record<PeerProgram, PeerTimes>) {
  if (peer === null) return { name: null, spread: null, missing: 'no peer in R or scipy' };
  const { name, program, largest, tooLarge } = PEERS[peer];
  if (n > largest) return { name, spread: null, missing: `not tried: ${tooLarge}` };
  const spread = answers[program].times.get(keyOf(peer, n)) ?? null;
  return { name, spread, missing: spread ? null : (answers[program].reason ?? 'gave no time') };
}

function measure(): { versions: Record<PeerProgram, string | null>; rows: StatsRow[] } {
  const data = SIZES.map(makeData);
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'assize-bench-stats-'));
  try {
    writeData(folder, data);
    const bandwidths = new Map(data.map(({ n, bandwidth }) => [n, bandwidth]));
    const answers = {
      r: askPeers('r', folder, bandwidths),
      scipy: askPeers('scipy', folder, bandwidths),
    };
    const sorts = new Map(data.map(({ n, y }) => [n, spreadOf(timesOf(() => new Float64Array(y).sort()))]));
    const rows = STATS_ROWS.flatMap(({ name, peer, run }) =>
      data.map((own) => {
        const row = {
          name,
          n: own.n,
          own: spreadOf(timesOf(() => run(own))),
          sort: sorts.get(own.n)?.median ?? NaN,
          peer: peerOf(peer, own.n, answers),
        };
        return { ...row, targets: targetsOf(row) };
      }),
    );
    return { versions: { r: answers.r.version, scipy: answers.scipy.version }, rows };
  } finally {
    fs.rmSync(folder, { recursive: true, force: true });
  }
}

console.log(JSON.stringify(measure()));
