import { checkValues } from '../internal/check-values';
import { StatsError } from '../stats-error';
import { RUNS_RULES, type RunsRuleId } from './runs-rules';

export interface ShewhartOptions {
  /** Rules to apply. Default all. */
  readonly rules?: readonly RunsRuleId[];
}

export interface RuleFinding {
  readonly rule: RunsRuleId;
  readonly text: string;
  /** Position of the round at which the rule is met, from 0. */
  readonly at: number;
  /** First position of the rounds that the rule looked at. */
  readonly from: number;
}

export interface ShewhartResult {
  readonly warningLimit: 2;
  readonly actionLimit: 3;
  readonly rounds: number;
  /** |z| above 2, and above 3, counted strictly. */
  readonly beyondWarning: number;
  readonly beyondAction: number;
  readonly findings: readonly RuleFinding[];
  /** Findings to be expected in so many rounds from the applied rules if the laboratory is as it should be. */
  readonly expectedByChance: number;
}

/**
 * Shewhart chart of z over rounds: limits at 2 and 3, and the runs rules, each with the rounds it was met at.
 *
 * The rules find what single signals do not: a shift, a drift, a spread that differs from sigma_pt. Every rule more is
 * another chance of a false alarm; the expected number is given.
 *
 * @param z - scores in the order of the rounds. Shape: n values. Unit: none. Domain: finite; at least 1.
 * @param options.rules - Default all nine of RUNS_RULES.
 * @returns counts, findings in the order of the rounds, expectedByChance
 * @throws StatsError too-few-values; not-finite; out-of-domain for an unknown rule
 *
 * Ties and equal values: z of 0 is on no side; equal neighbours neither rise nor fall. Order of input: matters.
 * Numerics: O(n times the windows).
 * Source: ISO 13528:2022, 10.8; ISO 7870-2:2013, Annex B; Nelson 1984, Journal of Quality Technology 16, 237.
 * Checked by: tests/stats/over-rounds/charts.test.ts, tests/reference/interlaboratory (allergen).
 * @example shewhartChart([0.5, 2.4, 2.1, -3.2]).findings.map(({ rule }) => rule)
 *   // => ['two-beyond-warning', 'two-of-three-beyond-two', 'beyond-action']
 */
export function shewhartChart(z: readonly number[], options: ShewhartOptions = {}): ShewhartResult {
  checkValues('shewhartChart', z, 1);
  const wanted = options.rules ?? RUNS_RULES.map(({ id }) => id);
  const rules = wanted.map((id) => {
    const rule = RUNS_RULES.find((candidate) => candidate.id === id);
    if (!rule) throw new StatsError('out-of-domain', `shewhartChart knows no rule ${String(id)}`);
    return rule;
  });
  const findings: RuleFinding[] = [];
  for (let at = 0; at < z.length; at += 1) {
    for (const { id, text, window, holds } of rules) {
      const from = at - window + 1;
      if (from >= 0 && holds(z.slice(from, at + 1))) findings.push({ rule: id, text, at, from });
    }
  }
  const expectedByChance = rules.reduce(
    (sum, { window, falseAlarm }) => sum + falseAlarm * Math.max(0, z.length - window + 1),
    0,
  );
  return {
    warningLimit: 2,
    actionLimit: 3,
    rounds: z.length,
    beyondWarning: z.filter((value) => Math.abs(value) > 2).length,
    beyondAction: z.filter((value) => Math.abs(value) > 3).length,
    findings,
    expectedByChance,
  };
}
