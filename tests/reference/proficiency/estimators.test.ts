import { describe, expect, it } from 'vitest';
import {
  algorithmS,
  algorithmSFactors,
  combinedScores,
  fences,
  hampel,
  hinges,
  huberLocation,
  huberProposal2,
  mean,
  nIqr,
  qMethod,
  qMethodReplicates,
  qn,
  sn,
} from '@/lib/stats';
import { expectClose } from '../../stats/expect-close';
import file from './estimators.json';
import { rowsOf, valuesOf, type Check } from './load-checks';

const checks = (file as unknown as { checks: Check[] }).checks;

function authority(provenance: string): string {
  if (provenance.startsWith('published, from memory')) return 'published, from memory';
  return provenance.startsWith('published') ? 'published' : 'computed';
}

/** The replicates of each laboratory, where the check has groups. */
function groupsOf({ data }: Check): number[][] | null {
  if (!data?.group || data.reduce) return null;
  const groups = new Map<string, number[]>();
  for (const row of rowsOf(data)) {
    const key = row[data.group] ?? '';
    groups.set(key, [...(groups.get(key) ?? []), Number(row[data.column])]);
  }
  return [...groups.values()];
}

type Recipe = (values: number[], param: (name: string) => number, check: Check) => number;

const RECIPES: Readonly<Record<string, Recipe>> = {
  q_method: (values, _, check) => {
    const groups = groupsOf(check);
    return groups ? qMethodReplicates(groups).reproducibilitySd : qMethod(values).scale;
  },
  q_hampel_x: (values, _, check) => {
    const groups = groupsOf(check);
    if (!groups) return hampel(values).location;
    return hampel(groups.map(mean), { scale: qMethodReplicates(groups).reproducibilitySd }).location;
  },
  niqr_hinges: (values) => nIqr(values, { quantileType: 'hinges' }),
  qn_robustbase: (values) => qn(values),
  qn_iso: (values) => qn(values, { constant: 'iso-13528' }),
  sn_robustbase: (values) => sn(values),
  hubers_mu: (values) => huberProposal2(values).location,
  hubers_s: (values, param, check) => {
    return huberProposal2(values, check.params ? { location: param('mu') } : {}).scale;
  },
  huber_mu: (values) => huberLocation(values).location,
  algS_w: (values, param) => algorithmS(values, { degreesOfFreedom: param('nu') }).pooled,
  algS_eta: (_, param) => algorithmSFactors({ degreesOfFreedom: param('nu') }).eta,
  algS_xi: (_, param) => algorithmSFactors({ degreesOfFreedom: param('nu') }).xi,
  rsz: (values) => combinedScores(values).rsz,
  ssz: (values) => combinedScores(values).ssz,
  // None of these scores is exactly 3, so that "above 3" and "3 or more" count the same.
  count_abs_gt: (values, param) => {
    const { beyondWarning, beyondAction } = combinedScores(values);
    return param('t') === 2 ? beyondWarning : beyondAction;
  },
  hinge_lo: (values) => hinges(values).lower,
  hinge_hi: (values) => hinges(values).upper,
  fence_count_unusual: (values) => fences(values).unusual,
  fence_count_extreme: (values) => fences(values).extreme,
};

function compute(check: Check): number {
  const recipe = RECIPES[check.method] ?? expect.fail(`${check.id}: no recipe for ${check.method}`);
  const param = (name: string) => {
    const value = check.params?.[name];
    return typeof value === 'number' ? value : expect.fail(`${check.id}: no number ${name}`);
  };
  return recipe(check.data ? valuesOf(check.data) : [], param, check);
}

describe('reference values of robust estimators and combined scores', () => {
  it('has all entries, each with its source', () => {
    expect(checks).toHaveLength(57);
    for (const check of checks) expect(`${check.source}${check.provenance}`.length).toBeGreaterThan(20);
  });

  it.each(checks.map((check) => ({ ...check, authority: authority(check.provenance) })))(
    '$authority: $id is $value',
    (check) => {
      const actual = compute(check);
      // A last bit on top, because value and tolerance are decimal text.
      expectClose(actual, check.value, { atol: check.tolerance + 1e-15 });
      if (check.recomputed !== null) expectClose(actual, check.recomputed, { rtol: 1e-8, atol: 1e-15 });
    },
  );
});
