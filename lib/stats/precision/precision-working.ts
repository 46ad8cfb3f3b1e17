import { representable } from '../internal/check-values';
import type { Groups } from '../internal/grouped-data';
import { mean as meanOf } from '../location-scale/mean';
import { sd } from '../location-scale/sd';
import type { WorkingStep } from '../working';
import { PRECISION_CLAUSES as CLAUSES } from './clauses';
import type { PrecisionResult } from './precision';

/** The steps from the cell means and standard deviations to r and R. sum() adds up a list, term by term. */
export function precisionWorking(
  groups: Groups,
  facts: Omit<PrecisionResult, 'working'>,
  factor: number,
  unit: number | undefined,
): readonly WorkingStep[] {
  const counts = groups.map((group) => group.length);
  const means = groups.map((group) => meanOf(group));
  const sds = groups.map((group) => (group.length > 1 ? sd(group) : 0));
  const { mean, repeatabilitySd: s_r, betweenSd: s_L, reproducibilitySd: s_R, meanReplicates } = facts;
  const p = facts.laboratories;
  const squares = counts.reduce((sum, n, i) => sum + n * ((means[i] as number) - mean) ** 2, 0);
  const between = representable('precision', squares / (p - 1));
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
  const steps = [
    step('Mean m', 'm = sum(n * mean) / sum(n)', CLAUSES.mean, { n: counts, mean: means }, mean),
    step(
      'Repeatability standard deviation s_r',
      's_r = sqrt(sum((n - 1) * s^2) / sum(n - 1))',
      CLAUSES.repeatability,
      { n: counts, s: sds },
      s_r,
    ),
    step(
      'Mean square between laboratories s_d^2',
      's_d2 = sum(n * (mean - m)^2) / (p - 1)',
      CLAUSES.between,
      { n: counts, mean: means, m: mean, p },
      between,
    ),
    step(
      'Mean number of results',
      'n_mean = (sum(n) - sum(n^2) / sum(n)) / (p - 1)',
      CLAUSES.between,
      { n: counts, p },
      meanReplicates,
    ),
    step(
      'Between-laboratory standard deviation s_L',
      facts.betweenSetToZero ? 's_L = 0 (s_d2 is below s_r^2)' : 's_L = sqrt((s_d2 - s_r^2) / n_mean)',
      CLAUSES.between,
      { s_d2: between, s_r, n_mean: meanReplicates },
      s_L,
    ),
    step(
      'Reproducibility standard deviation s_R',
      's_R = sqrt(s_r^2 + s_L^2)',
      CLAUSES.reproducibility,
      { s_r, s_L },
      s_R,
    ),
    step('Repeatability limit r', `r = ${factor} * s_r`, CLAUSES.limits, { s_r }, facts.repeatabilityLimit),
    step(
      'Reproducibility limit R',
      `R = ${factor} * s_R`,
      CLAUSES.limits,
      { s_R },
      facts.reproducibilityLimit,
    ),
  ];
  if (facts.horRat === null || unit === undefined) return steps;
  const inputs = { s_R, m: mean, mass_fraction_of_unit: unit };
  const formula = 'HorRat = s_R * mass_fraction_of_unit / (0.02 * (m * mass_fraction_of_unit)^0.8495)';
  return [...steps, step('HorRat', formula, CLAUSES.horRat, inputs, facts.horRat)];
}
