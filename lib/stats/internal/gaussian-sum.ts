/**
 * Sums of Gaussian kernels, near-linear in the number of values (the fast Gauss transform in one dimension,
 * Greengard and Strain 1991). Values near each other share a centre; each group is kept as its Hermite series, written
 * out as a polynomial times a Gaussian, so that a point costs a few groups and not all values.
 */
export interface GaussianSum {
  readonly centres: Float64Array;
  /** Of each group the coefficients of the polynomial, from the constant on. */
  readonly coefficients: Float64Array;
  readonly shape: GroupShape;
}

/** How wide a group is and how many terms its series needs: the first one left out is below 2e-16 of a kernel. */
interface GroupShape {
  readonly halfWidth: number;
  readonly terms: number;
  /** Coefficient of u^j in H_k(u) / k!, at k * terms + j. */
  readonly hermite: Float64Array;
}

// max |H_k(u)| exp(-u^2) v^k / k! is at most 1.09 (v sqrt(2))^k / sqrt(k!): 1e-16 with these numbers of terms. Wide groups
// cost less where points are many, narrow ones where values are.
const WIDE: GroupShape = groupShape(0.25, 18);
const NARROW: GroupShape = groupShape(0.0625, 12);
/** From here on values are put into groups of one grid, without a sort. */
const MANY = 1000;
/** From here on the groups are narrow. */
const VERY_MANY = 30_000;
/** No more groups than this share of the values, or a far value would ask for more groups than there are values. */
const MOST_GROUPS_SHARE = 0.5;
/** exp(-6.2^2) is 2e-17: kernels further away add nothing to a double. */
const REACH = 6.2;

function groupShape(halfWidth: number, terms: number): GroupShape {
  const hermite = new Float64Array(terms * terms);
  hermite[0] = 1;
  for (let k = 1; k < terms; k += 1) {
    // H_k / k! = (2 u H_{k-1} / (k - 1)! - 2 H_{k-2} / (k - 2)!) / k
    for (let j = 0; j <= k; j += 1) {
      const raised = j > 0 ? (hermite[(k - 1) * terms + j - 1] as number) : 0;
      const before = k > 1 ? (hermite[(k - 2) * terms + j] as number) : 0;
      hermite[k * terms + j] = (2 * raised - 2 * before) / k;
    }
  }
  return { halfWidth, terms, hermite };
}

/** `sorted` holds the values in units of sqrt(2) bandwidths, so that a kernel is exp(-(t - x)^2). */
export function gaussianSum(sorted: Float64Array): GaussianSum {
  const { halfWidth, terms } = WIDE;
  const centres: number[] = [];
  const powers: Float64Array[] = [];
  let first = 0;
  while (first < sorted.length) {
    const centre = (sorted[first] as number) + halfWidth;
    let next = first;
    const sums = new Float64Array(terms);
    while (next < sorted.length && (sorted[next] as number) - centre <= halfWidth) {
      addPowers(sums, 0, terms, (sorted[next] as number) - centre);
      next += 1;
    }
    centres.push(centre);
    powers.push(sums);
    first = next === first ? first + 1 : next;
  }
  const all = new Float64Array(centres.length * terms);
  powers.forEach((sums, group) => all.set(sums, group * terms));
  return { centres: Float64Array.from(centres), coefficients: toPolynomials(all, WIDE), shape: WIDE };
}

/**
 * The same for values in any order, in O(n): groups are the cells of a grid. Null where values are few or so far apart that
 * there would be too many cells.
 */
export function gaussianSumOnGrid(values: Float64Array): GaussianSum | null {
  if (values.length < MANY) return null;
  const shape = values.length < VERY_MANY ? WIDE : NARROW;
  const { halfWidth, terms } = shape;
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i] as number;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const perUnit = 0.5 / halfWidth;
  const firstCell = Math.floor(low * perUnit);
  const cells = Math.floor(high * perUnit) - firstCell + 1;
  if (!(cells <= values.length * MOST_GROUPS_SHARE)) return null;
  const powers = new Float64Array(cells * terms);
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i] as number;
    const cell = Math.floor(value * perUnit);
    addPowers(powers, (cell - firstCell) * terms, terms, value - (cell + 0.5) / perUnit);
  }
  const filled: number[] = [];
  for (let cell = 0; cell < cells; cell += 1) if ((powers[cell * terms] as number) > 0) filled.push(cell);
  const kept = new Float64Array(filled.length * terms);
  filled.forEach((cell, group) => kept.set(powers.subarray(cell * terms, (cell + 1) * terms), group * terms));
  const centres = Float64Array.from(filled, (cell) => (firstCell + cell + 0.5) / perUnit);
  return { centres, coefficients: toPolynomials(kept, shape), shape };
}

/** Adds 1, v, v^2 ... in two chains, so that no product waits for the one just before it. */
function addPowers(sums: Float64Array, from: number, terms: number, v: number): void {
  const square = v * v;
  let even = 1;
  let odd = v;
  for (let k = from; k < from + terms; k += 2) {
    sums[k] = (sums[k] as number) + even;
    sums[k + 1] = (sums[k + 1] as number) + odd;
    even *= square;
    odd *= square;
  }
}

function toPolynomials(powers: Float64Array, { terms, hermite }: GroupShape): Float64Array {
  const coefficients = new Float64Array(powers.length);
  for (let from = 0; from < powers.length; from += terms) {
    for (let k = 0; k < terms; k += 1) {
      const power = powers[from + k] as number;
      if (power === 0) continue;
      for (let j = k & 1; j <= k; j += 2) {
        coefficients[from + j] =
          (coefficients[from + j] as number) + power * (hermite[k * terms + j] as number);
      }
    }
  }
  return coefficients;
}

/** The sum of kernels at t, in the units of the values. */
export function gaussianSumAt({ centres, coefficients, shape }: GaussianSum, t: number): number {
  const { terms, halfWidth } = shape;
  const limit = t + REACH + halfWidth;
  let sum = 0;
  for (
    let group = firstInReach(centres, t - REACH - halfWidth);
    group < centres.length && (centres[group] as number) <= limit;
    group += 1
  ) {
    const u = t - (centres[group] as number);
    const square = u * u;
    let even = 0;
    let odd = 0;
    for (let k = (group + 1) * terms - 2; k >= group * terms; k -= 2) {
      even = even * square + (coefficients[k] as number);
      odd = odd * square + (coefficients[k + 1] as number);
    }
    sum += Math.exp(-square) * (even + u * odd);
  }
  return sum;
}

/** The sum of kernels at t and its derivative, in the units of the values. */
export function evaluateGaussianSum(sum: GaussianSum, t: number): { value: number; slope: number } {
  const { centres, coefficients, shape } = sum;
  const { terms, halfWidth } = shape;
  const limit = t + REACH + halfWidth;
  let value = 0;
  let slope = 0;
  for (
    let group = firstInReach(centres, t - REACH - halfWidth);
    group < centres.length && (centres[group] as number) <= limit;
    group += 1
  ) {
    const u = t - (centres[group] as number);
    let polynomial = 0;
    let derivative = 0;
    for (let k = (group + 1) * terms - 1; k >= group * terms; k -= 1) {
      derivative = derivative * u + polynomial;
      polynomial = polynomial * u + (coefficients[k] as number);
    }
    const weight = Math.exp(-u * u);
    value += weight * polynomial;
    slope += weight * (derivative - 2 * u * polynomial);
  }
  return { value, slope };
}

function firstInReach(centres: Float64Array, limit: number): number {
  let low = 0;
  let high = centres.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((centres[middle] as number) < limit) low = middle + 1;
    else high = middle;
  }
  return low;
}
