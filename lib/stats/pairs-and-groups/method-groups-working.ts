import { studentTUpperQuantile } from '../distributions';
import type { WorkingStep } from '../working';
import { PAIR_CLAUSES } from './clauses';
import type { GroupDifference, MethodGroup } from './method-groups';

/** The steps of the classical comparison of each pair, from the lists to the interval. */
export function methodGroupsWorking(
  byGroup: ReadonlyMap<string, readonly number[]>,
  groups: readonly MethodGroup[],
  differences: readonly GroupDifference[],
): readonly WorkingStep[] {
  const clause = PAIR_CLAUSES.groups;
  const step = (name: string, formula: string, inputs: WorkingStep['inputs'], value: number) => ({
    name,
    formula,
    clause,
    inputs,
    value,
  });
  const summaries = groups.flatMap(({ group, count: n, mean, sd }) => {
    const x = [...(byGroup.get(group) ?? [])];
    const first = step(`Mean of ${group}`, 'mean = sum(x) / n', { x, n }, mean);
    if (sd === null) return [first];
    return [first, step(`sd of ${group}`, 's = sqrt(squares(x) / (n - 1))', { x, n }, sd)];
  });
  const found = new Map(groups.map((group) => [group.group, group]));
  const pairs = differences.flatMap((pair) => {
    const [a, b] = [found.get(pair.first), found.get(pair.second)];
    if (a === undefined || b === undefined) return [];
    const spread = { s1: a.sd, n1: a.count, s2: b.sd, n2: b.count };
    const names = `${pair.first} and ${pair.second}`;
    const t = studentTUpperQuantile(0.025, pair.degreesOfFreedom);
    const inputs = { d: pair.meanDifference, t, ...spread };
    const df = '(s1^2 / n1 + s2^2 / n2)^2 / ((s1^2 / n1)^2 / (n1 - 1) + (s2^2 / n2)^2 / (n2 - 1))';
    const some = (a.sd ?? 0) > 0 || (b.sd ?? 0) > 0;
    return [
      step(
        `Difference of ${names}`,
        'd = mean1 - mean2',
        { mean1: a.mean, mean2: b.mean },
        pair.meanDifference,
      ),
      ...(some ? [step(`Degrees of freedom, ${names}`, `df = ${df}`, spread, pair.degreesOfFreedom)] : []),
      step(`Lower limit, ${names}`, 'lower = d - t * sqrt(s1^2 / n1 + s2^2 / n2)', inputs, pair.lower),
      step(`Upper limit, ${names}`, 'upper = d + t * sqrt(s1^2 / n1 + s2^2 / n2)', inputs, pair.upper),
    ];
  });
  return [...summaries, ...pairs];
}
