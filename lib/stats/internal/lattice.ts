import { largestMagnitude, safeFactor } from './sums';

/** Values in a unit in which their differences can be told equal or not. */
export interface Lattice {
  readonly values: Float64Array;
  /** value in the unit of the data = lattice value / perUnit. */
  readonly perUnit: number;
  /** Differences up to this far apart are equal. 0 on a decimal lattice. */
  readonly tolerance: number;
}

const MOST_DECIMALS = 15;

/**
 * Laboratories report decimal figures, and 0.3 - 0.2 and 0.2 - 0.1 are equal although their binary differences are not.
 * Values with a fixed number of decimals become whole numbers, whose differences are exact. Others (means, converted
 * units) stay as they are; their differences count as equal within a few roundings of the largest value.
 */
export function toLattice(values: ArrayLike<number>): Lattice {
  const decimals = sharedDecimals(values);
  if (decimals !== null) {
    const perUnit = 10 ** decimals;
    return { values: Float64Array.from(values, (x) => Math.round(x * perUnit)), perUnit, tolerance: 0 };
  }
  const perUnit = safeFactor(values);
  const kept = Float64Array.from(values, (x) => x * perUnit);
  return { values: kept, perUnit, tolerance: 8 * Number.EPSILON * largestMagnitude(kept) };
}

/** The fewest decimals with which all values are the doubles nearest to decimal figures; null when there are none. */
function sharedDecimals(values: ArrayLike<number>): number | null {
  let decimals = 0;
  let largest = 0;
  for (let i = 0; i < values.length; i += 1) {
    const x = values[i] as number;
    largest = Math.max(largest, Math.abs(x));
    while (Math.round(x * 10 ** decimals) / 10 ** decimals !== x) {
      decimals += 1;
      if (decimals > MOST_DECIMALS) return null;
    }
    if (largest * 10 ** decimals > Number.MAX_SAFE_INTEGER / 2) return null;
  }
  return decimals;
}
