/** Sum of the terms with what rounding took from it (Neumaier 1974); the two together are nearly twice as exact. */
function sumWithLoss(n: number, term: (index: number) => number): { sum: number; lost: number } {
  let sum = 0;
  let lost = 0;
  for (let i = 0; i < n; i += 1) {
    const x = term(i);
    const next = sum + x;
    lost += Math.abs(sum) >= Math.abs(x) ? sum - next + x : x - next + sum;
    sum = next;
  }
  return { sum, lost };
}

export function compensatedSum(n: number, term: (index: number) => number): number {
  const { sum, lost } = sumWithLoss(n, term);
  return sum + lost;
}

/** Largest absolute value. */
export function largestMagnitude(values: ArrayLike<number>): number {
  let largest = 0;
  for (let i = 0; i < values.length; i += 1) {
    const size = Math.abs(values[i] as number);
    if (size > largest) largest = size;
  }
  return largest;
}

// Above 2^960 a sum of up to 2^53 values could overflow; 2^-64 takes it away and, as a power of two, loses no digit.
const LARGE = 2 ** 960;
const SHRINK = 2 ** -64;

/** A power of two by which values can be multiplied so that neither their sum nor their differences overflow. */
export function safeFactor(values: ArrayLike<number>): number {
  return largestMagnitude(values) > LARGE ? SHRINK : 1;
}

/**
 * Mean of the values times `factor`. The remainder of the division is taken into account: equal values give exactly
 * that value, and the result is right to the last digit or next to it.
 */
export function scaledMean(values: ArrayLike<number>, factor: number): number {
  const n = values.length;
  const { sum, lost } = sumWithLoss(n, (i) => (values[i] as number) * factor);
  const quotient = (sum + lost) / n;
  const product = quotient * n;
  const remainder = sum - product + (lost - productError(quotient, n, product));
  return quotient + remainder / n;
}

/** a b minus its rounded product, exactly (Dekker 1971). */
function productError(a: number, b: number, product: number): number {
  const [aHigh, aLow] = split(a);
  const [bHigh, bLow] = split(b);
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}

/** Two halves of 26 bits each. */
function split(x: number): [number, number] {
  const scaled = (2 ** 27 + 1) * x;
  const high = scaled - (scaled - x);
  return [high, x - high];
}

// Squares of numbers outside 2^+-480 leave the number range or lose digits; 2^+-600 brings them back inside.
const SQUARE_LIMIT = 2 ** 480;
const SQUARE_FACTOR = 2 ** 600;

/** Standard deviation with divisor n - 1, in the unit of the values; Infinity when it cannot be represented. */
export function sampleSd(values: ArrayLike<number>): number {
  const n = values.length;
  const shrink = safeFactor(values);
  const centre = scaledMean(values, shrink);
  let largest = 0;
  for (let i = 0; i < n; i += 1)
    largest = Math.max(largest, Math.abs((values[i] as number) * shrink - centre));
  if (largest === 0) return 0;
  let unit = 1;
  if (largest > SQUARE_LIMIT) unit = 1 / SQUARE_FACTOR;
  else if (largest < 1 / SQUARE_LIMIT) unit = SQUARE_FACTOR;
  const deviation = (i: number) => ((values[i] as number) * shrink - centre) * unit;
  const squares = compensatedSum(n, (i) => deviation(i) ** 2);
  // The centre is a rounded number; what it misses is taken off again (Chan, Golub and LeVeque 1983).
  const rest = compensatedSum(n, deviation);
  return Math.sqrt(Math.max(0, squares - (rest * rest) / n) / (n - 1)) / unit / shrink;
}
