import { StatsError } from '../stats-error';
import { checkPositive, checkValues } from './check-values';
import { medianOfSorted, sortedCopy } from './sorted';

/** Sorted values as distances from their median, in units of sqrt(2) bandwidths. */
export interface KernelUnits {
  readonly sorted: Float64Array;
  readonly origin: number;
  readonly unit: number;
}

export function kernelUnits(caller: string, values: readonly number[], bandwidth: number): KernelUnits {
  checkValues(caller, values, 1);
  checkPositive(caller, 'bandwidth', bandwidth);
  const sorted = sortedCopy(values);
  const origin = medianOfSorted(sorted);
  const unit = Math.SQRT2 * bandwidth;
  const scaled = sorted.map((value) => (value - origin) / unit);
  if (!Number.isFinite(scaled[0]) || !Number.isFinite(scaled[scaled.length - 1])) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires values within the number range of the bandwidth`,
    );
  }
  return { sorted: scaled, origin, unit };
}

/** How many values tell where their middle roughly is. */
const LOOKED_AT = 63;

/** The same without a sort: values in any order, as distances from a value near the middle. */
export function unsortedKernelUnits(
  caller: string,
  values: readonly number[],
  bandwidth: number,
): { values: Float64Array; origin: number; unit: number } {
  checkValues(caller, values, 1);
  checkPositive(caller, 'bandwidth', bandwidth);
  const step = Math.max(1, Math.floor(values.length / LOOKED_AT));
  const some: number[] = [];
  for (let i = 0; i < values.length; i += step) some.push(values[i] as number);
  const origin = medianOfSorted(sortedCopy(some));
  const unit = Math.SQRT2 * bandwidth;
  const scaled = new Float64Array(values.length);
  for (let i = 0; i < scaled.length; i += 1) scaled[i] = ((values[i] as number) - origin) / unit;
  return { values: scaled, origin, unit };
}

/** Height of one kernel in a density of n values: 1 / (n h sqrt(2 pi)), with unit = sqrt(2) h. */
export function kernelHeight(n: number, unit: number): number {
  return 1 / (n * Math.sqrt(Math.PI)) / unit;
}
