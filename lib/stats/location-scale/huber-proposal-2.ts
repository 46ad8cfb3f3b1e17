import { checkFinite, checkValues, representable } from '../internal/check-values';
import { sortedCopy } from '../internal/sorted';
import { StatsError } from '../stats-error';
import type { AlgorithmAIteration } from './algorithm-a';
import { iterateAlgorithmA } from './algorithm-a-iteration';
import { startOfAlgorithmA } from './algorithm-a-start';
import { HUBER_K, huberFactor } from './huber-factor';
import { huberScaleAbout } from './huber-scale-about';

export interface HuberProposal2Options {
  readonly k?: number;
  readonly location?: number;
  readonly working?: boolean;
}

export interface HuberProposal2Result {
  readonly location: number;
  /** 0 only together with `zeroScale`. */
  readonly scale: number;
  readonly count: number;
  readonly k: number;
  /** 1 / sqrt(beta(k)), exactly. */
  readonly consistencyFactor: number;
  readonly iterations: number;
  readonly zeroScale: boolean;
  /** The steps, when working was asked for; none with a given location. */
  readonly trace: readonly AlgorithmAIteration[] | null;
}

const TOLERANCE = 1e-13;
const MAX_ITERATIONS = 1_000_000;

/**
 * Huber's proposal 2: location and scale of winsorised values, solved to full precision with the exact factor.
 *
 * With k = 1.5 this is what Algorithm A approximates; its 1.134 is 1.13339 here. A smaller k bears more wild values and
 * costs efficiency.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param options.k - winsorising limit in units of the scale. Default 1.5, as Algorithm A. Domain: > 0.
 * @param options.location - a known location; then only the scale is estimated, with divisor n. Default: estimated.
 * @param options.working - give the steps too. Default false.
 * @returns { location, scale, count, k, consistencyFactor, iterations, zeroScale, trace }
 * @throws StatsError too-few-values below 2; not-finite; out-of-domain for k <= 0 or a result too large to represent;
 *   no-convergence after a million steps
 *
 * Ties and equal values: allowed; MADe = 0 starts as in algorithmA. Zero spread: scale 0 and `zeroScale`. Order of
 *   input: does not matter.
 * Numerics: one sort and running sums, O(log n) a step; to a relative change of 1e-13, the sum of later ones included.
 * Source: Huber 1964, Ann. Math. Statist. 35, 73-101; Huber 1981, Robust Statistics, 6.4; Analytical Methods Committee
 *   1989, Analyst 114, 1693-1697.
 * Checked by: tests/stats/location-scale/huber.test.ts, tests/reference/proficiency (estimators).
 * @example huberProposal2([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9]).location // => 5.38614
 */
export function huberProposal2(
  values: readonly number[],
  { k = HUBER_K, location, working = false }: HuberProposal2Options = {},
): HuberProposal2Result {
  checkValues('huberProposal2', values, 2);
  const factor = huberFactor(k);
  const sorted = sortedCopy(values);
  const shared = { count: values.length, k, consistencyFactor: factor };
  if (location !== undefined) {
    checkFinite('huberProposal2', 'location', location);
    const { scale, iterations } = huberScaleAbout(sorted, location, { multiple: k, factor });
    representable('huberProposal2', scale);
    return { ...shared, location, scale, iterations, zeroScale: scale === 0, trace: null };
  }
  const start = startOfAlgorithmA(sorted);
  if (start.scale === 0) {
    const { location: only } = start;
    return {
      ...shared,
      location: only,
      scale: 0,
      iterations: 0,
      zeroScale: true,
      trace: working ? [] : null,
    };
  }
  representable('huberProposal2', start.scale);
  const shape = { multiple: k, factor };
  const settings = { tolerance: TOLERANCE, maxIterations: MAX_ITERATIONS, trace: working, shape };
  const end = iterateAlgorithmA(sorted, start, settings);
  if (!end.converged) {
    throw new StatsError('no-convergence', `huberProposal2 did not settle within ${MAX_ITERATIONS} steps`);
  }
  const { iterations, zeroScale, trace } = end;
  const scale = representable('huberProposal2', end.scale);
  return { ...shared, location: end.location + 0, scale, iterations, zeroScale, trace };
}
