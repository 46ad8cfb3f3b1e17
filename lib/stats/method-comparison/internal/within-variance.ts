import { checkValues } from '../../internal/check-values';
import { sampleSd } from '../../internal/sums';
import { StatsError } from '../../stats-error';

/** Pooled variance within items, with its degrees of freedom and the mean of 1 / replicates. */
export function withinVariance(
  caller: string,
  items: readonly (readonly number[])[],
): { readonly variance: number; readonly degreesOfFreedom: number; readonly meanInverseCount: number } {
  let squares = 0;
  let degreesOfFreedom = 0;
  let inverse = 0;
  for (const values of items) {
    checkValues(caller, values, 1);
    inverse += 1 / values.length;
    if (values.length < 2) continue;
    squares += sampleSd(values) ** 2 * (values.length - 1);
    degreesOfFreedom += values.length - 1;
  }
  if (degreesOfFreedom === 0) {
    throw new StatsError(
      'too-few-values',
      `${caller} requires an item with at least 2 replicates, found none`,
    );
  }
  return { variance: squares / degreesOfFreedom, degreesOfFreedom, meanInverseCount: inverse / items.length };
}
