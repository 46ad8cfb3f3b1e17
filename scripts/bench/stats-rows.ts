import {
  algorithmA,
  hampel,
  huberProposal2,
  kendall,
  kernelDensity,
  madE,
  median,
  passingBablok,
  qMethod,
  qn,
  repeatedMedian,
  sn,
  theilSen,
} from '../../lib/stats';
import type { BenchData } from './stats-data';

export type PeerProgram = 'r' | 'scipy';

export const PROGRAMS = {
  r: { command: 'Rscript', script: 'stats-peers.R', needs: 'R with MASS and robustbase' },
  scipy: { command: '/usr/bin/python3', script: 'stats-peers.py', needs: 'python3 with scipy' },
} as const;

interface PeerFunction {
  readonly name: string;
  readonly program: PeerProgram;
  readonly largest: number;
  readonly tooLarge?: string;
}

export type Peer =
  'hubers' | 'qn' | 'sn' | 'median' | 'mad' | 'density' | 'theilslopes' | 'siegelslopes' | 'kendalltau';

const QUADRATIC = { largest: 10_000, tooLarge: 'all slopes at once would take 80 GB' };

export const PEERS: Record<Peer, PeerFunction> = {
  hubers: { name: 'MASS hubers', program: 'r', largest: Infinity },
  qn: { name: 'robustbase Qn', program: 'r', largest: Infinity },
  sn: { name: 'robustbase Sn', program: 'r', largest: Infinity },
  median: { name: 'R median', program: 'r', largest: Infinity },
  mad: { name: 'R mad', program: 'r', largest: Infinity },
  density: { name: 'R density', program: 'r', largest: Infinity },
  theilslopes: { name: 'scipy theilslopes', program: 'scipy', ...QUADRATIC },
  siegelslopes: { name: 'scipy siegelslopes', program: 'scipy', ...QUADRATIC },
  kendalltau: { name: 'scipy kendalltau', program: 'scipy', largest: Infinity },
};

interface RowPlan {
  readonly name: string;
  /** Null where neither R (MASS, robustbase) nor scipy has the function. */
  readonly peer: Peer | null;
  readonly run: (data: BenchData) => unknown;
}

/** Passing-Bablok has no peer there; it is held against the slopes of all pairs of theilslopes. */
export const STATS_ROWS: readonly RowPlan[] = [
  { name: 'median', peer: 'median', run: ({ y }) => median(y) },
  { name: 'madE', peer: 'mad', run: ({ y }) => madE(y) },
  { name: 'algorithmA', peer: 'hubers', run: ({ y }) => algorithmA(y) },
  { name: 'huberProposal2', peer: 'hubers', run: ({ y }) => huberProposal2(y) },
  { name: 'hampel', peer: null, run: ({ y }) => hampel(y) },
  { name: 'qMethod', peer: null, run: ({ y }) => qMethod(y) },
  { name: 'qn', peer: 'qn', run: ({ y }) => qn(y) },
  { name: 'sn', peer: 'sn', run: ({ y }) => sn(y) },
  {
    name: 'kernelDensity',
    peer: 'density',
    run: ({ y, bandwidth }) => kernelDensity(y, { bandwidth, gridSize: 512 }),
  },
  { name: 'theilSen', peer: 'theilslopes', run: ({ x, y }) => theilSen(x, y) },
  { name: 'passingBablok', peer: 'theilslopes', run: ({ x, y }) => passingBablok(x, y) },
  { name: 'repeatedMedian', peer: 'siegelslopes', run: ({ x, y }) => repeatedMedian(x, y) },
  { name: 'kendall', peer: 'kendalltau', run: ({ x, y }) => kendall(x, y) },
];
