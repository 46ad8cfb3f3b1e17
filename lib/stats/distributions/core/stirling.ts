/** Coefficients of the Stirling series in odd powers of 1/x: B_2k / (2k (2k - 1)). */
const SERIES = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156] as const;
/** From here on the first term left out is below 3e-17. */
const SERIES_FROM = 10;

export const HALF_LOG_TWO_PI = 0.918938533204672741780329736406;

/**
 * What Stirling's formula misses: log Gamma(x + 1) - (x + 1/2) log x + x - log(2 pi) / 2, for x > 0.
 *
 * Differences of log Gamma at large arguments lose all their digits; differences of this small number do not
 * (Loader 2000, Fast and accurate computation of binomial probabilities). Below 10 by the recurrence
 * e(x) = e(x + 1) + (x + 1/2) log(1 + 1/x) - 1.
 */
export function stirlingError(x: number): number {
  let shifted = x;
  let steps = 0;
  while (shifted < SERIES_FROM) {
    steps += (shifted + 0.5) * Math.log1p(1 / shifted) - 1;
    shifted += 1;
  }
  const square = 1 / (shifted * shifted);
  let sum = 0;
  for (let i = SERIES.length - 1; i >= 0; i -= 1) sum = sum * square + (SERIES[i] as number);
  return sum / shifted + steps;
}

/**
 * x log(x / m) + m - x without loss of digits near x = m: the deviance part of Loader 2000. x > 0, m > 0.
 *
 * With v = (x - m) / (x + m) it is (x - m) v + 2 x (v^3/3 + v^5/5 + ...).
 */
export function deviancePart(x: number, m: number): number {
  const difference = x - m;
  if (Math.abs(difference) >= 0.1 * (x + m)) return x * Math.log(x / m) + m - x;
  const v = difference / (x + m);
  let sum = difference * v;
  let power = 2 * x * v;
  for (let k = 3; k < 1000; k += 2) {
    power *= v * v;
    const next = sum + power / k;
    if (next === sum) break;
    sum = next;
  }
  return sum;
}

/** log Gamma(x) for x > 0. */
export function logGamma(x: number): number {
  return stirlingError(x) + (x - 0.5) * Math.log(x) - x + HALF_LOG_TWO_PI;
}
