import { normalQuantile } from '../distributions/normal';
import { checkValues, representable } from '../internal/check-values';
import { crossingOfG, shareOfEqual, type PairSet } from '../internal/difference-distribution';
import { toLattice } from '../internal/lattice';
import { pairsBetween, pairsWithin } from '../internal/replicate-pairs';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { Q_CLAUSE, qSteps } from './q-method-steps';
import type { QMethodOptions } from './q-method';

export interface QMethodReplicatesResult {
  /** Robust reproducibility standard deviation s_R*; 0 only together with `zeroScale`. */
  readonly reproducibilitySd: number;
  /** Robust repeatability standard deviation s_r*; null when no laboratory has two results. */
  readonly repeatabilitySd: number | null;
  /** sqrt(s_R*^2 - s_r*^2), 0 where that would be negative; null without s_r*. */
  readonly betweenLaboratorySd: number | null;
  readonly laboratories: number;
  readonly results: number;
  /** H1(0) and H2(0): the shares of equal pairs between and within laboratories. */
  readonly equalShareBetween: number;
  readonly equalShareWithin: number | null;
  readonly zeroScale: boolean;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Robust reproducibility and repeatability standard deviations by the Q method, from replicate results.
 *
 * Reproducibility from the differences between results of different laboratories, repeatability from those within a
 * laboratory. Laboratories may have different numbers of replicates; each pair of laboratories, and each laboratory,
 * counts the same.
 *
 * @param laboratories - the results of each laboratory. Shape: p lists, at least 1 value in each. Unit: unit of the data.
 *   Domain: finite; at least 2 laboratories.
 * @param options.working - give the steps too. Default false.
 * @returns { reproducibilitySd, repeatabilitySd, betweenLaboratorySd, laboratories, results, equalShareBetween,
 *   equalShareWithin, zeroScale, working }
 * @throws StatsError too-few-values below 2 laboratories or for an empty one; not-finite; out-of-domain when the result
 *   is too large to represent
 *
 * Ties and equal values: as qMethod. All pairs of laboratories equal: reproducibility 0 and `zeroScale`; all pairs within
 *   equal: repeatability 0. Order of input: does not matter.
 * Numerics: as qMethod, O(n log n) for n results in all.
 * Source: ISO 13528:2022, Annex C.5.2: s_R* as qMethod with H1 over pairs of laboratories,
 *   s_r* = G2^-1(0.5 + 0.5 H2(0)) / (sqrt(2) Phi^-1(0.75 + 0.25 H2(0))).
 * Checked by: tests/stats/location-scale/q-method.test.ts, tests/reference/proficiency (estimators).
 * @example qMethodReplicates([[1, 1.2], [1.4, 1.5], [2, 1.9]]).reproducibilitySd // => 0.887658
 */
export function qMethodReplicates(
  laboratories: readonly (readonly number[])[],
  { working = false }: QMethodOptions = {},
): QMethodReplicatesResult {
  check(laboratories);
  const lattice = toLattice(laboratories.flat());
  let start = 0;
  const groups = laboratories.map(({ length }) => lattice.values.slice(start, (start += length)));
  const between = pairsBetween(groups, lattice.tolerance);
  const within = pairsWithin(groups, lattice.tolerance);
  const names = { clause: Q_CLAUSE, h: 'H1', g: 'G1', scale: 'Reproducibility standard deviation s_R*' };
  const sR = scaleOf(between, lattice.perUnit, 0.25, names);
  const sr =
    within === null
      ? null
      : scaleOf(within, lattice.perUnit, 0.5, {
          ...names,
          h: 'H2',
          g: 'G2',
          scale: 'Repeatability standard deviation s_r*',
        });
  const betweenSd = sr === null ? null : rootOfDifference(sR.scale, sr.scale);
  return {
    reproducibilitySd: sR.scale,
    repeatabilitySd: sr?.scale ?? null,
    betweenLaboratorySd: betweenSd,
    laboratories: laboratories.length,
    results: lattice.values.length,
    equalShareBetween: sR.equalShare,
    equalShareWithin: sr?.equalShare ?? null,
    zeroScale: sR.scale === 0,
    working: working ? [...sR.steps, ...(sr?.steps ?? []), ...betweenSteps(sR.scale, sr?.scale)] : null,
  };
}

function check(laboratories: readonly (readonly number[])[]): void {
  if (laboratories.length < 2) {
    const found = laboratories.length;
    throw new StatsError(
      'too-few-values',
      `qMethodReplicates requires at least 2 laboratories, found ${found}`,
    );
  }
  for (const results of laboratories) checkValues('qMethodReplicates', results, 1);
}

function scaleOf(
  pairs: PairSet,
  perUnit: number,
  share: number,
  names: Parameters<typeof qSteps>[0]['names'],
): { scale: number; equalShare: number; steps: WorkingStep[] } {
  const equalShare = Math.min(1, shareOfEqual(pairs));
  // Weights are sums of fractions, so that "all" can miss 1 by rounding.
  if (equalShare > 1 - 1e-12) return { scale: 0, equalShare: 1, steps: [] };
  const level = share + (1 - share) * equalShare;
  const { x0, x1, x, ...gs } = crossingOfG(pairs, level, equalShare);
  const crossing = { ...gs, x0: x0 / perUnit, x1: x1 / perUnit, x: x / perUnit };
  const divisor = Math.SQRT2 * normalQuantile((1 + level) / 2);
  const scale = representable('qMethodReplicates', crossing.x / divisor);
  const counts = { pairs: pairs.total, equalPairs: equalShare * pairs.total };
  return { scale, equalShare, steps: qSteps({ crossing, counts, share, names, scale }) };
}

/** sqrt(a^2 - b^2) without overflow. */
function rootOfDifference(a: number, b: number): number {
  return a > b ? a * Math.sqrt(((a - b) / a) * ((a + b) / a)) : 0;
}

function betweenSteps(sR: number, sr: number | undefined): WorkingStep[] {
  if (sr === undefined || sr >= sR) return [];
  const name = 'Between-laboratory standard deviation s_L*';
  const value = rootOfDifference(sR, sr);
  return [
    { name, formula: 's_L = sqrt(s_R^2 - s_r^2)', clause: Q_CLAUSE, inputs: { s_R: sR, s_r: sr }, value },
  ];
}
