import { studentTUpperQuantile } from '../distributions';
import { checkValues } from '../internal/check-values';
import { kruskalWallis } from '../internal/kruskal-wallis';
import { mean } from '../location-scale/mean';
import { sd } from '../location-scale/sd';
import { oneWayAnova, type OneWayAnovaResult } from '../precision/one-way-anova';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ROUND_CLAUSES } from './clauses';

export interface GroupSummary {
  readonly group: string;
  readonly rounds: number;
  readonly mean: number;
  /** 95 percent t interval of the mean, by the group's own spread; null for a single round. */
  readonly lower: number | null;
  readonly upper: number | null;
}

export interface RelationToGroupResult {
  readonly groups: readonly GroupSummary[];
  /** Analysis of variance of z between groups; null when no group has two rounds. */
  readonly anova: OneWayAnovaResult | null;
  /** Kruskal-Wallis test by ranks: statistic and p by chi-square. */
  readonly rankStatistic: number;
  readonly rankPValue: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Relation of z to a kind: the method, the analyst, the season in each round.
 *
 * Looking at method, analyst and season is three tests: with none of them at work, one in seven laboratories has a p
 * below 0.05 somewhere. Take a small p as a reason to look, not as proof.
 *
 * @param z - scores. Shape: n values. Unit: none. Domain: finite; at least 4.
 * @param labels - the kind of each round. Shape: n texts; at least 2 different.
 * @param options.working - keep the steps. Default false.
 * @returns means with intervals by group (in order of first appearance), anova, rank test
 * @throws StatsError too-few-values below 4 or with one group only; unequal-lengths; not-finite; no-spread when all z
 *   are equal
 *
 * Ties and equal values: mean ranks with correction. Order of input: does not matter, pairs stay together. Numerics:
 *   O(n log n).
 * Source: one-way analysis of variance; Kruskal and Wallis 1952, JASA 47, 583.
 * Checked by: tests/stats/over-rounds/over-rounds.test.ts (R aov, kruskal.test).
 * @example relationToGroup([1, 1.2, -0.9, -1.1], ['A', 'A', 'B', 'B']).groups.map((g) => g.mean) // => [1.1, -1]
 */
export function relationToGroup(
  z: readonly number[],
  labels: readonly string[],
  options: { readonly working?: boolean } = {},
): RelationToGroupResult {
  checkValues('relationToGroup', z, 4);
  if (z.length !== labels.length) {
    const found = `found ${z.length} and ${labels.length}`;
    throw new StatsError('unequal-lengths', `relationToGroup requires as many labels as scores, ${found}`);
  }
  const byLabel = new Map<string, number[]>();
  z.forEach((value, i) => {
    const label = labels[i] as string;
    const own = byLabel.get(label);
    if (own) own.push(value);
    else byLabel.set(label, [value]);
  });
  if (byLabel.size < 2) {
    throw new StatsError(
      'too-few-values',
      `relationToGroup requires at least 2 groups, found ${byLabel.size}`,
    );
  }
  const values = [...byLabel.values()];
  const anova = values.some((own) => own.length > 1) ? oneWayAnova(values) : null;
  const { statistic, pValue } = kruskalWallis('relationToGroup', values);
  return {
    groups: [...byLabel].map(([group, own]) => ({ group, rounds: own.length, ...interval(own) })),
    anova,
    rankStatistic: statistic,
    rankPValue: pValue,
    working: options.working ? workingOf(byLabel, anova) : null,
  };
}

function interval(own: readonly number[]): Pick<GroupSummary, 'mean' | 'lower' | 'upper'> {
  const centre = mean(own);
  if (own.length < 2) return { mean: centre, lower: null, upper: null };
  const reach = (studentTUpperQuantile(0.025, own.length - 1) * sd(own)) / Math.sqrt(own.length);
  return { mean: centre, lower: centre - reach, upper: centre + reach };
}

function workingOf(
  byLabel: ReadonlyMap<string, readonly number[]>,
  anova: OneWayAnovaResult | null,
): readonly WorkingStep[] {
  const clause = ROUND_CLAUSES.relation;
  const means = [...byLabel].map(([label, z]): WorkingStep => {
    const inputs = { z, n: z.length };
    return { name: `Mean of ${label}`, formula: 'mean = sum(z) / n', clause, inputs, value: mean(z) };
  });
  if (anova === null || anova.fRatio === null) return means;
  const own = [...byLabel.values()];
  const inputs = {
    n: own.map(({ length }) => length),
    mean: own.map((z) => mean(z)),
    s: own.map((z) => (z.length > 1 ? sd(z) : 0)),
    p: own.length,
  };
  const between = 'sum(n * (mean - sum(n * mean) / sum(n))^2) / (p - 1)';
  const within = '(sum((n - 1) * s^2) / sum(n - 1))';
  const formula = `F = ${between} / ${within}`;
  return [...means, { name: 'F ratio', formula, clause, inputs, value: anova.fRatio }];
}
