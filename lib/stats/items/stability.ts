import { checkFinite, checkNotNegative, checkPositive, representable } from '../internal/check-values';
import { ratioAtLimit } from '../internal/ratio-at-limit';
import type { WorkingStep } from '../working';
import { ITEM_CLAUSES } from './clauses';
import { ITEM_SHARE } from './homogeneity';

export interface StabilityInput {
  readonly before: number;
  readonly after: number;
  readonly sigmaPt: number;
  readonly beforeUncertainty?: number;
  readonly afterUncertainty?: number;
}

export interface StabilityResult {
  /** after - before. */
  readonly difference: number;
  readonly limit: number;
  readonly stable: boolean;
  /** With the uncertainty of both means; null when neither was given. */
  readonly expanded: { readonly limit: number; readonly stable: boolean } | null;
  readonly verdict: 'stable' | 'stable-by-expanded' | 'not-stable';
  /** What may be added to u(x_pt) as a root of squares when the items are used all the same: |difference| / sqrt(3). */
  readonly addedUncertainty: number | null;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Stability of the items: the mean before sending against the mean at the end of the round, |y1 - y2| <= 0.3 sigma_pt.
 *
 * Both means come from the same laboratory and method, the first usually from the homogeneity check. With the
 * uncertainties of the means the limit is widened by 2 sqrt(u1^2 + u2^2), since small checks see differences by chance.
 *
 * @param input.before - y1. Unit: unit of the data. Domain: finite.
 * @param input.after - y2. Unit: unit of the data. Domain: finite.
 * @param input.sigmaPt - sigma_pt. Unit: unit of the data. Domain: finite; > 0.
 * @param input.beforeUncertainty - u(y1). Unit: unit of the data. Domain: finite; >= 0. Default none.
 * @param input.afterUncertainty - u(y2), likewise.
 * @param options.working - keep the steps. Default false.
 * @returns see StabilityResult, unit of the data
 * @throws StatsError not-finite; no-spread for sigma_pt 0; out-of-domain
 *
 * Numerics: the comparison with 0.3 is made on the decimal figures, so that 10.3 and 10.0 against 1 is at the limit.
 *   addedUncertainty takes a change as rectangular between both figures (common practice).
 * Source: ISO 13528:2022, Annex B.5.
 * Checked by: tests/stats/items/items.test.ts.
 * @example stability({ before: 10, after: 9.6, sigmaPt: 1 }) // => difference -0.4, verdict 'not-stable'
 */
export function stability(
  input: StabilityInput,
  options: { readonly working?: boolean } = {},
): StabilityResult {
  const { before, after, sigmaPt } = input;
  checkFinite('stability', 'mean before', before);
  checkFinite('stability', 'mean after', after);
  checkPositive('stability', 'sigma_pt', sigmaPt);
  const limits = [ITEM_SHARE];
  const ratio = ratioAtLimit({
    caller: 'stability',
    value: after,
    assignedValue: before,
    parts: [sigmaPt],
    limits,
  });
  const stable = Math.abs(ratio) <= ITEM_SHARE;
  const difference = representable('stability', after - before);
  const limit = ITEM_SHARE * sigmaPt;
  const expanded = expandedLimit(input, difference, stable);
  const verdict = stable ? 'stable' : expanded?.stable ? 'stable-by-expanded' : 'not-stable';
  const facts = {
    difference,
    limit,
    stable,
    expanded,
    verdict,
    addedUncertainty: verdict === 'not-stable' ? Math.abs(difference) / Math.sqrt(3) : null,
  } as const;
  return { ...facts, working: options.working ? workingOf(input, facts) : null };
}

function uncertainties(input: StabilityInput): readonly [number, number] | null {
  const { beforeUncertainty, afterUncertainty } = input;
  if (beforeUncertainty === undefined && afterUncertainty === undefined) return null;
  checkNotNegative('stability', 'uncertainty before', beforeUncertainty ?? 0);
  checkNotNegative('stability', 'uncertainty after', afterUncertainty ?? 0);
  return [beforeUncertainty ?? 0, afterUncertainty ?? 0];
}

function expandedLimit(
  input: StabilityInput,
  difference: number,
  stable: boolean,
): StabilityResult['expanded'] {
  const found = uncertainties(input);
  if (found === null) return null;
  const limit = representable('stability', ITEM_SHARE * input.sigmaPt + 2 * Math.hypot(...found));
  return { limit, stable: stable || Math.abs(difference) <= limit * (1 + 8 * Number.EPSILON) };
}

function workingOf(input: StabilityInput, facts: Omit<StabilityResult, 'working'>): readonly WorkingStep[] {
  const clause = ITEM_CLAUSES.stability;
  const { before: y1, after: y2, sigmaPt: sigma_pt } = input;
  const found = uncertainties(input);
  const expanded =
    facts.expanded && found
      ? [
          {
            name: 'Limit with uncertainty',
            formula: 'limit = 0.3 * sigma_pt + 2 * sqrt(u1^2 + u2^2)',
            clause,
            inputs: { sigma_pt, u1: found[0], u2: found[1] },
            value: facts.expanded.limit,
          },
        ]
      : [];
  return [
    { name: 'Difference', formula: 'd = y2 - y1', clause, inputs: { y1, y2 }, value: facts.difference },
    { name: 'Limit', formula: 'limit = 0.3 * sigma_pt', clause, inputs: { sigma_pt }, value: facts.limit },
    ...expanded,
    {
      name: 'Verdict',
      formula: 'abs(d) against the limits',
      clause,
      inputs: { d: facts.difference, limit: facts.limit },
      value: facts.verdict,
    },
  ];
}
