import type { PairSet } from './difference-distribution';
import { countDifferences } from './pair-differences';
import { lowerBound, upperBound } from './sorted';

/** So many pairs within groups, for each value, are listed; more come from few, large groups, which are walked. */
const LISTED_PER_VALUE = 16;

export function fewWithin(groups: readonly Float64Array[]): boolean {
  const values = groups.reduce((sum, { length }) => sum + length, 0);
  const pairs = groups.reduce((sum, { length }) => sum + (length * (length - 1)) / 2, 0);
  return pairs <= LISTED_PER_VALUE * values;
}

/** The weight of all pairs inside groups up to t, where a pair of group i weighs weights[i]. */
export function measureWithin(
  groups: readonly Float64Array[],
  weights: readonly number[],
): (t: number) => number {
  if (fewWithin(groups)) return listedPairs(groups, weights, 0, 0).measure;
  const sortedGroups = groups.map((own) => own.slice().sort());
  return (t) =>
    sortedGroups.reduce((sum, own, i) => sum + (weights[i] as number) * countDifferences(own, t), 0);
}

/** The pairs inside groups, written down; a pair of group i weighs weights[i]. */
export function listedPairs(
  groups: readonly Float64Array[],
  weights: readonly number[],
  total: number,
  tolerance: number,
): PairSet {
  const { differences, running } = listWithin(groups, weights);
  return {
    measure: (t) => running[upperBound(differences, t)] as number,
    total,
    tolerance,
    locate: (target) => {
      const index = Math.min(differences.length, Math.max(1, lowerBound(running, target)));
      return differences[index - 1] as number;
    },
    largestBelow: (t) => differences[lowerBound(differences, t) - 1] ?? 0,
    smallestAbove: (t) => differences[upperBound(differences, t)] ?? Infinity,
  };
}

/** The differences inside groups in order, with the running sums of their weights. */
function listWithin(
  groups: readonly Float64Array[],
  weights: readonly number[],
): { differences: Float64Array; running: Float64Array } {
  const size = groups.reduce((sum, { length }) => sum + (length * (length - 1)) / 2, 0);
  const differences = new Float64Array(size);
  const weightOf = new Float64Array(size);
  let taken = 0;
  groups.forEach((own, g) => {
    for (let j = 1; j < own.length; j += 1) {
      for (let i = 0; i < j; i += 1) {
        differences[taken] = Math.abs((own[j] as number) - (own[i] as number));
        weightOf[taken] = weights[g] as number;
        taken += 1;
      }
    }
  });
  const same = weights.every((weight) => weight === weights[0]);
  if (same) differences.sort();
  else sortTogether(differences, weightOf);
  const running = new Float64Array(size + 1);
  for (let i = 0; i < size; i += 1) {
    running[i + 1] = same
      ? (i + 1) * (weights[0] as number)
      : (running[i] as number) + (weightOf[i] as number);
  }
  return { differences, running };
}

function sortTogether(keys: Float64Array, values: Float64Array): void {
  const order = Uint32Array.from(keys, (_, i) => i).sort((i, j) => (keys[i] as number) - (keys[j] as number));
  const [oldKeys, oldValues] = [keys.slice(), values.slice()];
  order.forEach((from, to) => {
    keys[to] = oldKeys[from] as number;
    values[to] = oldValues[from] as number;
  });
}
