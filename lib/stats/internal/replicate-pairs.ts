import type { PairSet } from './difference-distribution';
import { fewWithin, listedPairs, measureWithin } from './listed-pairs';
import { countDifferences, remembering } from './pair-differences';
import { lowerBound } from './sorted';
import { staircasePairs } from './staircase-pairs';

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
  const count = remembering((t) => countDifferences(sorted, t));
  const all = (t: number) => (equal ? count(t) : weightUpTo(sorted, weightOf, running, t));
  const measure = (t: number) => all(t) - within(t);
  const pairs = (groups.length * (groups.length - 1)) / 2;
  const size = equal ? (groups[0]?.length ?? 0) : 1;
  const counts = (i: number, j: number) => group[i] !== group[j];
  return staircasePairs({
    sorted,
    measure,
    count,
    total: pairs * size * size,
    counts,
    single: equal,
    tolerance,
  });
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
  const count = remembering((t) => countDifferences(sorted, t));
  const measure = measureWithin(groups, weights);
  return staircasePairs({ sorted, measure, count, total, counts, single: false, tolerance });
}

/** All values in order, and the group of each. */
function pool(groups: readonly Float64Array[]): { sorted: Float64Array; group: Int32Array } {
  const size = groups.reduce((sum, { length }) => sum + length, 0);
  const sorted = new Float64Array(size);
  let start = 0;
  for (const own of groups) {
    sorted.set(own, start);
    start += own.length;
  }
  sorted.sort();
  // Each value takes the next free place among its equals; sorting pairs by a comparator is several times slower.
  const group = new Int32Array(size);
  const taken = new Int32Array(size);
  groups.forEach((own, index) => {
    for (const value of own) {
      const first = lowerBound(sorted, value);
      group[first + (taken[first] as number)] = index;
      (taken[first] as number) += 1;
    }
  });
  return { sorted, group };
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
