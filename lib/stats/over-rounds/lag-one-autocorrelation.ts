import { checkValues } from '../internal/check-values';
import { groupedData } from '../internal/grouped-data';
import { compensatedSum, scaledMean } from '../internal/sums';
import { StatsError } from '../stats-error';

/**
 * Autocorrelation at lag one: does a round resemble the one before.
 *
 * The intervals of laboratoryOverRounds take rounds as independent; beyond about 2 / sqrt(n) they are not.
 *
 * @param values - in the order of the rounds. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @returns the sum of products of neighbouring deviations over the sum of squares, no unit, -1 to 1
 * @throws StatsError too-few-values; not-finite; no-spread when all values are equal
 *
 * Ties and equal values: allowed. Order of input: matters. Numerics: as oneWayAnova, O(n log n).
 * Source: NIST StRD univariate sets, whose certified values it gives.
 * Checked by: tests/stats/over-rounds/over-rounds.test.ts, tests/reference/interlaboratory (strd_*).
 * @example lagOneAutocorrelation([1, 2, 3, 4, 5]) // => 0.4
 */
export function lagOneAutocorrelation(values: readonly number[]): number {
  checkValues('lagOneAutocorrelation', values, 3);
  const places = groupedData(values.map((value) => [value])).groups.map((group) => group.mean);
  const centre = scaledMean(places, 1);
  const deviation = (i: number) => (places[i] as number) - centre;
  const squares = compensatedSum(places.length, (i) => deviation(i) ** 2);
  if (squares === 0 || places.every((place) => place === places[0])) {
    const found = `found ${values[0]} throughout`;
    throw new StatsError('no-spread', `lagOneAutocorrelation requires values that differ, ${found}`);
  }
  return compensatedSum(places.length - 1, (i) => deviation(i) * deviation(i + 1)) / squares;
}
