import { describe, expect, it } from 'vitest';
import * as stats from '@/lib/stats';
import { expectClose } from '../expect-close';
import grid from '../fixtures/distributions-r.json';

type Rows = readonly (readonly number[])[];

/** The promise is 1e-10 of R's value; all but the density of F (2e-12) hold 1e-12. */
const RTOL = 1e-11;

describe('distribution functions, their inverses and logarithms', () => {
  const functions = stats as unknown as Record<string, (...args: number[]) => number>;
  const groups = Object.entries(grid.groups as unknown as Record<string, Rows>);

  it.each(groups)(`computed with R (${grid.program}): %s over its grid`, (name, rows) => {
    expect(rows.length).toBeGreaterThan(15);
    const run = functions[name] ?? expect.fail(`no function ${name}`);
    for (const row of rows) {
      const args = row.slice(0, -1);
      expectClose(run(...args), row.at(-1) as number, { rtol: RTOL });
    }
  });

  it('reaches probabilities of 1e-12 and degrees of freedom of 1e5', () => {
    const rows = (grid.groups as unknown as Record<string, Rows>).studentTQuantile ?? [];
    expect(rows.some(([p, df]) => p === 1e-12 && df === 1e5)).toBe(true);
  });
});
