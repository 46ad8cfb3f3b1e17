import type { PairSet } from './difference-distribution';
import { countDifferences } from './pair-differences';
import { lowerBound, upperBound } from './sorted';
import { staircasePairs } from './staircase-pairs';

/** So many pairs within groups, for each value, are listed; more come from few, large groups, which are walked. */
const LISTED_PER_VALUE = 16;

/** All pairs from two different groups; each pair of groups weighs the same, however many replicates it has. */
export function pairsBetween(groups: readonly Float64Array[], tolerance: number): PairSet {
  const equal = groups.every(({ length }) => length === groups[0]?.length);
  // Equal groups weigh 1 a value, so that all weights are whole numbers.
  const weights = groups.map(({ length }) => (equal ? 1 : 1 / length));
  const { sorted, group } = pool(groups);
  const weightOf = Float64Array.from(group, (index) => weights[index] as number);
  const running = new Float64Array(sorted.length + 1);
  for (let i = 0; i < sorted.length; i += 1)
    running[i + 1] = (running[i] as number) + (weightOf[i] as number);
  const within = measureWithin(
    groups,
    weights.map((weight) => weight * weight),
  );
  const measure = (t: number) => weightUpTo(sorted, weightOf, running, t) - within(t);
  const pairs = (groups.length * (groups.length - 1)) / 2;
  const size = equal ? (groups[0]?.length ?? 0) : 1;
  const counts = (i: number, j: number) => group[i] !== group[j];
  return staircasePairs({ sorted, measure, total: pairs * size * size, counts, tolerance });
}

/** All pairs inside a group; each group with two values or more weighs the same. Null when there is none. */
export function pairsWithin(all: readonly Float64Array[], tolerance: number): PairSet | null {
  const groups = all.filter(({ length }) => length > 1);
  if (groups.length === 0) return null;
  const weights = groups.map(({ length }) => 2 / (length * (length - 1)));
  const total = groups.length;
  if (fewWithin(groups)) return listedPairs(groups, weights, total, tolerance);
  const { sorted, group } = pool(groups);
  const counts = (i: number, j: number) => group[i] === group[j];
  return staircasePairs({ sorted, measure: measureWithin(groups, weights), total, counts, tolerance });
}

function pool(groups: readonly Float64Array[]): { sorted: Float64Array; group: Int32Array } {
  const size = groups.reduce((sum, { length }) => sum + length, 0);
  const values = new Float64Array(size);
  const owner = new Int32Array(size);
  let start = 0;
  groups.forEach((own, index) => {
    values.set(own, start);
    owner.fill(index, start, start + own.length);
    start += own.length;
  });
  const order = Uint32Array.from(values, (_, i) => i).sort(
    (i, j) => (values[i] as number) - (values[j] as number),
  );
  return {
    sorted: Float64Array.from(order, (i) => values[i] as number),
    group: Int32Array.from(order, (i) => owner[i] as number),
  };
}

function weightUpTo(sorted: Float64Array, weightOf: Float64Array, running: Float64Array, t: number): number {
  let sum = 0;
  let first = 0;
  for (let j = 1; j < sorted.length; j += 1) {
    const x = sorted[j] as number;
    while (first < j && x - (sorted[first] as number) > t) first += 1;
    sum += (weightOf[j] as number) * ((running[j] as number) - (running[first] as number));
  }
  return sum;
}

function fewWithin(groups: readonly Float64Array[]): boolean {
  const values = groups.reduce((sum, { length }) => sum + length, 0);
  const pairs = groups.reduce((sum, { length }) => sum + (length * (length - 1)) / 2, 0);
  return pairs <= LISTED_PER_VALUE * values;
}

/** The weight of all pairs inside groups up to t, where a pair of group i weighs weights[i]. */
function measureWithin(groups: readonly Float64Array[], weights: readonly number[]): (t: number) => number {
  if (fewWithin(groups)) return listedPairs(groups, weights, 0, 0).measure;
  const sortedGroups = groups.map((own) => own.slice().sort());
  return (t) =>
    sortedGroups.reduce((sum, own, i) => sum + (weights[i] as number) * countDifferences(own, t), 0);
}

function listedPairs(
  groups: readonly Float64Array[],
  weights: readonly number[],
  total: number,
  tolerance: number,
): PairSet {
  const found: { difference: number; weight: number }[] = [];
  groups.forEach((own, g) => {
    const weight = weights[g] as number;
    for (let j = 1; j < own.length; j += 1) {
      for (let i = 0; i < j; i += 1) {
        found.push({ difference: Math.abs((own[j] as number) - (own[i] as number)), weight });
      }
    }
  });
  found.sort((a, b) => a.difference - b.difference);
  const differences = Float64Array.from(found, ({ difference }) => difference);
  const running = new Float64Array(found.length + 1);
  found.forEach(({ weight }, i) => (running[i + 1] = (running[i] as number) + weight));
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
