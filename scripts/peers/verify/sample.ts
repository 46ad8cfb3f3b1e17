import type { PeerCase } from './cases';
import type { Figures } from './inputs';

export interface RecordedCase extends PeerCase {
  readonly peer: string;
  readonly expected: Figures;
}

const LARGEST = 30;
const SMALL = 13;
const EVERY = 3;

/** Small cases of every kind for the fixture; of the largest only those of plain data and of ties. */
export function sampleOf(all: readonly RecordedCase[]): RecordedCase[] {
  const taken = new Map<string, number>();
  return all.filter(({ peer, task, name, inputs }) => {
    const n = inputs.x?.length ?? 1;
    if (n > LARGEST || (n > SMALL && !/^(plain|ties)/.test(name))) return false;
    if (n > 1) return true;
    // Distributions and counts: every third, so that all tails stay.
    const count = taken.get(peer + task) ?? 0;
    taken.set(peer + task, count + 1);
    return count % EVERY === 0;
  });
}
