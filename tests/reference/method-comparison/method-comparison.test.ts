import { describe, expect, it } from 'vitest';
import { expectClose } from '../../stats/expect-close';
import { authority, dataSets, loadChecks } from './load';
import { RECIPES } from './recipes';

const SETS = dataSets().map((name) => ({ name, figures: RECIPES[name]?.() ?? {}, checks: loadChecks(name) }));

it('every data set has its recipe, and all 639 checks are here', () => {
  expect(Object.keys(RECIPES).sort()).toEqual(dataSets());
  expect(SETS.reduce((sum, { checks }) => sum + checks.length, 0)).toBe(639);
});

describe.each(SETS)('$name', ({ name, figures, checks }) => {
  const found = (id: string) => figures[id.slice(name.length + 1)] ?? NaN;
  const printed = checks.flatMap(({ id, published = [] }) =>
    published.map((figure) => ({ id, ...figure, authority: authority(figure.provenance) })),
  );

  it('computes what is checked and nothing else', () => {
    expect(Object.keys(figures).sort()).toEqual(checks.map(({ id }) => id.slice(name.length + 1)).sort());
  });

  it.each(checks)('computed: $id is $computed.value', ({ id, computed }) => {
    expectClose(found(id), computed.value, { atol: computed.tolerance });
  });

  it.each(printed.filter(({ reproduced }) => reproduced !== false))(
    '$authority: $id is printed as $value',
    ({ id, value, tolerance, source }) => {
      expect(source?.length).toBeGreaterThan(5);
      // Two last bits on top, because value and tolerance are decimal text.
      expectClose(found(id), value, { atol: tolerance, rtol: 2 * Number.EPSILON });
    },
  );
});

describe('printed figures that do not follow from the printed data', () => {
  const astray = SETS.flatMap(({ name, figures, checks }) =>
    checks.flatMap(({ id, published = [] }) =>
      published
        .filter(({ reproduced }) => reproduced === false)
        .map((figure) => ({ id, actual: figures[id.slice(name.length + 1)] ?? NaN, ...figure })),
    ),
  );

  it('are known by name', () => {
    expect(astray.map(({ id }) => id)).toEqual(['mdl_epa.mdl_pooled', 'pod_aoac_tableD1.c3_r_ucl']);
  });

  it.each(astray)(
    '$id is printed as $value, and the data give another',
    ({ actual, value, tolerance, note }) => {
      expect(note?.length).toBeGreaterThan(20);
      expect(Math.abs(actual - value)).toBeGreaterThan(tolerance);
      expect(Math.abs(actual - value)).toBeLessThan(4 * tolerance);
    },
  );
});
