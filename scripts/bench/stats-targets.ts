import type { Spread } from './timing';

interface Measured {
  readonly name: string;
  readonly n: number;
  readonly own: Spread;
  /** One Float64Array.sort of the same n. */
  readonly sort: number;
  readonly peer: {
    readonly name: string | null;
    readonly spread: Spread | null;
    /** Why there is no time of a peer. */
    readonly missing: string | null;
  };
}

export interface Target {
  readonly says: string;
  /** Null when it cannot be judged, since the peer is missing. */
  readonly met: boolean | null;
}

export interface StatsRow extends Measured {
  readonly targets: readonly Target[];
}

const LINES = { functions: ['theilSen', 'passingBablok'], n: 10_000, timesPeer: 150, sorts: 60 };
const SCALES = { functions: ['sn', 'qn', 'qMethod'], n: 100_000, sorts: 25 };

/** What the row is to reach: the peer's time, and for some a number of sorts. */
export function targetsOf({ name, n, own, sort, peer }: Measured): Target[] {
  const isLine = LINES.functions.includes(name) && n === LINES.n;
  const targets: Target[] = [];
  if (peer.name !== null && (peer.spread !== null || isLine)) {
    const factor = isLine ? LINES.timesPeer : 1;
    const met = peer.spread === null ? null : own.median * factor <= peer.spread.median;
    targets.push({ says: isLine ? `${factor} times the peer's speed` : "the peer's speed", met });
  }
  const sorts = isLine
    ? LINES.sorts
    : SCALES.functions.includes(name) && n === SCALES.n
      ? SCALES.sorts
      : null;
  if (sorts !== null) targets.push({ says: `${sorts} sorts`, met: own.median <= sorts * sort });
  return targets;
}
