import { representable } from '../internal/check-values';
import { checkGroups, commonCount, type Groups } from '../internal/grouped-data';
import { algorithmA } from '../location-scale/algorithm-a';
import { algorithmS } from '../location-scale/algorithm-s';
import { hampel } from '../location-scale/hampel';
import { mean } from '../location-scale/mean';
import { qMethodReplicates } from '../location-scale/q-method-replicates';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { PRECISION_CLAUSES } from './clauses';
import { LIMIT_FACTOR } from './precision';

export type RobustPrecisionMethod = 'algorithms-a-and-s' | 'q-and-hampel';

export interface RobustPrecisionOptions {
  readonly method?: RobustPrecisionMethod;
  readonly limitFactor?: number;
  readonly working?: boolean;
}

export interface RobustPrecisionResult {
  readonly method: RobustPrecisionMethod;
  readonly laboratories: number;
  readonly mean: number;
  readonly repeatabilitySd: number;
  readonly betweenSd: number;
  readonly betweenSetToZero: boolean;
  readonly reproducibilitySd: number;
  readonly repeatabilityLimit: number;
  readonly reproducibilityLimit: number;
  /** Robust sd of the laboratory means (algorithm A); null for the Q method, which needs none. */
  readonly meansSd: number | null;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Precision of a method by robust estimates, ISO 5725-5: no results are left out, wild ones count less.
 *
 * Algorithm A on the laboratory means and algorithm S on the laboratory standard deviations; or the Q method on all
 * pairs with the Hampel location, which bears more wild laboratories and unequal numbers of replicates.
 *
 * @param groups - the results of each laboratory. Shape: p lists. Unit: unit of the data. Domain: finite; at least 2
 *   laboratories; the same number of 2 or more results each (Q and Hampel: at least one with 2).
 * @param options.method - Default 'algorithms-a-and-s', the first in the standard.
 * @param options.limitFactor - of r and R. Default 2.8, as in precision.
 * @param options.working - keep the steps. Default false.
 * @returns mean, sds and limits in the unit of the data
 * @throws StatsError too-few-values; unequal-lengths for unequal replicates with algorithms A and S; not-finite;
 *   no-convergence; out-of-domain
 *
 * Ties and equal values: as the estimators. Zero spread: 0. Order of input: does not matter.
 * Numerics: s_L^2 = s_x*^2 - s_r^2 / n, s_R^2 = s_L^2 + s_r^2. O(N log N).
 * Source: ISO 5725-5:1998, 6; the Q method as ISO 13528:2022, Annex C.5.
 * Checked by: tests/stats/precision/precision.test.ts, tests/reference/interlaboratory (creosote, antibody).
 * @example robustPrecision([[1, 1.2], [1.1, 1.2], [1, 1.1], [5, 9]]).repeatabilitySd // => 0.22005
 */
export function robustPrecision(groups: Groups, options: RobustPrecisionOptions = {}): RobustPrecisionResult {
  const { method = 'algorithms-a-and-s', limitFactor = LIMIT_FACTOR } = options;
  if (!(limitFactor > 0 && Number.isFinite(limitFactor))) {
    const found = `found ${limitFactor}`;
    throw new StatsError(
      'out-of-domain',
      `robustPrecision requires a factor of the limits above zero, ${found}`,
    );
  }
  const byPairs = method === 'q-and-hampel';
  checkGroups('robustPrecision', groups, { groups: 2, each: byPairs ? 1 : 2 }, 'laboratory');
  const facts = byPairs ? byQ(groups) : byAlgorithms(groups);
  const limit = (value: number) => representable('robustPrecision', limitFactor * value);
  return {
    method,
    laboratories: groups.length,
    ...facts,
    repeatabilityLimit: limit(facts.repeatabilitySd),
    reproducibilityLimit: limit(facts.reproducibilitySd),
    working: options.working ? workingOf(groups, facts, byPairs) : null,
  };
}

type Facts = Pick<
  RobustPrecisionResult,
  'mean' | 'repeatabilitySd' | 'betweenSd' | 'betweenSetToZero' | 'reproducibilitySd' | 'meansSd'
>;

function byAlgorithms(groups: Groups): Facts {
  const n = commonCount('robustPrecision', groups, 'laboratory');
  const { location, scale: meansSd } = algorithmA(groups.map((group) => mean(group)));
  const { pooled: repeatabilitySd } = algorithmS(
    groups.map((group) => sd(group)),
    { degreesOfFreedom: n - 1 },
  );
  const part = repeatabilitySd / Math.sqrt(n);
  const betweenSd = meansSd > part ? Math.sqrt(meansSd - part) * Math.sqrt(meansSd + part) : 0;
  return {
    mean: location,
    meansSd,
    repeatabilitySd,
    betweenSd,
    betweenSetToZero: meansSd < part,
    reproducibilitySd: representable('robustPrecision', Math.hypot(betweenSd, repeatabilitySd)),
  };
}

function byQ(groups: Groups): Facts {
  const found = qMethodReplicates(groups);
  if (found.repeatabilitySd === null || found.betweenLaboratorySd === null) {
    throw new StatsError(
      'too-few-values',
      'robustPrecision requires one laboratory with at least 2 results, found none',
    );
  }
  const means = groups.map((group) => mean(group));
  return {
    mean: hampel(means, { scale: found.reproducibilitySd }).location,
    meansSd: null,
    repeatabilitySd: found.repeatabilitySd,
    betweenSd: found.betweenLaboratorySd,
    betweenSetToZero: found.repeatabilitySd > found.reproducibilitySd,
    reproducibilitySd: found.reproducibilitySd,
  };
}

function workingOf(groups: Groups, facts: Facts, byPairs: boolean): readonly WorkingStep[] {
  if (byPairs) {
    const means = groups.map((group) => mean(group));
    return [
      ...(hampel(means, { scale: facts.reproducibilitySd, working: true }).working ?? []),
      ...(qMethodReplicates(groups, { working: true }).working ?? []),
    ];
  }
  const n = groups[0]?.length ?? 0;
  const [s_x, s_r, s_L] = [facts.meansSd, facts.repeatabilitySd, facts.betweenSd];
  const { algorithmA: clauseA, algorithmS: clauseS } = PRECISION_CLAUSES;
  const means = groups.map((group) => mean(group));
  const sds = groups.map((group) => sd(group));
  const onMeans = algorithmA(means, { working: true });
  const onSds = algorithmS(sds, { degreesOfFreedom: n - 1, working: true });
  // Rows of plain numbers, as every step has them.
  const rows = (trace: readonly object[] | null) =>
    (trace ?? []).map((row) => ({ ...row }) as Record<string, number>);
  return [
    {
      name: 'Robust mean and sd of the laboratory means',
      formula: 'algorithm A from the start values',
      clause: clauseA,
      inputs: { means, startLocation: onMeans.startLocation, startScale: onMeans.startScale },
      value: s_x,
      iterations: rows(onMeans.trace),
    },
    {
      name: 'Robust repeatability standard deviation s_r',
      formula: 'w = xi * sqrt(sum of min(s, eta * w)^2 / p), repeated from the start value',
      clause: clauseS,
      inputs: { sds, start: onSds.start, eta: onSds.eta, xi: onSds.xi, p: groups.length },
      value: s_r,
      iterations: rows(onSds.trace),
    },
    {
      name: 'Between-laboratory standard deviation s_L',
      formula: facts.betweenSetToZero
        ? 's_L = 0 (s_x^2 is below s_r^2 / n)'
        : 's_L = sqrt(s_x^2 - s_r^2 / n)',
      clause: clauseA,
      inputs: { s_x, s_r, n },
      value: s_L,
    },
    {
      name: 'Reproducibility standard deviation s_R',
      formula: 's_R = sqrt(s_L^2 + s_r^2)',
      clause: clauseA,
      inputs: { s_L, s_r },
      value: facts.reproducibilitySd,
    },
  ];
}
