import { continuedFraction } from './continued-fraction';
import { HALF_LOG_TWO_PI } from './stirling';

/** From here outwards the tail is computed directly; nearer to 0 it is 1/2 less the part between 0 and x. */
export const NORMAL_TAIL_FROM = 1.5;
/** From here on Mills' ratio is 1 / x to the last digit. */
const FAR = 1e9;

/** Phi(x) - 1/2 by the series of DLMF 7.6.2, whose terms are all of one sign; for |x| up to about 3. */
export function normalCentral(x: number): number {
  let term = x;
  let sum = x;
  for (let k = 3; k < 1000; k += 2) {
    term *= (x * x) / k;
    const next = sum + term;
    if (next === sum) break;
    sum = next;
  }
  return Math.exp((-x * x) / 2 - HALF_LOG_TWO_PI) * sum;
}

/** log of 1 - Phi(x) for x >= 1.5, by the even part of the continued fraction of Mills' ratio (DLMF 7.9.2). */
export function logNormalTail(x: number): number {
  if (x > FAR) return (-x * x) / 2 - HALF_LOG_TWO_PI - Math.log(x);
  const numerator = (i: number) => -(2 * i) * (2 * i - 1);
  const denominator = (i: number) => x * x + 4 * i + 1;
  const ratio = x * continuedFraction('normal tail', x * x + 1, numerator, denominator);
  return (-x * x) / 2 - HALF_LOG_TWO_PI + Math.log(ratio);
}
