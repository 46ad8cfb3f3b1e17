import { describe, expect, it } from 'vitest';
import { expectClose } from '../../stats/expect-close';
import { authority, loadRoundChecks, loadSharedChecks } from './load';
import { compute } from './round-recipes';

/** Certified sets whose second computation, in plain doubles, is further from the certificate than ours. */
const BEYOND_DOUBLES = /^strd-(SmLs04|AtmWtAg|NumAcc3|NumAcc2|Mavro)/;

describe('items, outliers, precision and rounds against reference values', () => {
  const checks = loadRoundChecks();

  it('has all entries, each with its source', () => {
    expect(checks).toHaveLength(297);
    for (const check of checks)
      expect(`${check.source}${check.provenance}`.length, check.id).toBeGreaterThan(20);
  });

  it.each(checks.map((check) => ({ ...check, authority: authority(check.provenance) })))(
    '$authority: $id is $value',
    (check) => {
      const actual = compute(check);
      // A last bit on top, because value and tolerance are decimal text.
      expectClose(actual, check.value, { atol: check.tolerance, rtol: 4 * Number.EPSILON });
      // Published figures are rounded; their full-precision recomputation must agree much more closely.
      if (check.recomputed !== null && !BEYOND_DOUBLES.test(check.id)) {
        expectClose(actual, check.recomputed, { rtol: 1e-8, atol: 1e-13 });
      }
    },
  );

  it('published: certified values of NIST StRD are met to ten digits and more', () => {
    for (const check of checks.filter(
      ({ id, method }) => id.startsWith('strd-') && method.startsWith('anova'),
    )) {
      expectClose(compute(check), check.value, { rtol: 5e-14 });
    }
  });

  it.each(loadSharedChecks())('a second function agrees with $id', (check) => {
    expectClose(compute(check), check.value, { atol: check.tolerance, rtol: 4 * Number.EPSILON });
  });
});
