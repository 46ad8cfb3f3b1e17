import { checkNotNegative, checkValues } from '../internal/check-values';
import { medianOfSorted, sortedCopy } from '../internal/sorted';
import type { WorkingStep } from '../working';
import { centre } from './algorithm-a-step';
import { nearestHampelRoot } from './hampel-root';
import { qMethod } from './q-method';

export interface HampelOptions {
  readonly scale?: number;
  readonly working?: boolean;
}

export interface HampelResult {
  readonly location: number;
  /** The scale that was held fixed. */
  readonly scale: number;
  readonly count: number;
  /** True when the scale is 0; the location is then the median. */
  readonly zeroScale: boolean;
  /** True when two solutions lie equally far from the median, which is then taken. */
  readonly tied: boolean;
  /** The steps, when working was asked for. */
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Hampel estimate of location: a robust mean that gives no weight at all to results far away.
 *
 * Results within 1.5 s* count fully, up to 3 s* with bounded weight, beyond with less and less, from 4.5 s* on not at
 * all. With s* of the Q method this is the Q/Hampel method.
 *
 * @param values - the results; with replicates the means of the laboratories. Shape: n values. Unit: unit of the data.
 *   Domain: finite; at least 2.
 * @param options.scale - s*, held fixed. Unit: unit of the data. Domain: finite; >= 0. Default: qMethod of the values.
 * @param options.working - give the steps too. Default false.
 * @returns { location, scale, count, zeroScale, tied, working }
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for a negative scale
 *
 * Ties and equal values: allowed. Zero scale: the median, and `zeroScale`. Order of input: does not matter. Of several
 *   solutions the one nearest the median; when two are equally near, the median itself.
 * Numerics: the equation is piecewise linear; its corners are visited outwards from the median until it changes sign on
 *   either side, and the root between two corners is exact. No iteration, no tolerance. O(n log n).
 * Source: ISO 13528:2022, Annex C.5.3 (finite algorithm); psi of Hampel 1974 with 1.5, 3, 4.5.
 * Checked by: tests/stats/location-scale/hampel.test.ts, tests/reference/proficiency (estimators).
 * @example hampel([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9], { scale: 1 }).location // => 5.1
 */
export function hampel(
  values: readonly number[],
  { scale: given, working = false }: HampelOptions = {},
): HampelResult {
  checkValues('hampel', values, 2);
  if (given !== undefined) checkNotNegative('hampel', 'scale', given);
  const scale = given ?? qMethod(values).scale;
  const sorted = sortedCopy(values);
  const middle = medianOfSorted(sorted);
  const shared = { scale, count: values.length };
  if (scale === 0)
    return { ...shared, location: middle, zeroScale: true, tied: false, working: working ? [] : null };
  const data = centre(sorted, middle, scale);
  const { root, tied, low, high } = nearestHampelRoot(data, scale * data.unit);
  const location = middle + root / data.unit + 0;
  const inUnit = (x: number) => middle + x / data.unit;
  const steps = (): WorkingStep[] => [
    {
      name: 'Location x* by the Hampel estimator',
      formula: tied ? 'x = median' : 'x = x0 - f0 * (x1 - x0) / (f1 - f0)',
      clause: 'ISO 13528, Annex C.5.3',
      inputs: {
        values: [...values],
        scale,
        median: middle,
        x0: inUnit(low.m),
        f0: low.f,
        x1: inUnit(high.m),
        f1: high.f,
      },
      value: location,
    },
  ];
  return { ...shared, location, zeroScale: false, tied, working: working ? steps() : null };
}
