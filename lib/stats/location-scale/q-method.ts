import { normalQuantile } from '../distributions/normal';
import { checkValues, representable } from '../internal/check-values';
import { crossingOfG, shareOfEqual, type Crossing } from '../internal/difference-distribution';
import { toLattice } from '../internal/lattice';
import { allPairs } from '../internal/staircase-pairs';
import type { WorkingStep } from '../working';
import { Q_CLAUSE, qSteps } from './q-method-steps';

export interface QMethodOptions {
  readonly working?: boolean;
}

export interface QMethodResult {
  /** The robust standard deviation s*; 0 only together with `zeroScale`. */
  readonly scale: number;
  readonly count: number;
  /** H1(0): the share of pairs that are equal. */
  readonly equalShare: number;
  /** True when all values are equal: not fit for scoring. */
  readonly zeroScale: boolean;
  /** The steps, when working was asked for. */
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Robust standard deviation by the Q method, for single results: from the differences of all pairs, without a centre.
 *
 * To be used with hampel for the location (Q/Hampel). Bears many ties, which carry MADe and Qn to zero. With replicates
 * take qMethodReplicates.
 *
 * @param values - the results, one a laboratory. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.working - give the steps too. Default false.
 * @returns { scale, count, equalShare: H1(0), zeroScale, working }
 * @throws StatsError too-few-values below 2 values; not-finite; out-of-domain when the result is too large to represent
 *
 * Ties and equal values: pairs that are equal as decimal figures count as equal, whatever their binary difference (see
 *   lattice). Zero spread: scale 0 and `zeroScale`. Order of input: does not matter.
 * Numerics: H1 is never written down: one order statistic of the differences and its neighbours, exact, O(n log n) time
 *   and O(n) memory.
 * Source: ISO 13528:2022, Annex C.5.2: s* = G1^-1(0.25 + 0.75 H1(0)) / (sqrt(2) Phi^-1(0.625 + 0.375 H1(0))).
 * Checked by: tests/stats/location-scale/q-method.test.ts, tests/reference/proficiency (estimators).
 * @example qMethod([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9]).scale // => 1.4147
 */
export function qMethod(values: readonly number[], { working = false }: QMethodOptions = {}): QMethodResult {
  checkValues('qMethod', values, 2);
  const lattice = toLattice(values);
  const pairs = allPairs(lattice.values.sort(), lattice.tolerance);
  const equalShare = shareOfEqual(pairs);
  const count = values.length;
  if (equalShare === 1) {
    return { scale: 0, count, equalShare, zeroScale: true, working: working ? [] : null };
  }
  const crossing = inUnit(crossingOfG(pairs, 0.25 + 0.75 * equalShare, equalShare), lattice.perUnit);
  const divisor = Math.SQRT2 * normalQuantile(0.625 + 0.375 * equalShare);
  const scale = representable('qMethod', crossing.x / divisor);
  const names = { h: 'H1', g: 'G1', scale: 'Robust standard deviation s* by the Q method', clause: Q_CLAUSE };
  const counts = { pairs: pairs.total, equalPairs: equalShare * pairs.total };
  const steps = working ? qSteps({ crossing, counts, share: 0.25, names, scale }) : null;
  return { scale, count, equalShare, zeroScale: false, working: steps };
}

function inUnit(crossing: Crossing, perUnit: number): Crossing {
  const { x, x0, x1 } = crossing;
  return { ...crossing, x: x / perUnit, x0: x0 / perUnit, x1: x1 / perUnit };
}
