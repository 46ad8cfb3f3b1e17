import { sd } from '../location-scale/sd';
import type { WorkingStep } from '../working';
import { ITEM_CLAUSES as CLAUSES } from './clauses';
import type { HomogeneityInput, HomogeneityResult } from './homogeneity';

/** The steps of the check. sum() adds up a list term by term, squares() sums squared deviations from its mean. */
export function homogeneityWorking(
  { items, sigmaPt }: HomogeneityInput,
  facts: Omit<HomogeneityResult, 'working'>,
): readonly WorkingStep[] {
  const { itemMeans, replicates: m, items: g, meansSd: s_x, withinSd: s_w, betweenSd: s_s, expanded } = facts;
  const itemSds = items.map((item) => sd(item));
  const step = (
    name: string,
    formula: string,
    clause: string,
    inputs: WorkingStep['inputs'],
    value: number,
  ) => ({
    name,
    formula,
    clause,
    inputs,
    value,
  });
  const cochran = facts.cochran
    ? [
        step(
          "Cochran's statistic C",
          'C = max(item_sds)^2 / sum(item_sds^2)',
          CLAUSES.cochran,
          { item_sds: itemSds },
          facts.cochran.statistic,
        ),
      ]
    : [];
  return [
    ...cochran,
    step(
      'Mean',
      'x_bar = sum(item_means) / g',
      CLAUSES.homogeneity,
      { item_means: itemMeans, g },
      facts.mean,
    ),
    step(
      'Standard deviation of the item means s_x',
      's_x = sqrt(squares(item_means) / (g - 1))',
      CLAUSES.homogeneity,
      { item_means: itemMeans, g },
      s_x,
    ),
    step(
      'Within-item standard deviation s_w',
      's_w = sqrt(sum(item_sds^2) / g)',
      CLAUSES.homogeneity,
      { item_sds: itemSds, g },
      s_w,
    ),
    step(
      'Between-item standard deviation s_s',
      facts.betweenSetToZero ? 's_s = 0 (s_x^2 is below s_w^2 / m)' : 's_s = sqrt(s_x^2 - s_w^2 / m)',
      CLAUSES.homogeneity,
      { s_x, s_w, m },
      s_s,
    ),
    step(
      'Limit of s_s',
      'limit = 0.3 * sigma_pt',
      CLAUSES.criterion,
      { sigma_pt: sigmaPt },
      facts.criterion.limit,
    ),
    step(
      'Expanded limit of s_s^2',
      'c = F1 * (0.3 * sigma_pt)^2 + F2 * s_w^2',
      CLAUSES.expanded,
      { F1: expanded.f1, F2: expanded.f2, sigma_pt: sigmaPt, s_w },
      expanded.limit,
    ),
    step(
      'Is the method good enough (below 0.5)',
      'ratio = s_w / sigma_pt',
      CLAUSES.repeatability,
      { s_w, sigma_pt: sigmaPt },
      facts.method.ratio,
    ),
    {
      name: 'Verdict',
      formula: 's_s against its limit, then s_s^2 against the expanded limit',
      clause: facts.verdict === 'not-homogeneous' ? CLAUSES.failed : CLAUSES.criterion,
      inputs: { s_s, limit: facts.criterion.limit, c: expanded.limit },
      value: facts.verdict,
    },
  ];
}
