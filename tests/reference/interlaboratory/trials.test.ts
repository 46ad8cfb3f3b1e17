import { describe, expect, it } from 'vitest';
import { expectClose } from '../../stats/expect-close';
import { authority, loadTrialChecks } from './load';
import { TRIALS } from './trial-recipes';

describe.each(TRIALS)('$name', ({ name, checks: count, compute }) => {
  const checks = loadTrialChecks(name).map((check) => ({
    ...check,
    statistic: check.id.slice(name.length + 1),
  }));
  const printed = checks.flatMap(({ id, statistic, published = [] }) =>
    published.map((figure) => ({ id, statistic, ...figure, authority: authority(figure.provenance) })),
  );

  it('has all entries', () => {
    expect(checks).toHaveLength(count);
  });

  it.each(checks)('computed: $id is $computed.value', ({ statistic, computed }) => {
    expectClose(compute(statistic), computed.value, { atol: computed.tolerance });
  });

  it.each(printed.filter(({ reproduced }) => reproduced !== false))(
    '$authority: $id is printed as $value',
    ({ statistic, value, tolerance, source }) => {
      expect(source?.length).toBeGreaterThan(5);
      // Two last bits on top, because value and tolerance are decimal text.
      expectClose(compute(statistic), value, { atol: tolerance, rtol: 2 * Number.EPSILON });
    },
  );
});

describe('printed figures that do not follow from the printed data', () => {
  const astray = TRIALS.flatMap(({ name, compute }) =>
    loadTrialChecks(name).flatMap(({ id, published = [] }) =>
      published
        .filter(({ reproduced }) => reproduced === false)
        .map((figure) => ({ id, actual: compute(id.slice(name.length + 1)), ...figure })),
    ),
  );

  it('are known by name', () => {
    expect(astray.map(({ id }) => id)).toEqual(['gauge_mpc61.probe2362_s3', 'youden_pairs8.mean_b']);
  });

  it.each(astray)('$id is printed as $value, and the data give another', ({ actual, value, tolerance }) => {
    expect(Math.abs(actual - value)).toBeGreaterThan(tolerance);
    // By less than a unit of the last printed digit, so it is a slip and not another definition.
    expect(Math.abs(actual - value)).toBeLessThan(2.1 * tolerance);
  });
});
