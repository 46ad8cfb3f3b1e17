import { noncentralTQuantile } from '../../distributions';
import type { Interval } from '../types';

/**
 * Exact limits, in standard deviations from the mean, for the place mean + multiplier sigma of a normal distribution:
 * quantiles of the noncentral t distribution over sqrt(n) (Carkeet 2015; ISO 16269-6).
 */
export function exactLimitInterval(input: {
  readonly count: number;
  readonly multiplier: number;
  readonly confidence: number;
}): Interval {
  const { count, multiplier, confidence } = input;
  const root = Math.sqrt(count);
  const at = (p: number) => noncentralTQuantile(p, count - 1, multiplier * root) / root;
  return { lower: at((1 - confidence) / 2), upper: at((1 + confidence) / 2) };
}
