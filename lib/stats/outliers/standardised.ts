import { checkValues } from '../internal/check-values';
import { groupedData } from '../internal/grouped-data';
import { StatsError } from '../stats-error';

/** Values from their median in units near 1, with their order; an index is that of the value in the input. */
export interface StandardisedSample {
  /** Ascending. */
  readonly values: Float64Array;
  readonly index: Int32Array;
  readonly mean: number;
  /** Sum of squared deviations from the mean; above 0. */
  readonly squares: number;
  /** A place P here is centre + P / factor in the data. */
  readonly centre: number;
  readonly factor: number;
}

/** Checks the sample and brings it to a common unit; all values equal is `no-spread`. */
export function standardise(caller: string, values: readonly number[], minimum: number): StandardisedSample {
  checkValues(caller, values, minimum);
  const data = groupedData(values.map((value) => [value]));
  const places = data.groups.map((group) => group.mean);
  const index = Int32Array.from(places.keys()).sort(
    (a, b) => (places[a] as number) - (places[b] as number) || a - b,
  );
  const sorted = Float64Array.from(index, (i) => places[i] as number);
  const { mean, squares } = momentsOfRange(sorted, 0, sorted.length);
  if (squares === 0) {
    throw new StatsError('no-spread', `${caller} requires values that differ, found ${values[0]} throughout`);
  }
  return { values: sorted, index, mean, squares, centre: data.centre, factor: data.factor };
}

/** Mean and sum of squared deviations of sorted[from] to sorted[to - 1], in two passes. */
export function momentsOfRange(
  sorted: Float64Array,
  from: number,
  to: number,
): { mean: number; squares: number } {
  const n = to - from;
  let sum = 0;
  for (let i = from; i < to; i += 1) sum += sorted[i] as number;
  const mean = sum / n;
  let [squares, rest] = [0, 0];
  for (let i = from; i < to; i += 1) {
    const deviation = (sorted[i] as number) - mean;
    squares += deviation * deviation;
    rest += deviation;
  }
  return { mean: mean + rest / n, squares: Math.max(0, squares - (rest * rest) / n) };
}
